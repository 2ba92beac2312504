import type { MultipleFeedback, SallenKey } from '../formulas/filters.js';
import type { LowPass } from '../formulas/low-pass-response.js';

/** What a stage does over frequency, beyond a constant gain with the one pole of its amplifier. SI units, nominal values. */
export type StageResponse =
  /** One pole at GBW/NG. */
  | { readonly kind: 'amplifier' }
  | TransimpedanceResponse
  | LowPassResponse
  | IntegratorResponse
  | OscillatorResponse;

export interface TransimpedanceResponse {
  readonly kind: 'transimpedance';
  /** Rf, Ω. */
  readonly feedback: number;
  /** Diode and wiring, F; the amplifier adds its own. */
  readonly inputCapacitance: number;
  /** F as fitted; null: the maximally flat one for the amplifier at hand. */
  readonly feedbackCapacitance: number | null;
  /** Largest current through the diode, A: signal, ambient and dark at the hottest. */
  readonly largestCurrent: number;
}

export interface LowPassResponse {
  readonly kind: 'low-pass';
  readonly form: 'sallen-key' | 'multiple-feedback';
  readonly parts: SallenKey | MultipleFeedback;
  /** Natural frequency (Hz) and Q of the ideal filter with the parts as fitted. */
  readonly corner: number;
  readonly q: number;
  /** How much larger than by its DC gain the output swings with nominal components, at least 1: peak within the band, or overshoot. */
  readonly growth: number;
  /** The filter with an amplifier of this gain bandwidth (Hz; Infinity: ideal). */
  responseAt(gainBandwidth: number): LowPass;
}

export interface IntegratorResponse {
  readonly kind: 'integrator';
  readonly resistance: number;
  readonly capacitance: number;
  /** Where the output is steepest: every component at its least, Ω and F; `bleed` across the capacitor, Infinity without. */
  readonly steepest: { readonly resistance: number; readonly capacitance: number; readonly bleed: number };
  /** s from reset to reset; null: runs on. */
  readonly window: number | null;
}

export interface OscillatorResponse {
  readonly kind: 'oscillator';
  /** Wanted, Hz. */
  readonly frequency: number;
  /** Longest edge, s, 10 % to 90 %. */
  readonly edge: number;
  readonly toSupply: number;
  readonly toGround: number;
  readonly toOutput: number;
  /** R·C as fitted, s; and how far component tolerances, thresholds included, move the frequency at worst, relative. */
  readonly timeConstant: number;
  readonly spread: number;
  readonly resistance: number;
  readonly capacitance: number;
  /** Logic thresholds as shares of the supply and the longest time between them, s; null without. */
  readonly drives: { readonly low: number; readonly high: number; readonly maxEdge: number | null } | null;
}
