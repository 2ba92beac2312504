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

/** All topologies of the contract. */
export const TOPOLOGIES = [
  'follower', 'non-inverting', 'inverting', 'summing', 'difference', 'transimpedance', 'low-side-sense', 'high-side-sense',
  'sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator', 'relaxation-oscillator',
] as const;
export type Topology = (typeof TOPOLOGIES)[number];

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
  readonly shape: SignalShape;
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
  /** Hz. Of a pulse: its repetition. */
  readonly frequency?: { readonly bottom?: number; readonly top: number; readonly text: string };
  /** Step and pulse: 10 % to 90 % time wanted at the output, s. */
  readonly edge?: Value;
  /** Pulse: share of the period spent high, 0..1; absent: free. */
  readonly duty?: Value;
  /** How long one looks, s: its inverse is the lowest noise frequency. */
  readonly observation?: Value;
}

export type SignalShape = 'sine' | 'band-limited' | 'step' | 'pulse';

/** One leg of a summing stage: a signal or a fixed level through a resistor. */
export interface LegSpec {
  readonly name: string;
  /** `signal`: swing against ground (AC-coupled: about zero). The others move with the supply or rest at the reference. */
  readonly level: { readonly kind: 'signal'; readonly swing: Swing } | { readonly kind: 'supply' } | { readonly kind: 'reference' };
  /** One of the two is given: ohm, or the magnitude of the gain from this leg. */
  readonly resistance?: Value;
  readonly gain?: Value;
}

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

export interface LoadSpec {
  /** Ohm; absent when purely capacitive. */
  readonly resistance?: Value;
  readonly to: 'ground' | 'supply' | 'reference';
  /** Farad. */
  readonly capacitance?: Value;
  /** Ohm in series between the amplifier and its load, outside the loop. */
  readonly isolation?: Value;
}

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
