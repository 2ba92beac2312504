import type { PinNetwork } from '../formulas/pin-network.js';
import type { NumberDemand } from './demand.js';

/** A transimpedance stage that leaves its feedback capacitor to the part: Rf in Ω, capacitance at its input in F. */
export interface OpenTransimpedance {
  readonly feedback: number;
  readonly inputCapacitance: number;
}

export interface StableGainDemand extends NumberDemand {
  /** Null where the noise gain is that of the stage alone; else `required` is the least it can be. */
  readonly open: OpenTransimpedance | null;
  /** Fraction, of the capacitor that is left to the part. */
  readonly capacitorTolerance: number;
}

export interface PhaseMarginDemand extends NumberDemand {
  /** Ω and F, nominal. */
  readonly network: { readonly plus: PinNetwork; readonly minus: PinNetwork };
  readonly open: OpenTransimpedance | null;
  /** Farad and ohm; resistance null: capacitive only. Isolation stands between the output and both. */
  readonly load: { readonly capacitance: number; readonly resistance: number | null; readonly isolation: number };
  /** Noise gain at high frequency, lower corner, V/V: a capacitive load stated at unity gain grows with it. */
  readonly noiseGain: number;
  /** Null where no feedback capacitor can be added. */
  readonly feedback: FeedbackPlace | null;
}

/** Where a feedback capacitor could go: across this resistor (Ω), and no larger than the gain error allows (F). */
export interface FeedbackPlace {
  readonly resistance: number;
  readonly largest: number;
}
