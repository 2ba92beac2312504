import { lowestHolding } from './bisection.js';
import { divide, multiply } from './complex.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';
import { gainBandwidthForLoopError, type GainDeviation } from './loop-error.js';
import { largestDeviation } from './filter-error.js';
import type { LowPass } from './low-pass-response.js';
import { gainBandwidthForTransimpedance, maximallyFlatCapacitor } from './transimpedance.js';

/** feedback Rf Ω above 0; inputCapacitance Cin F at least 0; feedbackCapacitance Cf F, null for the maximally flat one. */
export interface TransimpedanceNetwork {
  readonly feedback: number;
  readonly inputCapacitance: number;
  readonly feedbackCapacitance: number | null;
}

/**
 * The closed loop as a low-pass: Rf/[1 + s(Rf·Cf + 1/ωt) + s²·Rf(Cin+Cf)/ωt].
 * @param network Ω and F; a null Cf is the maximally flat one at this gain-bandwidth
 * @param gainBandwidth Hz, above 0; Infinity for the ideal amplifier (a null Cf is then none)
 * @returns coefficients
 * @example transimpedanceLowPass({feedback: 100e3, inputCapacitance: 50e-12, feedbackCapacitance: null}, 10e6).a is 4.145e-7 s
 * Source: own algebra.
 */
export function transimpedanceLowPass(network: TransimpedanceNetwork, gainBandwidth: number): LowPass {
  const { feedback, inputCapacitance } = network;
  requirePositive('transimpedanceLowPass', { feedback });
  requireNotNegative('transimpedanceLowPass', { inputCapacitance });
  const slowness = 1 / (2 * Math.PI * gainBandwidth);
  const capacitor = network.feedbackCapacitance ?? flatCapacitor(network, gainBandwidth);
  return { gain: feedback, a: feedback * capacitor + slowness, b: feedback * (inputCapacitance + capacitor) * slowness, c: 0 };
}

/**
 * Gain-bandwidth for a gain error at a frequency, exact. With a given Cf against the same stage with an ideal amplifier; with the
 * maximally flat one, which goes with the amplifier, against Rf.
 * @param network Ω and F
 * @param at frequency Hz above 0; error fraction above 0 and below 1; kind of deviation
 * @returns Hz
 * @example 100 kΩ, 20 pF, maximally flat, 29.3 % (−3 dB) at 1 MHz: 13.9 MHz
 * Source: own algebra; first term 2π·B²·Rf·Cin as in Graeme, Photodiode Amplifiers: Op Amp Solutions (1996) (from memory).
 */
export function gainBandwidthForTransimpedanceError(
  network: TransimpedanceNetwork,
  at: { readonly frequency: number; readonly error: number; readonly kind: GainDeviation },
): number {
  requirePositive('gainBandwidthForTransimpedanceError', { frequency: at.frequency });
  requireWithin('gainBandwidthForTransimpedanceError', { error: at.error }, { above: 0, below: 1 });
  const { feedbackCapacitance } = network;
  if (feedbackCapacitance !== null) return gainBandwidthForLoopError(loopOf({ ...network, feedbackCapacitance }, at.frequency), at.error, at.kind);
  if (at.kind === 'vector') return vectorWhenFlat(network, at);
  const excess = (at.error * (2 - at.error)) / (1 - at.error) ** 2;
  return gainBandwidthForFlatBandwidth(network, at.frequency / excess ** 0.25) ?? withoutCapacitor(network, at);
}

/**
 * Gain-bandwidth for a natural frequency of the maximally flat loop (its −3 dB bandwidth).
 * @param network Ω and F
 * @param bandwidth Hz, above 0
 * @returns Hz; null when the loop is that fast without any capacitor
 * @example gainBandwidthForFlatBandwidth({feedback: 100e3, inputCapacitance: 20e-12}, 1e6) is 13.9 MHz
 * Source: as gainBandwidthForTransimpedance().
 */
export function gainBandwidthForFlatBandwidth({ feedback, inputCapacitance }: Pick<TransimpedanceNetwork, 'feedback' | 'inputCapacitance'>, bandwidth: number): number | null {
  if (2 * Math.PI * bandwidth * feedback * inputCapacitance <= 2 - Math.SQRT2) return null;
  return gainBandwidthForTransimpedance(bandwidth, feedback, inputCapacitance);
}

function flatCapacitor({ feedback, inputCapacitance }: TransimpedanceNetwork, gainBandwidth: number): number {
  return inputCapacitance === 0 || gainBandwidth === Infinity ? 0 : maximallyFlatCapacitor({ feedback, inputCapacitance, gainBandwidth });
}

/** j·f/β with β = (1 + s·Rf·Cf)/(1 + s·Rf(Cin+Cf)). */
function loopOf({ feedback, inputCapacitance, feedbackCapacitance }: { feedback: number; inputCapacitance: number; feedbackCapacitance: number }, frequency: number) {
  const w = 2 * Math.PI * frequency;
  const noiseGain = divide({ re: 1, im: w * feedback * (inputCapacitance + feedbackCapacitance) }, { re: 1, im: w * feedback * feedbackCapacitance });
  return multiply({ re: 0, im: frequency }, noiseGain);
}

/** So slow a loop is flat, or droops, without a capacitor: |H|⁻² = (1 − ω²·Rf·Cin/ωt)² + (ω/ωt)². */
function withoutCapacitor(network: TransimpedanceNetwork, { frequency, error }: { frequency: number; error: number }): number {
  const { re, im } = loopOf({ ...network, feedbackCapacitance: 0 }, frequency);
  const excess = (error * (2 - error)) / (1 - error) ** 2;
  const square = re * re + im * im;
  return square / (Math.sqrt(re * re + square * excess) - re);
}

function vectorWhenFlat(network: TransimpedanceNetwork, at: { readonly frequency: number; readonly error: number }): number {
  const ideal: LowPass = { gain: network.feedback, a: 0, b: 0, c: 0 };
  const within = (gainBandwidth: number): boolean =>
    largestDeviation(transimpedanceLowPass(network, gainBandwidth), ideal, { top: at.frequency, kind: 'vector' }) <= at.error;
  return lowestHolding(within, at.frequency * 1e9 * Math.max(1, 2 * Math.PI * at.frequency * network.feedback * network.inputCapacitance));
}
