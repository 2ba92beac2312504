import { requirePositive, requireWithin } from './domain.js';

/**
 * Highest gain of a second-order low-pass, in units of its DC gain: Q/√(1 − 1/(4Q²)) for Q > 1/√2, else 1.
 * @param q above 0
 * @returns V/V
 * @example secondOrderPeak(2) is 2.066
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 3; Mancini (ed.),
 * Op Amps for Everyone (2002), ch. 16 (both from memory).
 */
export function secondOrderPeak(q: number): number {
  requirePositive('secondOrderPeak', { q });
  return q <= Math.SQRT1_2 ? 1 : q / Math.sqrt(1 - 1 / (4 * q * q));
}

/**
 * Where that peak stands, in units of f0: √(1 − 1/(2Q²)); 0 without a peak.
 * @param q above 0
 * @returns Hz/Hz
 * @example secondOrderPeakFrequency(1) is 0.707
 * Source: as secondOrderPeak().
 */
export function secondOrderPeakFrequency(q: number): number {
  requirePositive('secondOrderPeakFrequency', { q });
  return Math.sqrt(Math.max(0, 1 - 1 / (2 * q * q)));
}

/**
 * −3 dB frequency of a second-order low-pass in units of f0: √(a + √(a²+1)), a = 1 − 1/(2Q²).
 * @param q above 0
 * @returns Hz/Hz
 * @example secondOrderBandwidth(Math.SQRT1_2) is 1
 * Source: own algebra.
 */
export function secondOrderBandwidth(q: number): number {
  requirePositive('secondOrderBandwidth', { q });
  const a = 1 - 1 / (2 * q * q);
  // For small Q, a is a large negative number: the conjugate form avoids the difference of two near-equal numbers.
  const root = Math.sqrt(a * a + 1);
  return Math.sqrt(a < 0 ? 1 / (root - a) : a + root);
}

/**
 * Step overshoot of a second-order low-pass, as a fraction of the step: exp(−πζ/√(1−ζ²)), ζ = 1/(2Q); 0 for Q ≤ 1/2.
 * @param q above 0
 * @returns fraction
 * @example secondOrderOvershoot(1) is 0.163
 * Source: Franco (3rd ed. 2002), ch. 8 (from memory), or any text on control.
 */
export function secondOrderOvershoot(q: number): number {
  requirePositive('secondOrderOvershoot', { q });
  const zeta = 1 / (2 * q);
  return zeta >= 1 ? 0 : Math.exp((-Math.PI * zeta) / Math.sqrt(1 - zeta * zeta));
}

/**
 * Time until the envelope of a second-order step stays within a tolerance: ln[1/(ε√(1−ζ²))]/(ζ·2π·f0).
 * @param q above 1/2
 * @param naturalFrequency Hz, above 0
 * @param tolerance fraction of the step, above 0 and below 1
 * @returns s
 * @example secondOrderSettling(1, 1e6, 0.01) is 1.51 µs
 * Source: envelope of the damped sine, any text on control.
 */
export function secondOrderSettling(q: number, naturalFrequency: number, tolerance: number): number {
  requireWithin('secondOrderSettling', { q }, { above: 0.5 });
  requirePositive('secondOrderSettling', { naturalFrequency });
  requireWithin('secondOrderSettling', { tolerance }, { above: 0, below: 1 });
  const zeta = 1 / (2 * q);
  return -Math.log(tolerance * Math.sqrt(1 - zeta * zeta)) / (zeta * 2 * Math.PI * naturalFrequency);
}
