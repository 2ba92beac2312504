import type { AmplifierNetwork, InputPoint, Span, StageResistors } from './stage.js';

/** One set of component values: ideal output and input common mode as functions of the inputs, the reference and the supply. */
export interface RatioCorner {
  readonly noiseGain: number;
  output(point: InputPoint, reference: number, supply: number): number;
  commonMode(point: InputPoint, reference: number, supply: number): number;
}

/** What stands at the amplifier when the current of its network is asked. Volts. */
export interface NetworkPoint {
  readonly inputs: InputPoint;
  readonly output: number;
  readonly reference: number;
  readonly supply: number;
}

/** `V/A`: transresistance; `1/s`: integrator; null: no gain at all (oscillator). */
export type GainUnit = 'V/V' | 'V/A' | '1/s' | null;

/** What a topology says about itself once its resistors are known. */
export interface Circuit {
  readonly gain: number;
  readonly gainUnit: GainUnit;
  readonly noiseGain: Span;
  readonly dcNoiseGain: Span;
  readonly resistors: StageResistors | null;
  readonly nominal: RatioCorner;
  readonly corners: readonly RatioCorner[];
  /** The same at signal frequencies, where a bypass takes the resistance of the reference out of a leg; absent where nothing changes. */
  readonly signalCorners?: readonly RatioCorner[];
  /** Siemens: feedback-network current at nominal resistors per volt between output and the far end of the network. */
  readonly networkConductance: number;
  /** The voltage at the far end of the feedback network: the reference, or the pins (difference). */
  networkEnd(commonMode: number, reference: number): number;
  /** Out of the output pin, A, where conductance and far end alone do not say it. */
  networkCurrent?(at: NetworkPoint): number;
  /** What capacitors of the network add to it at a frequency (Hz), seen from the output: siemens in phase, and farads; absent without. */
  capacitiveLoading?(frequency: number): { readonly conductance: number; readonly capacitance: number };
  readonly seriesPositive: number;
  readonly seriesNegative: number;
  readonly resistorRejection: number | null;
  /** Null for the oscillator. */
  readonly network: AmplifierNetwork | null;
  readonly notes: readonly string[];
}

/** Series resistances and coupling a topology folds into its ratios. Ohm. */
export interface Surroundings {
  readonly ac: boolean;
  readonly sourceResistance: number;
  /** Fraction; 0 unless given. */
  readonly sourceTolerance: number;
  readonly referenceResistance: number;
  /** Farad across the reference; 0 without. */
  readonly referenceBypass: number;
  /** What of the resistance of the reference a leg sees at the top frequency, beside its bypass. */
  readonly signalResistance: number;
  /** Farad from output to inverting input; 0 without. */
  readonly feedbackCapacitance: number;
}

const between = (nominal: number, tolerance: number, sign: 1 | -1): number => nominal * (1 + sign * tolerance);

/**
 * Worst-case ratio of (top + topExact) over (bottom + series), each resistor at its own tolerance end.
 * Two resistors of tolerance t: rho(1-t)/(1+t) .. rho(1+t)/(1-t) (M0: own algebra, a ratio is monotone in each resistor).
 */
export function ratioSpan(
  top: { readonly value: number; readonly tolerance: number; readonly exact?: number },
  bottom: { readonly value: number; readonly tolerance: number; readonly series?: number; readonly seriesTolerance?: number },
): Span {
  const ratio = (sign: 1 | -1 | 0): number => {
    const up = sign === 0 ? top.value : between(top.value, top.tolerance, sign);
    const down = sign === 0 ? bottom.value : between(bottom.value, bottom.tolerance, sign === 1 ? -1 : 1);
    const series = bottom.series ?? 0;
    const seriesNow = sign === 0 ? series : between(series, bottom.seriesTolerance ?? 0, sign === 1 ? -1 : 1);
    return (up + (top.exact ?? 0)) / (down + seriesNow);
  };
  return { min: ratio(-1), nominal: ratio(0), max: ratio(1) };
}

/** Adds one to each end of a span: noise gain of a ratio. */
export function plusOne(ratio: Span): Span {
  return { min: 1 + ratio.min, nominal: 1 + ratio.nominal, max: 1 + ratio.max };
}

export const UNITY: Span = { min: 1, nominal: 1, max: 1 };

export function parallel(a: number, b: number): number {
  return a + b === 0 ? 0 : (a * b) / (a + b);
}

export function inputOf(point: InputPoint, name: string): number {
  const value = point[name];
  if (value === undefined) throw new RangeError(`no input named ${name} at this stage`);
  return value;
}
