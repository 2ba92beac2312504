import type { Value } from './amounts.js';

/** `corner`: shift of the −3 dB frequency of a filter. */
export type GainErrorKind = 'magnitude' | 'vector' | 'corner';

export interface LimitsSpec {
  readonly swingLoss?: Value;
  readonly gainError?: Value;
  readonly gainErrorKind?: GainErrorKind;
  readonly dcError?: Value;
  readonly outputNoise?: Value;
  readonly snr?: Value;
  readonly distortion?: Value;
  readonly supplyCurrent?: Value;
  readonly supplyCurrentPer?: 'amplifier' | 'package';
  readonly settling?: { readonly within: Value; readonly to: Value };
  readonly phaseMargin?: Value;
  /** °C. */
  readonly junctionTemperature?: Value;
  /** Oscillator: fraction. */
  readonly frequencyError?: Value;
  /** Ripple at the output, peak volts; time to a usable output, s. */
  readonly supplyRipple?: Value;
  readonly startUp?: Value;
}

export interface WishesSpec {
  readonly channels?: number;
  readonly package?: readonly string[];
  readonly qualification?: string;
  readonly status?: readonly string[];
  readonly lifecycle?: readonly string[];
  readonly price?: { readonly amount: number; readonly currency: string; readonly text: string };
}

export interface MarginsSpec {
  readonly slewRate?: number;
  readonly gainBandwidth?: number;
  /** Volts. */
  readonly outputHeadroom?: Value;
}

export type Hazard = 'crossover' | 'phase-reversal' | 'clamp' | 'overdrive';
