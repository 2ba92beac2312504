import { refuseMisplaced } from './misplaced.js';
import type { Draft } from './draft.js';
import { AC_COUPLED, belongsTo, OWNED_FIELDS, SENSES } from './ownership.js';
import type { Topology } from './spec.js';
import { reasonFor } from './strangers.js';
import { isUnder, leafText, removeField } from './tree.js';
import { refuse, stranger } from './refuse.js';
import { readChoice } from './words.js';

/** The topology; another word is refused with what was probably meant. */
export function readTopology(draft: Draft): Topology | undefined {
  return readChoice<Topology>(draft, 'topology');
}

/** Refuses what does not belong to this topology, coupling or shape, once for each field, and takes it out of the draft. */
export function refuseStrangers(draft: Draft, topology: Topology | undefined): void {
  if (topology !== undefined) refuseForeign(draft, topology);
  const isAc = leafText(draft.fields, 'signal.coupling') === 'ac';
  if (isAc && topology !== undefined && !AC_COUPLED.includes(topology)) refuseAc(draft, topology);
  else if (isAc) refuseDcFields(draft);
  else refuseLoneAmplitude(draft);
  refuseMisplaced(draft, { topology, isAc });
}

/** A map is refused as one; of a map that belongs, only the fields that do not. */
function refuseForeign(draft: Draft, topology: Topology): void {
  for (const path of OWNED_FIELDS) {
    if (belongsTo(path, topology)) continue;
    const written = [...draft.fields.keys()].find((one) => isUnder(one, path));
    if (written !== undefined) refuse(draft, written, { code: 'S108', ...reasonFor(path, topology) });
    removeField(draft.fields, path);
  }
}

function refuseAc(draft: Draft, topology: Topology): void {
  if (topology === 'difference') return refuse(draft, 'signal.coupling', { code: 'S107', message: 'an AC-coupled difference stage is not built yet; built: difference with coupling dc', fix: 'dc' });
  const what = SENSES.includes(topology) ? 'the shunt' : 'the photodiode';
  refuse(draft, 'signal.coupling', { code: 'S108', message: `${what} of a ${topology} stage drives it directly: there is no coupling capacitor`, fix: 'dc' });
}

function refuseDcFields(draft: Draft): void {
  stranger(draft, 'signal.input', { message: 'AC-coupled: amplitude only, centred on the reference; extremes against ground do not pass a capacitor', fix: 'amplitude: 100 mVpk' });
  stranger(draft, 'signal.center', { message: 'AC-coupled: the signal is centred on the reference, so it has no center of its own', fix: 'leave it out' });
}

function refuseLoneAmplitude(draft: Draft): void {
  const [input, amplitude, center] = ['input', 'amplitude', 'center'].map((key) => draft.fields.has(`signal.${key}`));
  if (input === true) {
    const twice = { message: 'the input is written twice: as extremes, and as amplitude or center', fix: 'keep input, or amplitude and center' };
    for (const path of ['signal.amplitude', 'signal.center']) stranger(draft, path, twice);
  } else if (amplitude === true && center !== true) {
    stranger(draft, 'signal.amplitude', { message: 'a DC-coupled amplitude needs signal.center, the voltage it swings about; accepted: center, input instead, or coupling: ac', fix: 'amplitude: 100 mVpk, center: 1.5 V' });
  }
}
