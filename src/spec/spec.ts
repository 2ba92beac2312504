import type { Problem } from '../quantities/problem.js';
import type { Interval, Value } from './amounts.js';
import type { CapacitorsSpec, FilterSpec, IntegratorSpec, LoadSpec, OscillatorSpec, ReferenceSpec, ResistorsSpec } from './circuit-spec.js';
import type { Hazard, LimitsSpec, MarginsSpec, WishesSpec } from './limits-spec.js';
import type { LegSpec, SignalSpec } from './signal-spec.js';
import type { BatterySpec, ConverterSpec, DrivesSpec, DutyCycleSpec, FollowingSpec, PhotodiodeSpec, RippleSpec, Sequence, ShuntSpec } from './surroundings-spec.js';

export type * from './amounts.js';
export type * from './circuit-spec.js';
export type * from './limits-spec.js';
export type * from './signal-spec.js';
export type * from './surroundings-spec.js';

/** All topologies of the contract. */
export const TOPOLOGIES = [
  'follower', 'non-inverting', 'inverting', 'summing', 'difference', 'transimpedance', 'low-side-sense', 'high-side-sense',
  'sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator', 'relaxation-oscillator',
] as const;
export type Topology = (typeof TOPOLOGIES)[number];

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
  readonly capacitors?: CapacitorsSpec;
  /** Summing, in the order written. */
  readonly legs?: readonly LegSpec[];
  readonly photodiode?: PhotodiodeSpec;
  readonly shunt?: ShuntSpec;
  readonly filter?: FilterSpec;
  readonly integrator?: IntegratorSpec;
  readonly oscillator?: OscillatorSpec;
  readonly drives?: DrivesSpec;
  readonly following?: FollowingSpec;
  readonly converter?: ConverterSpec;
  readonly battery?: BatterySpec;
  /** How far beyond either rail an input can be taken, V. */
  readonly overdrive?: Value;
  readonly sequencing?: Sequence;
  readonly supplyRipple?: RippleSpec;
  readonly dutyCycle?: DutyCycleSpec;
  readonly source?: { readonly resistance: Value; readonly tolerance?: Value };
  readonly load?: LoadSpec;
  readonly temperature?: Interval;
  readonly limits: LimitsSpec;
  readonly wishes: WishesSpec;
  readonly margins: MarginsSpec;
  readonly mayChange?: readonly string[];
  /** Id of the part chosen for the stage. */
  readonly part?: string;
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
