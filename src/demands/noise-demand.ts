import type { NoiseGrid } from '../formulas/noise-grid.js';
import type { NumberDemand } from './demand.js';

/** What the amplifier at hand adds to the network at the − input, F; the feedback capacitor only where it is left to the part. */
export interface PartCapacitances {
  readonly input: number;
  readonly feedback: number | null;
}

export interface NoiseDemand extends NumberDemand {
  /** The stage without its amplifier. */
  readonly grid: (part: PartCapacitances) => NoiseGrid;
  /** True where the capacitance of the amplifier's own input belongs to the circuit: transimpedance. */
  readonly countsInput: boolean;
  /** Transimpedance with the capacitor left to the part: Rf in Ω, Cin in F. */
  readonly open: { readonly feedback: number; readonly inputCapacitance: number } | null;
  /** V rms allowed at the output; null without `limits.outputNoise`. */
  readonly rms: number | null;
  /** Signal to noise at least, V/V; null without `limits.snr`. */
  readonly ratio: number | null;
  /** °C the resistors are counted at. */
  readonly temperature: number;
  /** Shot noise of the largest photodiode current, A/√Hz; 0 without a photodiode. */
  readonly shot: number;
  /** One step of the converter over √12, V; 0 without a converter. */
  readonly quantisation: number;
  /** The output the stage wants, nominal, within the range of the converter, V. */
  readonly output: { readonly min: number; readonly max: number };
  /** Nothing of the resistances at the inputs: current noise needs no figure. */
  readonly sees: { readonly plus: boolean; readonly minus: boolean };
}
