import type { Draft } from './draft.js';
import { legNames } from './leg-names.js';
import { FILTERS } from './ownership.js';
import { refuse, stranger } from './refuse.js';
import type { Topology } from './spec.js';
import { leafText } from './tree.js';

interface Around {
  readonly topology: Topology | undefined;
  readonly isAc: boolean;
}

/** Refuses what the shape, the coupling of the legs or another field of the same map leaves no room for. */
export function refuseMisplaced(draft: Draft, { topology, isAc }: Around): void {
  refuseEdges(draft);
  for (const name of legNames(draft)) refuseInLeg(draft, `legs.${name}`, isAc);
  refuseTwoFilters(draft);
  if (topology !== undefined && !FILTERS.includes(topology)) refuseCorner(draft);
  if (topology === 'relaxation-oscillator') refuseLoadToReference(draft);
}

function refuseEdges(draft: Draft): void {
  const shape = leafText(draft.fields, 'signal.shape')?.trim();
  const written = shape === undefined ? 'a band-limited signal (the default)' : `a ${shape} signal`;
  const known = shape === undefined || shape === 'sine' || shape === 'band-limited';
  if (known) stranger(draft, 'signal.edge', { message: `${written} has no edge; a step and a pulse have`, fix: 'shape: step' });
  if (known || shape === 'step') stranger(draft, 'signal.duty', { message: `${shape === 'step' ? 'a step' : written} has no duty; a pulse has`, fix: 'shape: pulse' });
}

function refuseInLeg(draft: Draft, leg: string, isAc: boolean): void {
  if (isAc) refuseDirectLeg(draft, `${leg}.input`);
  else stranger(draft, `${leg}.amplitude`, { message: 'a DC-coupled leg is written by its extremes against ground; an amplitude alone needs coupling: ac', fix: 'input: 0.5..4.5 V' });
  if (!draft.fields.has(`${leg}.gain`)) return;
  stranger(draft, `${leg}.resistance`, { message: 'the leg is written twice: by its resistance and by its gain', fix: 'keep resistance, or gain' });
}

function refuseDirectLeg(draft: Draft, path: string): void {
  const text = leafText(draft.fields, path)?.trim();
  if (text === undefined || text === 'ground') return;
  const isWord = text === 'supply' || text === 'reference';
  const message = isWord
    ? `AC-coupled: behind its capacitor a leg to the ${text} is a leg to ground, since neither moves`
    : 'AC-coupled: amplitude only; extremes against ground do not pass a capacitor';
  stranger(draft, path, { message, fix: isWord ? 'ground' : 'amplitude: 100 mVpk' });
}

const RESPONSE = ['filter.corner', 'filter.q'];

function refuseTwoFilters(draft: Draft): void {
  const parts = ['r1', 'r2', 'r3', 'c1', 'c2'].map((key) => `filter.${key}`).filter((path) => draft.fields.has(path));
  const [first] = parts;
  const response = RESPONSE.filter((path) => draft.fields.has(path));
  if (first === undefined || response.length === 0) return;
  refuse(draft, first, { code: 'S108', message: `the filter is written twice: by ${response.join(' and ')}, and by its components`, fix: 'keep corner and q, or all components' });
  for (const path of parts) draft.fields.delete(path);
}

function refuseCorner(draft: Draft): void {
  if (leafText(draft.fields, 'limits.gainErrorKind')?.trim() !== 'corner') return;
  stranger(draft, 'limits.gainErrorKind', { message: 'corner counts the shift of the −3 dB frequency of a filter; this stage is none; accepted: magnitude or vector', fix: 'magnitude' });
}

function refuseLoadToReference(draft: Draft): void {
  if (leafText(draft.fields, 'load.to')?.trim() !== 'reference') return;
  stranger(draft, 'load.to', { message: 'an oscillator has no reference that a load could go to; accepted: ground or supply', fix: 'ground' });
}
