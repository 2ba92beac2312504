import type { Problem } from '../quantities/problem.js';

/** A value with its ends; equal ends when the user gave one figure. `text` is the canonical echo. */
export interface Interval {
  readonly min: number;
  readonly nominal: number;
  readonly max: number;
  readonly text: string;
}

/** One figure with the canonical echo of what was typed. */
export interface Value {
  readonly value: number;
  readonly text: string;
}

/** All topologies of the contract; those not yet built are refused by name in `read.ts`. */
export const TOPOLOGIES = [
  'follower', 'non-inverting', 'inverting', 'summing', 'difference', 'transimpedance', 'low-side-sense', 'high-side-sense',
  'sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator', 'relaxation-oscillator',
] as const;
export const BUILT_TOPOLOGIES = ['follower', 'non-inverting', 'inverting', 'difference'] as const;
export type Topology = (typeof BUILT_TOPOLOGIES)[number];

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

/** Swing of one input: its extremes against ground (DC-coupled), volts. */
export interface Swing {
  readonly min: number;
  readonly max: number;
  readonly text: string;
}

export interface SignalSpec {
  readonly coupling: 'dc' | 'ac';
  readonly shape: 'sine' | 'band-limited';
  /** DC-coupled single input, also when given as amplitude with centre. */
  readonly input?: Swing;
  /** AC-coupled: peak volts about the bias. */
  readonly amplitude?: Value;
  /** Difference: far ends of the legs, independent of each other … */
  readonly positive?: Swing;
  readonly negative?: Swing;
  /** … or coupled: positive − negative, and their mean. */
  readonly differential?: Swing;
  readonly commonMode?: Swing;
  readonly output?: Swing;
  /** Hz. */
  readonly frequency?: { readonly bottom?: number; readonly top: number; readonly text: string };
}

export interface LoadSpec {
  /** Ohm; absent when purely capacitive. */
  readonly resistance?: Value;
  readonly to: 'ground' | 'supply' | 'reference';
  /** Farad. */
  readonly capacitance?: Value;
}

export interface LimitsSpec {
  readonly swingLoss?: Value;
  readonly gainError?: Value;
  readonly gainErrorKind?: 'magnitude' | 'vector';
  readonly dcError?: Value;
  readonly outputNoise?: Value;
  readonly snr?: Value;
  readonly distortion?: Value;
  readonly supplyCurrent?: Value;
  readonly supplyCurrentPer?: 'amplifier' | 'package';
  readonly settling?: { readonly within: Value; readonly to: Value };
  readonly phaseMargin?: Value;
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

/** Where a field was written: line and column in the file (from 1), or the option that set it. */
export interface Position {
  readonly line?: number;
  readonly column?: number;
  readonly option?: string;
}

/** The stage as the user wrote it, every field checked on its own, in SI units. Defaults are not filled in here. */
export interface StageSpec {
  readonly name?: string;
  readonly topology: Topology;
  readonly supply: Interval;
  readonly supplyPeak?: Value;
  /** Magnitude, V/V; the sign of an inverting stage is dropped on reading (−8 and 8 mean the same). */
  readonly gain?: Value;
  /** Set when an override or a change of gain keeps `resistors.feedback` and wants `input` re-derived exactly. */
  readonly keepFeedback?: boolean;
  readonly resistors?: ResistorsSpec;
  readonly reference?: ReferenceSpec;
  readonly signal: SignalSpec;
  readonly source?: { readonly resistance: Value; readonly tolerance?: Value };
  readonly load?: LoadSpec;
  readonly temperature?: Interval;
  readonly limits: LimitsSpec;
  readonly wishes: WishesSpec;
  readonly margins: MarginsSpec;
  readonly mayChange?: readonly string[];
  readonly avoid: readonly Hazard[];
  /** Things the reader did on the user's behalf (overrides), one sentence each; printed as assumptions. */
  readonly notes: readonly string[];
  /** Position of every field that was written, by dotted path. */
  readonly positions: Readonly<Record<string, Position>>;
}

/** `--set path=value` and the short options, in the order given. */
export interface Override {
  /** Dotted path in the stage file: `limits.dcError`, `signal.input`, `load`. */
  readonly path: string;
  /** As typed: a YAML scalar or flow value. */
  readonly text: string;
  /** How to name it in messages: `--gain`, `--set gain`. */
  readonly option: string;
}

export type SpecResult =
  | { readonly ok: true; readonly spec: StageSpec }
  | { readonly ok: false; readonly problems: readonly Problem[] };
