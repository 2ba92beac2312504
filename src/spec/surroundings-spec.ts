import type { Interval, Swing, Value } from './amounts.js';

/** Currents in A, capacitance in F, resistance in Ω. */
export interface PhotodiodeSpec {
  readonly current: Swing;
  /** `into-node`: pushed into the summing node (anode there), output goes down; `out-of-node`: cathode there, output goes up. */
  readonly direction: 'into-node' | 'out-of-node';
  /** Diode and wiring at the node, without the amplifier's own. */
  readonly capacitance: Value;
  /** Dark current at 25 °C; doubles per 10 K. */
  readonly dark?: Value;
  /** Light that is always there, as current. */
  readonly ambient?: Swing;
}

/** Current in A (negative: reverse), resistance in Ω, bus in V (high side). */
export interface ShuntSpec {
  readonly resistance: Value;
  readonly tolerance?: Value;
  readonly current: Swing;
  readonly bus?: Interval;
}

/** The logic an output drives: thresholds as shares of the supply, longest time allowed between them in s. */
export interface DrivesSpec {
  readonly threshold: Swing;
  readonly maxEdge?: Value;
}

/** The filter that follows, Hz and order (Butterworth). */
export interface FollowingSpec {
  readonly corner: Value;
  readonly order: number;
}

export interface ConverterSpec {
  readonly bits: number;
  /** Volts. */
  readonly range: Swing;
}

/** Capacity in A·s (as written in mAh), what of it is usable as a fraction, what else draws from it in A. */
export interface BatterySpec {
  readonly capacity: Value;
  readonly usable?: Value;
  readonly others?: Value;
}

/** Ripple on the supply: peak volts, Hz. */
export interface RippleSpec {
  readonly amplitude: Value;
  readonly frequency: Value;
}

/** The supply is on for so long in every period, s. */
export interface DutyCycleSpec {
  readonly on: Value;
  readonly every: Value;
}

/** What is there first, the supply or the signal. */
export type Sequence = 'supply-first' | 'signal-first';
