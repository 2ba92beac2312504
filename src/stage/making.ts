import type { Problem } from '../quantities/problem.js';
import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Circuit, Surroundings } from './circuit.js';
import type { Excitation } from './excitation.js';
import type { StageResponse } from './response.js';

/** What is settled before the circuit is built: gain magnitude (1 where a topology has none) and reference. */
export interface Settled {
  readonly gain: number;
  readonly reference: ReferenceSpec;
  readonly notes: readonly string[];
}

/** A topology with its component values, driven by its signal. */
export interface Made {
  readonly circuit: Circuit;
  readonly excitation: Excitation;
  readonly response: StageResponse;
  /** What was chosen on the user's behalf, one sentence each. */
  readonly fitNotes: readonly string[];
  /** What the stage does not do as it was asked, one sentence each. */
  readonly cautions: readonly string[];
}

export type Making = { readonly ok: true; readonly made: Made } | { readonly ok: false; readonly problems: readonly Problem[] };

/** Builds one topology. Errors are problems, never exceptions. */
export type Maker = (spec: StageSpec, settled: Settled, around: Surroundings) => Making;

export const AMPLIFIER: StageResponse = { kind: 'amplifier' };
