import type { Interval, Value } from './amounts.js';

export interface ResistorsSpec {
  readonly feedback?: Value;
  readonly input?: Value;
  /** Difference only: R3 and R4. */
  readonly positiveInput?: Value;
  readonly toReference?: Value;
  /** Fraction, 0.01 = 1 %; absent means the default (1 %, printed as an assumption). */
  readonly tolerance?: Value;
}

export interface ReferenceSpec {
  readonly kind: 'ground' | 'mid-supply' | 'voltage';
  /** For `voltage`: its ends. For `mid-supply`: the relative ends of the fraction, 1-t, 1, 1+t. For `ground`: zeros. */
  readonly value: Interval;
  /** Ohm; 0 when stiff. */
  readonly resistance?: Value;
  /** Farad. */
  readonly bypass?: Value;
}

/** Either corner (Hz) and q, or the components (Ω, F) as fitted. */
export interface FilterSpec {
  readonly corner?: Value;
  readonly q?: Value;
  readonly r1?: Value;
  readonly r2?: Value;
  /** Multiple feedback only. */
  readonly r3?: Value;
  readonly c1?: Value;
  readonly c2?: Value;
}

/** Capacitors around the amplifier: F, tolerance as a fraction. */
export interface CapacitorsSpec {
  /** Output to inverting input. */
  readonly feedback?: Value;
  readonly tolerance?: Value;
}

export interface IntegratorSpec {
  /** Input resistor Ω and integrating capacitor F. */
  readonly resistance: Value;
  readonly capacitance: Value;
  /** Time from one reset to the next, s; absent: the signal's lowest frequency bounds the swing. */
  readonly window?: Value;
}

export interface OscillatorSpec {
  /** Hz. */
  readonly frequency: Value;
  /** Longest edge as a share of the half period; default 5 %. */
  readonly edge?: Value;
  /** Timing resistor and capacitor; one or both chosen when absent. */
  readonly resistance?: Value;
  readonly capacitance?: Value;
  /** Threshold resistors to the supply, to ground and to the output. */
  readonly toSupply?: Value;
  readonly toGround?: Value;
  readonly toOutput?: Value;
}

export interface LoadSpec {
  /** Ohm; absent when purely capacitive. */
  readonly resistance?: Value;
  readonly to: 'ground' | 'supply' | 'reference';
  /** Farad. */
  readonly capacitance?: Value;
  /** Ohm in series between the amplifier and its load, outside the loop. */
  readonly isolation?: Value;
}
