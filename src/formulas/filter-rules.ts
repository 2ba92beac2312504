import { requirePositive, requireWithin } from './domain.js';
import type { SallenKey } from './filters.js';
import { secondOrderPeak, secondOrderPeakFrequency } from './second-order.js';

/**
 * First-order shift of a Sallen-Key's f0: −(K·ω0²/(2·ωt))·[(R1+R2)C2 + R1·C1]; its Q shifts by the same amount upwards.
 * @param parts the component values
 * @param gainBandwidth Hz, above 0
 * @returns fraction of f0, negative
 * @example unity gain, equal R, Q = 5 at GBW = 1000·f0: −0.0051, that is −(Q + 1/(2Q))·f0/GBW
 * Source: own algebra; Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972 for the treatment (from memory).
 */
export function sallenKeyShift(parts: SallenKey, gainBandwidth: number): number {
  const { r1, r2, c1, c2, gain } = parts;
  requirePositive('sallenKeyShift', { r1, r2, c1, c2, gain, gainBandwidth });
  return (-gain * ((r1 + r2) * c2 + r1 * c1)) / (r1 * r2 * c1 * c2) / (4 * Math.PI * gainBandwidth);
}

/** q above 0; gain |H0| at least 0; naturalFrequency f0 and gainBandwidth in Hz, above 0. */
export interface SecondOrderStage {
  readonly q: number;
  readonly naturalFrequency: number;
  readonly gainBandwidth: number;
}

/**
 * First-order shifts of a multiple-feedback low-pass at its smallest capacitor ratio:
 * Δf0/f0 = −[Q(1+|H0|) + 1/(2Q)]·f0/GBW, ΔQ/Q = +[Q + 1/(2Q)]·f0/GBW.
 * @param stage with gain |H0|
 * @returns fractions
 * @example q 5, gain 1, GBW = 2000·f0: frequency −0.00505, q +0.00255
 * Source: own algebra; Budak & Petrela (1972) for the treatment (from memory).
 */
export function multipleFeedbackShift(stage: SecondOrderStage & { readonly gain: number }): {
  readonly frequency: number;
  readonly q: number;
} {
  const { q, gain, naturalFrequency, gainBandwidth } = stage;
  requirePositive('multipleFeedbackShift', { q, naturalFrequency, gainBandwidth });
  requireWithin('multipleFeedbackShift', { gain }, { from: 0 });
  const slowness = naturalFrequency / gainBandwidth;
  return { frequency: -(q * (1 + gain) + 1 / (2 * q)) * slowness, q: (q + 1 / (2 * q)) * slowness };
}

/**
 * Q of a two-integrator loop of three amplifiers: Q/(1 − 4Q·f0/GBW).
 * @param stage q, f0, GBW; GBW above 4Q·f0, below which the loop oscillates
 * @returns Q
 * @example twoIntegratorQ({q: 25, naturalFrequency: 10e3, gainBandwidth: 100e6}) is 25.25
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ex. 6.9.
 */
export function twoIntegratorQ({ q, naturalFrequency, gainBandwidth }: SecondOrderStage): number {
  requirePositive('twoIntegratorQ', { q, naturalFrequency });
  requireWithin('twoIntegratorQ', { gainBandwidth }, { above: 4 * q * naturalFrequency });
  return q / (1 - (4 * q * naturalFrequency) / gainBandwidth);
}

/**
 * Handbook rule for a second-order low-pass: GBW = 100·G·|H|peak·f_peak; 100·G·f0 up to Q = 1/√2. Eight times generous for a
 * unity-gain Butterworth Sallen-Key, too small for multiple feedback and for capacitor ratios above the minimum: a rule of
 * thumb to show, not to decide with.
 * @param gain V/V at DC, above 0
 * @param naturalFrequency Hz, above 0
 * @param q above 0
 * @returns Hz
 * @example handbookGainBandwidth(1, 10e3, 5) is 4.975 MHz
 * Source: Mancini (ed.), Op Amps for Everyone (2002), sec. 16.8.4 (from memory; rewritten through peak gain and peak frequency).
 */
export function handbookGainBandwidth(gain: number, naturalFrequency: number, q: number): number {
  requirePositive('handbookGainBandwidth', { gain, naturalFrequency, q });
  if (q <= Math.SQRT1_2) return 100 * gain * naturalFrequency;
  return 100 * gain * secondOrderPeak(q) * naturalFrequency * secondOrderPeakFrequency(q);
}
