import { requireNotNegative, requirePositive } from './domain.js';
import { secondOrderBandwidth } from './second-order.js';

/** feedback Rf Ω; inputCapacitance Cin F; feedbackCapacitance Cf F; gainBandwidth Hz; all above 0. */
export interface TransimpedanceStage {
  readonly feedback: number;
  readonly inputCapacitance: number;
  readonly feedbackCapacitance: number;
  readonly gainBandwidth: number;
}

/**
 * Natural frequency, Q and −3 dB bandwidth with an integrating amplifier: f0 = √(GBW/(2π·Rf(Cin+Cf))),
 * Q = 1/[ω0(Rf·Cf + 1/ωt)].
 * @returns Hz, Q, Hz
 * @example 100 kΩ, 50 pF, 3.986 pF, 10 MHz: f0 543 kHz, Q 0.707
 * Source: own algebra.
 */
export function transimpedanceResponse(stage: TransimpedanceStage) {
  const { feedback, inputCapacitance, feedbackCapacitance, gainBandwidth } = stage;
  requirePositive('transimpedanceResponse', { feedback, inputCapacitance, feedbackCapacitance, gainBandwidth });
  const slowness = 1 / (2 * Math.PI * gainBandwidth);
  const angular = 1 / Math.sqrt(slowness * feedback * (inputCapacitance + feedbackCapacitance));
  const q = 1 / (angular * (feedback * feedbackCapacitance + slowness));
  const naturalFrequency = angular / (2 * Math.PI);
  return { naturalFrequency, q, bandwidth: naturalFrequency * secondOrderBandwidth(q) };
}

/** feedback Rf Ω, inputCapacitance Cin F, gainBandwidth Hz; all above 0. */
export type UncompensatedStage = Omit<TransimpedanceStage, 'feedbackCapacitance'>;

/**
 * Feedback capacitor for the maximally flat response, exact: √[Cin/(π·Rf·GBW) − 1/(2π·Rf·GBW)²].
 * @returns F; 0 when the amplifier is so slow that no capacitor is needed
 * @example 100 kΩ, 50 pF, 10 MHz: 3.986 pF
 * Source: Graeme, Photodiode Amplifiers: Op Amp Solutions (1996), ch. 3 (from memory); exact form own algebra.
 */
export function maximallyFlatCapacitor({ feedback, inputCapacitance, gainBandwidth }: UncompensatedStage): number {
  requirePositive('maximallyFlatCapacitor', { feedback, inputCapacitance, gainBandwidth });
  const unit = 1 / (2 * Math.PI * feedback * gainBandwidth);
  return Math.sqrt(Math.max(0, 2 * inputCapacitance * unit - unit ** 2));
}

/**
 * Feedback capacitor where the asymptotes meet: [1 + √(1 + 8π·Rf·Cin·GBW)]/(4π·Rf·GBW). Sold as 45°, truly 52..54°.
 * @returns F
 * @example 100 kΩ, 50 pF, 10 MHz: 2.902 pF
 * Source: Graeme (1996), ch. 3 (from memory).
 */
export function intersectionCapacitor({ feedback, inputCapacitance, gainBandwidth }: UncompensatedStage): number {
  requirePositive('intersectionCapacitor', { feedback, inputCapacitance, gainBandwidth });
  const unit = 4 * Math.PI * feedback * gainBandwidth;
  return (1 + Math.sqrt(1 + 2 * unit * inputCapacitance)) / unit;
}

/**
 * Smallest gain-bandwidth for a maximally flat bandwidth B, exact: ωt = [b + √(b² − 4ω0²)]/2 with ω0 = 2πB and
 * b = ω0²·Rf·Cin + √2·ω0. The usual 2π·B²·Rf·Cin forgets Cf and is about 10 % short.
 * @param bandwidth Hz, above 0
 * @param feedback Ω, above 0
 * @param inputCapacitance F, above 0; 2π·B·Rf·Cin at least 2 − √2, else Cf would have to be negative
 * @returns Hz
 * @example gainBandwidthForTransimpedance(1e6, 100e3, 20e-12) is 13.9 MHz
 * Source: own algebra; first term as in Graeme (1996) (from memory).
 * @throws RangeError when the stage is flat without any capacitor: then the bandwidth limit is GBW itself.
 */
export function gainBandwidthForTransimpedance(bandwidth: number, feedback: number, inputCapacitance: number): number {
  requirePositive('gainBandwidthForTransimpedance', { bandwidth, feedback, inputCapacitance });
  const angular = 2 * Math.PI * bandwidth;
  const b = angular ** 2 * feedback * inputCapacitance + Math.SQRT2 * angular;
  requirePositive('gainBandwidthForTransimpedance', { '2π·B·Rf·Cin − (2 − √2)': b / angular - 2 });
  return (b + Math.sqrt(b * b - 4 * angular ** 2)) / (4 * Math.PI);
}

/**
 * Noise gain at high frequency, which decides the minimum stable gain: 1 + Cin/Cf.
 * @param inputCapacitance F, at least 0 (an inverting stage without any: exactly 1)
 * @param feedbackCapacitance F, above 0
 * @returns V/V
 * @example highFrequencyNoiseGain(50e-12, 3.986e-12) is 13.5
 * Source: Graeme (1996) (from memory).
 */
export function highFrequencyNoiseGain(inputCapacitance: number, feedbackCapacitance: number): number {
  requireNotNegative('highFrequencyNoiseGain', { inputCapacitance });
  requirePositive('highFrequencyNoiseGain', { feedbackCapacitance });
  return 1 + inputCapacitance / feedbackCapacitance;
}
