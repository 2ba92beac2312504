import type { Part } from '../parts/part.js';
import type { Stage } from '../stage/index.js';
import type { FigureUsed } from './amplifier.js';

/**
 * What is predicted. V: ends of the output, noise rms; shares: of the time clipped and slewing, distortion, duty; gain in the unit of the
 * stage; phase in degrees against the ideal stage; Hz: bandwidth, frequency; peaking in dB; s: settling, edges 10 % to 90 %.
 */
export type Quantity =
  | 'outputHigh' | 'outputLow' | 'clipped' | 'slewing' | 'distortion' | 'gain' | 'phase' | 'bandwidth' | 'peaking' | 'settling' | 'rise' | 'fall' | 'noise' | 'frequency' | 'duty';

/** A predicted number, or why there is none. Null without a reason: it means nothing for this stage, and is left out. */
export type Predicted = { readonly value: number } | { readonly value: null; readonly reason: string };

export type Results = Readonly<Partial<Record<Quantity, Predicted>>>;

/** The stage with the part's typical figures, or with its guaranteed worst. */
export interface Form {
  /** Where it was taken: V, V, °C. */
  readonly at: { readonly supply: number; readonly reference: number };
  readonly figures: readonly FigureUsed[];
  readonly results: Results;
  /** What was left out or chosen for this part, one sentence each. */
  readonly notes: readonly string[];
}

/** What the stage asks beside what is predicted; absent where it asks nothing. SI. */
export type Wanted = Readonly<Partial<Record<Quantity, { readonly value: number; readonly sense: 'at-least' | 'at-most' | 'about' }>>>;

/** Output over time, V from V−, on one time axis, s; an outcome is null where its figures do not say it. */
export interface Waveform {
  readonly kind: 'sine' | 'step' | 'ramp' | 'oscillation';
  readonly t: readonly number[];
  readonly ideal: readonly number[];
  readonly typical: readonly number[] | null;
  readonly worst: readonly number[] | null;
}

/** Signal to output: Hz, gain in its unit, degrees (180 of an inverting stage included). */
export interface FrequencyResponse {
  readonly f: readonly number[];
  readonly magnitude: readonly number[] | null;
  readonly phase: readonly number[] | null;
  readonly worst: { readonly magnitude: readonly number[]; readonly phase: readonly number[] } | null;
}

/** One stage with one part in it, simulated. Predicted, not judged. */
export interface Prediction {
  readonly stage: Stage;
  readonly part: Part;
  readonly wanted: Wanted;
  readonly typical: Form;
  readonly worst: Form;
  /** Null where neither outcome can be told. */
  readonly waveform: Waveform | null;
  readonly response: FrequencyResponse | null;
  /** What the model does not have, one sentence each. */
  readonly limits: readonly string[];
}
