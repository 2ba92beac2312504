import type { DemandBase, InputSwingRange, NumberDemand, WordDemand } from './demand.js';
import type { InputSwing, NoiseGainAt } from './speed-demand.js';

/** A hazard is judged when the stage writes `avoid`; else it is a caution. */
interface Avoided {
  readonly avoided: boolean;
}

/** The inputs crossing from one pair to the other: distances below V+ over all corners, V, and swings that cross with the signal. */
export interface CrossoverDemand extends WordDemand, Avoided {
  readonly inputs: InputSwingRange;
  readonly swings: readonly InputSwing[];
  /** The inputs move with the signal; else they rest. */
  readonly moves: boolean;
  /** Of a signal that repeats, Hz; null: not said. */
  readonly frequency: number | null;
  /** Largest supply, V: the rejection over it bounds the step. */
  readonly supply: number;
}

/** How the inputs of the amplifier may leave the rails. */
export interface InputReach {
  /** V beyond either rail; null: not said. */
  readonly beyond: number | null;
  /** V at the input of the stage while the supply is off, 0 with the supply first; null: not said. */
  readonly unpowered: number | null;
  /** Ω between the input of the stage and that of the amplifier. */
  readonly series: number;
  /** The inputs rest at the reference, out of reach of any signal. */
  readonly still: boolean;
}

export interface PhaseReversalDemand extends WordDemand, Avoided {
  readonly reach: InputReach;
}

/** Largest voltage between the inputs while the amplifier keeps up, V. */
export interface ClampDemand extends NumberDemand, Avoided {
  /** V between the inputs once the part is slower than this slope, V/s; null where nothing asks a slope. */
  readonly slewing: { readonly slewRate: number; readonly apart: number } | null;
  /** V: inputs without diodes between them are never further apart than this. */
  readonly supply: number;
}

/** How far beyond a rail the input of the stage is taken, V; null: the stage does not say. */
export interface OverdriveDemand extends DemandBase, Avoided {
  readonly required: number | null;
  readonly unit: 'V';
  readonly sense: 'at-least';
  readonly reach: InputReach;
}

/** Ripple at the output, V peak; `required` null: no limit written. */
export interface SupplyRippleDemand extends DemandBase {
  readonly required: number | null;
  readonly unit: 'V';
  readonly sense: 'at-most';
  /** V peak, Hz. */
  readonly amplitude: number;
  readonly frequency: number;
  /** |1/(1/A + β)| there, V/V. */
  readonly noiseGainAt: NoiseGainAt;
}

/** From switching on to a usable output, s; `required` null: no limit written. */
export interface StartUpDemand extends DemandBase {
  readonly required: number | null;
  readonly unit: 's';
  readonly sense: 'at-most';
  /** s the supply is on at a time; null: always on. */
  readonly on: number | null;
  /** The signal is there first, or leaves the rails: the output starts from an overload. */
  readonly overloaded: boolean;
}
