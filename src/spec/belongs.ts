import type { Draft } from './draft.js';
import type { Topology } from './spec.js';
import { BUILT_TOPOLOGIES } from './spec.js';
import { OTHER_TOPOLOGIES_KEYS } from './topology-keys.js';
import { isUnder, leafText, removeField } from './tree.js';
import { refuse } from './refuse.js';
import { readChoice } from './words.js';

interface Complaint {
  readonly message: string;
  readonly fix: string;
}

/** The topology, when it is one that is built; another one, or another word, is refused by name. */
export function readTopology(draft: Draft): Topology | undefined {
  const word = readChoice<string>(draft, 'topology');
  if (word === undefined || isBuilt(word)) return word;
  return refuse(draft, 'topology', { code: 'S105', message: `topology ${word} is not built yet; built: ${BUILT_TOPOLOGIES.join(', ')}`, fix: NOT_BUILT });
}

/** No built topology is offered: it would be another circuit. */
const NOT_BUILT = 'none yet for this circuit; railfit help stage lists what is built';

function isBuilt(word: string): word is Topology {
  return (BUILT_TOPOLOGIES as readonly string[]).includes(word);
}

/** Refuses what does not belong to this topology or coupling, once for each field, and takes it out of the draft. */
export function refuseStrangers(draft: Draft, topology: Topology | undefined): void {
  refuseOtherTopologies(draft, topology);
  if (topology !== undefined) refuseForeign(draft, topology);
  const isAc = leafText(draft.fields, 'signal.coupling') === 'ac';
  if (topology === 'difference') return isAc ? refuseAcDifference(draft) : undefined;
  if (isAc) refuseDcFields(draft);
  else refuseLoneAmplitude(draft);
}

function refuseOtherTopologies(draft: Draft, topology: Topology | undefined): void {
  for (const [path, owners] of Object.entries(OTHER_TOPOLOGIES_KEYS)) {
    const node = draft.fields.get(path);
    if (node === undefined) continue;
    draft.positions.set(path, node.at);
    if (topology !== undefined) stranger(draft, path, { message: `${path} belongs to ${owners}, not to ${topology}`, fix: 'leave it out' });
    draft.positions.delete(path);
  }
}

const FOLLOWER_RESISTORS: Complaint = { message: 'a follower feeds its output straight back: it has no gain resistors', fix: 'leave it out, or topology: non-inverting' };
const TWO_INPUTS: Complaint = { message: 'a difference stage has two inputs: positive and negative, or differential and commonMode', fix: '{positive: 1.2..1.4 V, negative: 1.2..1.3 V}' };

function refuseForeign(draft: Draft, topology: Topology): void {
  if (topology === 'follower') return refuseFollowers(draft);
  if (topology === 'difference') return strangers(draft, ['signal.input', 'signal.amplitude', 'signal.center'], TWO_INPUTS);
  for (const leg of ['resistors.positiveInput', 'resistors.toReference']) stranger(draft, leg, onlyDifference(leg, topology, 'leave it out'));
  refuseSecondInputs(draft, topology);
}

function refuseFollowers(draft: Draft): void {
  const first = [...draft.fields.keys()].find((path) => isUnder(path, 'resistors'));
  if (first !== undefined) stranger(draft, first, FOLLOWER_RESISTORS);
  removeField(draft.fields, 'resistors');
  refuseSecondInputs(draft, 'follower');
}

function refuseSecondInputs(draft: Draft, topology: Topology): void {
  for (const leg of ['positive', 'negative', 'differential', 'commonMode']) stranger(draft, `signal.${leg}`, onlyDifference(`signal.${leg}`, topology, 'input: 25 mV..330 mV'));
}

function onlyDifference(path: string, topology: Topology, fix: string): Complaint {
  return { message: `${path} belongs to a difference stage, not to topology ${topology}`, fix };
}

function refuseAcDifference(draft: Draft): void {
  refuse(draft, 'signal.coupling', { code: 'S107', message: 'an AC-coupled difference stage is not built yet; built: difference with coupling dc', fix: 'dc' });
}

function refuseDcFields(draft: Draft): void {
  stranger(draft, 'signal.input', { message: 'AC-coupled: amplitude only, centred on the reference; extremes against ground do not pass a capacitor', fix: 'amplitude: 100 mVpk' });
  stranger(draft, 'signal.center', { message: 'AC-coupled: the signal is centred on the reference, so it has no center of its own', fix: 'leave it out' });
}

function refuseLoneAmplitude(draft: Draft): void {
  const [input, amplitude, center] = ['input', 'amplitude', 'center'].map((key) => draft.fields.has(`signal.${key}`));
  if (input === true) {
    strangers(draft, ['signal.amplitude', 'signal.center'], { message: 'the input is written twice: as extremes, and as amplitude or center', fix: 'keep input, or amplitude and center' });
  } else if (amplitude === true && center !== true) {
    stranger(draft, 'signal.amplitude', { message: 'a DC-coupled amplitude needs signal.center, the voltage it swings about; accepted: center, input instead, or coupling: ac', fix: 'amplitude: 100 mVpk, center: 1.5 V' });
  }
}

function strangers(draft: Draft, paths: readonly string[], complaint: Complaint): void {
  for (const path of paths) stranger(draft, path, complaint);
}

function stranger(draft: Draft, path: string, complaint: Complaint): void {
  if (!draft.fields.has(path)) return;
  refuse(draft, path, { code: 'S108', ...complaint });
  removeField(draft.fields, path);
}
