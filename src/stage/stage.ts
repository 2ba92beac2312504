import type { PinNetwork } from '../formulas/pin-network.js';
import type {
  BatterySpec, ConverterSpec, DutyCycleSpec, FollowingSpec, Hazard, LimitsSpec, MarginsSpec, RippleSpec, Sequence, SignalShape, Topology, Value, WishesSpec,
} from '../spec/spec.js';
import type { GainUnit } from './circuit.js';
import type { StageEnds } from './ends.js';
import type { StageResponse } from './response.js';

/**
 * Values at the ends of the stage's inputs at one corner: `input`, `positive` and `negative`, the name of a leg, `bus` in V; `current`
 * in A; `level` 0 or 1 of an oscillator's output; `elapsed` in s since the reset of an integrator.
 */
export type InputPoint = Readonly<Record<string, number>>;

/** Ends and middle of something that varies. */
export interface Span {
  readonly min: number;
  readonly nominal: number;
  readonly max: number;
}

/** Resistors of the stage, ohm, as fitted (series resistances of source and reference are kept apart). */
export interface StageResistors {
  readonly feedback: number;
  readonly input: number;
  readonly positiveInput?: number;
  readonly toReference?: number;
  /** Fraction. */
  readonly tolerance: number;
}

/** One corner of supply, reference, resistor ratios and signal, with what stands at the amplifier there. Volts and amperes. */
export interface Vertex {
  readonly supply: number;
  readonly reference: number;
  readonly inputs: InputPoint;
  readonly output: number;
  readonly commonMode: number;
  /** Currents out of the output pin (positive: the amplifier sources), resistive part only. */
  readonly loadCurrent: number;
  readonly networkCurrent: number;
}

/** Peak output current at one supply and reference, nominal resistors. Amperes, positive out of the pin. */
export interface CurrentPeak {
  readonly supply: number;
  readonly reference: number;
  /** At the centre of the signal. */
  readonly centre: number;
  /** Amplitude about it: phasor sum of the resistive and the capacitive part (M6). */
  readonly swing: number;
}

export interface StageLoad {
  /** Ohm; null without a resistive load. */
  readonly resistance: number | null;
  readonly to: 'ground' | 'supply' | 'reference';
  /** Farad. */
  readonly capacitance: number;
  /** Ohm in series with the load, outside the loop; 0 without. */
  readonly isolation: number;
}

/** The passive network at each amplifier input, nominal values; AC grounds are ground. */
export interface AmplifierNetwork {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
}

/** The circuit the specification implies: all a demand may ask about. Never knows a part. SI units. */
export interface Stage {
  readonly name: string | null;
  readonly topology: Topology;
  readonly coupling: 'dc' | 'ac';
  readonly supply: Span;
  readonly supplyPeak: number;
  readonly temperature: Span;
  /** Signed signal gain at nominal components, in `gainUnit`; 0 with no gain. */
  readonly gain: number;
  readonly gainUnit: GainUnit;
  /** Noise gain that sets bandwidth and stability, V/V. */
  readonly noiseGain: Span;
  /** Noise gain at DC: what multiplies an offset. 1 when a capacitor blocks DC. */
  readonly dcNoiseGain: Span;
  readonly resistors: StageResistors | null;
  readonly vertices: readonly Vertex[];
  readonly peaks: readonly CurrentPeak[];
  /** Extremes of the ideal output and of the input common mode over all vertices, and of the output at nominal values. */
  readonly output: { readonly min: number; readonly max: number };
  readonly outputNominal: { readonly min: number; readonly max: number };
  readonly commonMode: { readonly min: number; readonly max: number };
  /** Largest peak of the output about its middle at one corner, V. */
  readonly outputPeak: number;
  /** The same at signal frequencies, V: larger where a bypass takes the resistance of the reference out of the gain, never smaller. */
  readonly signalPeak: number;
  /** Largest step of the signal at the output, V: its peak-to-peak size. */
  readonly outputStep: number;
  readonly shape: SignalShape;
  /** Step and pulse: 10 % to 90 % time wanted at the output, s; null when not asked. */
  readonly edge: number | null;
  /** Null for the oscillator, which is no linear amplifier. */
  readonly network: AmplifierNetwork | null;
  /** What the stage does over frequency beyond a constant gain. */
  readonly response: StageResponse;
  /** s; null: not said (0.1 Hz is then the lowest noise frequency). */
  readonly observation: number | null;
  /** Top of the signal band, Hz; null when not given. */
  readonly frequency: number | null;
  /** Resistance in series with the + and the - input as their bias currents see it, ohm, nominal. */
  readonly seriesPositive: number;
  readonly seriesNegative: number;
  readonly resistorTolerance: number;
  /** Fraction, of the capacitors around the amplifier; 0 without any. */
  readonly capacitorTolerance: number;
  /** How much the source resistance in series with an input may itself be off, Ω; listed beside the DC error, not charged. */
  readonly sourceSpread: number;
  readonly load: StageLoad | null;
  /** Siemens: how load and feedback current change with the output voltage. */
  readonly loadConductance: number;
  readonly networkConductance: number;
  /** Difference only: the worst matching of the resistor ratios, relative; its effect on common-mode rejection is listed. */
  readonly resistorRejection: number | null;
  /** Relative half-width of the reference and its series resistance, Ω; 0 of a stiff, exact one. */
  readonly referenceTolerance: number;
  readonly referenceResistance: number;
  /** What stands at the outer ends, for drawings. */
  readonly ends: StageEnds;
  /** What the stage does not do as it was asked, one sentence each. */
  readonly cautions: readonly string[];
  readonly assumptions: readonly string[];
  /** What the team asks beyond the circuit, as written. */
  readonly asked: Asked;
}

/** Limits, wishes and margins of the stage file, passed on to the demands. */
export interface Asked {
  readonly limits: LimitsSpec;
  readonly wishes: WishesSpec;
  readonly margins: MarginsSpec;
  readonly avoid: readonly Hazard[];
  readonly following: FollowingSpec | null;
  readonly converter: ConverterSpec | null;
  readonly battery: BatterySpec | null;
  /** V beyond either rail; null: not said. */
  readonly overdrive: Value | null;
  readonly sequencing: Sequence | null;
  readonly supplyRipple: RippleSpec | null;
  readonly dutyCycle: DutyCycleSpec | null;
}
