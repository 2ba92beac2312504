import type { Hazard, LimitsSpec, MarginsSpec, Topology, WishesSpec } from '../spec/spec.js';

/** Values at the ends of the stage's inputs at one corner, volts: `input`, or `positive` and `negative`. */
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
  /** Amplitude about it: phasor sum of the resistive and the capacitive part (method.md 6, HDR-08). */
  readonly swing: number;
}

export interface StageLoad {
  /** Ohm; null without a resistive load. */
  readonly resistance: number | null;
  readonly to: 'ground' | 'supply' | 'reference';
  /** Farad. */
  readonly capacitance: number;
}

/** The circuit the specification implies: all a demand may ask about. Never knows a part. SI units. */
export interface Stage {
  readonly name: string | null;
  readonly topology: Topology;
  readonly coupling: 'dc' | 'ac';
  readonly supply: Span;
  readonly supplyPeak: number;
  readonly temperature: Span;
  /** Signed signal gain at nominal resistors, V/V. */
  readonly gain: number;
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
  /** Top of the signal band, Hz; null when not given. */
  readonly frequency: number | null;
  /** Resistance in series with the + and the - input as their bias currents see it, ohm, nominal. */
  readonly seriesPositive: number;
  readonly seriesNegative: number;
  readonly resistorTolerance: number;
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
}
