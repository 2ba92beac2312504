import type { LowPass } from '../formulas/low-pass-response.js';
import type { HeadroomVertex, NumberDemand } from './demand.js';

export interface SlewRateDemand extends NumberDemand {
  readonly motion: SineMotion | EdgeMotion | GivenMotion;
}

/** A signal limited to a band: Hz, and the noise gain at its third harmonic, for the estimate of the distortion near the limit. */
export interface SineMotion {
  readonly kind: 'sine';
  readonly frequency: number;
  readonly noiseGainAt: NoiseGainAt;
}

/** Noise gain where the third harmonic is, V/V, at least 1, with the amplifier at hand. */
export type NoiseGainAt = (loop: Loop) => number;

/** An edge the closed loop makes with the amplifier at hand: the demand is the floor, what a part needs depends on its bandwidth. */
export interface EdgeMotion {
  readonly kind: 'edge';
  /** 10 % to 90 %, s, as wanted. */
  readonly edge: number;
  /** Null: no slew rate makes the edge with this loop. */
  slewRateAt(loop: Loop): SlewNeed | null;
  /** 10 % to 90 % of this loop without slewing, s. */
  linearEdge(loop: Loop): number;
}

/** The demand is the same for every part. */
export interface GivenMotion {
  readonly kind: 'given';
}

/** V/s: the least slew rate lies between the two; equal where the form is exact. */
export interface SlewNeed {
  readonly best: number;
  readonly worst: number;
}

/** What of a part closes the loop: Hz, and the farads its input adds (0 when not known). */
export interface Loop {
  readonly gainBandwidth: number;
  readonly inputCapacitance: number;
}

export interface GainBandwidthDemand extends NumberDemand {
  /** With the capacitance of the part's own input, F; null where that does not count. The demand itself counts none. */
  readonly requiredWith: ((inputCapacitance: number) => number) | null;
}

export interface SettlingDemand extends NumberDemand {
  /** V, and fraction of it. */
  readonly step: number;
  readonly tolerance: number;
  readonly closedLoop: ClosedLoop;
  /** Load the output current charges: F, the resistive current beside it, A, and the supply it flows at; null without capacitance. */
  readonly load: ChargedLoad | null;
}

/** A stage as a low-pass with the amplifier at hand. */
export interface ClosedLoop {
  /** `exact`: one pole, so that slewing and settling join exactly. */
  readonly form: 'one-pole' | 'more-poles';
  /** Whether the capacitance of the amplifier's own input counts. */
  readonly countsInput: boolean;
  at(loop: Loop): LowPass;
  /** The same components about an endless amplifier. */
  idealAt(loop: Loop): LowPass;
}

export interface ChargedLoad {
  readonly capacitance: number;
  readonly resistiveCurrent: number;
  readonly supply: number;
}

export interface DistortionDemand extends NumberDemand {
  /** Null without a frequency, or of a step: then slewing does not count. */
  readonly slewing: SlewingDemand | null;
  readonly corners: readonly ClippingCorner[];
  readonly crossovers: readonly InputSwing[];
  /** Closest the inputs come to V+, V. */
  readonly closest: number;
  /** Peak of the output, V. */
  readonly peak: number;
  /** For the offset's share of the head-room. */
  readonly noiseGain: number;
  readonly kelvin: number;
}

/** Hz, the slope of the largest sine, V/s, and the noise gain where its third harmonic is. */
export interface SlewingDemand {
  readonly frequency: number;
  readonly slewRate: number;
  readonly noiseGainAt: NoiseGainAt;
  /** Whether the capacitance of the amplifier's own input counts. */
  readonly countsInput: boolean;
  /** Capacitors remember the slewing: the closed form of a sine beyond the limit holds only about. */
  readonly remembers: boolean;
}

/** One corner of supply and reference: peak of the output there, V, and the bare room at each rail. */
export interface ClippingCorner {
  readonly peak: number;
  readonly low: readonly HeadroomVertex[];
  readonly high: readonly HeadroomVertex[];
}

/** How far below V+ the inputs swing at one corner, V, and what their swing is at the output, V/V. */
export interface InputSwing {
  readonly near: number;
  readonly far: number;
  readonly supply: number;
  readonly noiseGain: number;
  readonly outputPeak: number;
}
