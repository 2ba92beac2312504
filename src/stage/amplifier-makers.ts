import type { StageSpec } from '../spec/spec.js';
import type { Circuit, Surroundings } from './circuit.js';
import { difference } from './difference.js';
import { excitation } from './excitation.js';
import { fitResistors } from './fitted.js';
import { follower } from './follower.js';
import { inverting } from './inverting.js';
import { AMPLIFIER, type Maker, type Making } from './making.js';
import { nonInverting } from './non-inverting.js';
import type { StageResistors } from './stage.js';

type FromResistors = (resistors: StageResistors, around: Surroundings) => Circuit;

export const makeFollower: Maker = (spec, _settled, around) => driven(spec, follower(around), []);
export const makeNonInverting: Maker = (spec, settled, around) => withResistors(nonInverting, spec, { gain: settled.gain, around });
export const makeInverting: Maker = (spec, settled, around) => withResistors(inverting, spec, { gain: settled.gain, around });
export const makeDifference: Maker = (spec, settled, around) => withResistors(difference, spec, { gain: settled.gain, around });

function withResistors(build: FromResistors, spec: StageSpec, { gain, around }: { gain: number; around: Surroundings }): Making {
  const fitted = fitResistors(spec, gain);
  return fitted.ok ? driven(spec, build(fitted.resistors, around), fitted.notes) : fitted;
}

function driven(spec: StageSpec, circuit: Circuit, fitNotes: readonly string[]): Making {
  return { ok: true, made: { circuit, excitation: excitation(spec.signal), response: AMPLIFIER, fitNotes, cautions: [] } };
}
