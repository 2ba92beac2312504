import type { Draft } from './draft.js';
import { legNames } from './leg-names.js';
import { FILTERS, ONE_INPUT } from './ownership.js';
import type { Topology } from './spec.js';
import { isUnder, leafText } from './tree.js';
import { isOffered, refuse, refuseAbsent } from './refuse.js';

/** Refuses what is missing: topology, supply and what the stage is fed. A field that was written and refused is not missing. */
export function refuseMissing(draft: Draft, topology: Topology | undefined): void {
  const isRefused = topology === undefined && isWritten(draft, 'topology');
  for (const path of ['topology', 'supply']) if (!isWritten(draft, path)) refuseAbsent(draft, path);
  for (const [map, keys] of Object.entries(WHOLE_WHEN_WRITTEN)) if ([...draft.fields.keys()].some((path) => isUnder(path, map))) refuseMissingKeys(draft, map, keys);
  if (draft.fields.has('limits.supplyRipple') && !isWrittenWithin(draft, 'supplyRipple')) refuseAbsent(draft, 'supplyRipple');
  if (isRefused) return;
  if (topology === undefined || ONE_INPUT.includes(topology)) refuseMissingInput(draft);
  if (topology !== undefined) refuseMissingOwn(draft, topology);
}

/** Maps any stage may do without, but not without these keys. */
const WHOLE_WHEN_WRITTEN: Readonly<Record<string, readonly string[]>> = {
  drives: ['threshold'],
  following: ['corner', 'order'],
  converter: ['bits', 'range'],
  battery: ['capacity'],
  supplyRipple: ['amplitude', 'frequency'],
  dutyCycle: ['on', 'every'],
};

/** What a topology is fed with or made of, and cannot do without. */
const OWN: Readonly<Partial<Record<Topology, readonly [map: string, keys: readonly string[], example?: string]>>> = {
  transimpedance: ['photodiode', ['current', 'direction', 'capacitance']],
  'low-side-sense': ['shunt', ['resistance', 'current']],
  'high-side-sense': ['shunt', ['resistance', 'current', 'bus'], '{resistance: 50 mΩ, tolerance: 1 %, current: 0..2 A, bus: 10.8..13.2 V}'],
  integrator: ['integrator', ['resistance', 'capacitance']],
  'relaxation-oscillator': ['oscillator', ['frequency']],
};

function refuseMissingOwn(draft: Draft, topology: Topology): void {
  if (topology === 'difference') return refuseMissingLegs(draft);
  if (topology === 'summing') return refuseMissingSum(draft);
  if (FILTERS.includes(topology)) return refuseMissingFilter(draft, topology);
  const own = OWN[topology];
  if (own === undefined) return;
  const [map, keys, example] = own;
  if (isWrittenWithin(draft, map)) refuseMissingKeys(draft, map, keys);
  else refuseAbsent(draft, map, example);
}

function refuseMissingKeys(draft: Draft, map: string, keys: readonly string[]): void {
  for (const key of keys) if (!isWritten(draft, `${map}.${key}`)) refuseAbsent(draft, `${map}.${key}`);
}

function refuseMissingFilter(draft: Draft, topology: Topology): void {
  if (!isWrittenWithin(draft, 'filter')) return refuseAbsent(draft, 'filter');
  const parts = topology === 'multiple-feedback-low-pass' ? ['r1', 'r2', 'r3', 'c1', 'c2'] : ['r1', 'r2', 'c1', 'c2'];
  const isOfParts = parts.some((key) => draft.fields.has(`filter.${key}`));
  refuseMissingKeys(draft, 'filter', isOfParts ? parts : ['corner', 'q']);
}

function refuseMissingSum(draft: Draft): void {
  const names = legNames(draft);
  if (names.length === 0) return isWrittenInside(draft, 'legs') ? undefined : refuseAbsent(draft, 'legs');
  const isAc = leafText(draft.fields, 'signal.coupling') === 'ac';
  for (const leg of names.map((name) => `legs.${name}`)) {
    if (!isWritten(draft, `${leg}.input`) && !isWritten(draft, `${leg}.amplitude`)) refuseAbsent(draft, `${leg}.${isAc ? 'amplitude' : 'input'}`);
    if (!isWritten(draft, `${leg}.resistance`) && !isWritten(draft, `${leg}.gain`)) refuseAbsent(draft, `${leg}.resistance`);
  }
}

const PAIRS = [['signal.positive', 'signal.negative'], ['signal.differential', 'signal.commonMode']] as const;
const DRIVES = ['signal.input', 'signal.amplitude', ...PAIRS.flat()];

function refuseMissingInput(draft: Draft): void {
  if (DRIVES.some((path) => isWritten(draft, path))) return;
  refuseAbsent(draft, leafText(draft.fields, 'signal.coupling') === 'ac' || isWritten(draft, 'signal.center') ? 'signal.amplitude' : 'signal.input');
}

function refuseMissingLegs(draft: Draft): void {
  if (!DRIVES.some((path) => isWritten(draft, path))) return missingBoth(draft);
  const used = PAIRS.filter((pair) => pair.some((path) => isWritten(draft, path)));
  if (used.length > 1) return refuseMixture(draft);
  for (const path of used.flat()) if (!isWritten(draft, path)) refuseAbsent(draft, path);
}

function refuseMixture(draft: Draft): void {
  const second = PAIRS[1].filter((path) => isWritten(draft, path));
  for (const path of second) {
    refuse(draft, path, { code: 'S108', message: 'the two inputs are written in two ways; accepted: positive and negative, or differential and commonMode', fix: 'keep one pair' });
  }
}

function missingBoth(draft: Draft): void {
  const fix = draft.hasFile ? 'signal: {positive: 1.2..1.4 V, negative: 1.2..1.3 V}' : '--set "signal={positive: 1.2..1.4 V, negative: 1.2..1.3 V}"';
  refuse(draft, 'signal', { code: 'S102', message: 'signal.positive and signal.negative are missing; accepted: these two, or signal.differential and signal.commonMode', fix });
}

/** Also true when the field, or the map around it, was refused for its structure, or is offered in place of a key that is none. */
function isWritten(draft: Draft, path: string): boolean {
  return draft.positions.has(path) || isOffered(draft, path) || draft.problems.some(({ place }) => place?.path !== undefined && isUnder(path, place.path));
}

/** True when the map, or anything in it, is written. */
function isWrittenWithin(draft: Draft, map: string): boolean {
  return isWritten(draft, map) || isWrittenInside(draft, map);
}

function isWrittenInside(draft: Draft, map: string): boolean {
  return [...draft.positions.keys()].some((path) => isUnder(path, map) && path !== map) || draft.problems.some(({ place }) => place?.path !== undefined && isUnder(place.path, map));
}
