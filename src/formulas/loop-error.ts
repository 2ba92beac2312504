import type { Complex } from './complex.js';
import { requireFinite, requireWithin } from './domain.js';

/** Which deviation from the ideal gain counts: of its magnitude, or of the phasor. */
export type GainDeviation = 'magnitude' | 'vector';

/**
 * Gain-bandwidth that keeps a loop of one integrating amplifier within a gain error, exact: H = H_ideal/(1 + z/GBW) with
 * z = j·f/β, a quadratic in GBW whatever the network. From the result upwards the error stays within.
 * @param z j·f/β at the frequency, Hz; a resistive network of noise gain NG has j·f·NG
 * @param error fraction, above 0 and below 1
 * @param kind magnitude |1 − |H/H_ideal||, or vector |1 − H/H_ideal|
 * @returns Hz; 0 when z is 0
 * @example gainBandwidthForLoopError({re: 0, im: 200e3}, 0.01, 'magnitude') is 1.4036 MHz: NG = 10 at 20 kHz
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 6 for the loop (from memory);
 * own algebra.
 */
export function gainBandwidthForLoopError(z: Complex, error: number, kind: GainDeviation): number {
  requireFinite('gainBandwidthForLoopError', { re: z.re, im: z.im });
  requireWithin('gainBandwidthForLoopError', { error }, { above: 0, below: 1 });
  const square = z.re * z.re + z.im * z.im;
  if (square === 0) return 0;
  if (kind === 'vector') return Math.sqrt(z.re * z.re + (square * (1 - error) * (1 + error)) / (error * error)) - z.re;
  return Math.max(belowIdeal(z.re, square, error), aboveIdeal(z.re, square, error));
}

/** |1 + z/GBW| = 1/(1−ε): where the gain is too small by ε. */
function belowIdeal(real: number, square: number, error: number): number {
  const excess = (error * (2 - error)) / (1 - error) ** 2;
  const root = Math.sqrt(real * real + square * excess);
  return real >= 0 ? (real + root) / excess : square / (root - real);
}

/** |1 + z/GBW| = 1/(1+ε): where a peaking loop has too much; the larger of its two ends. */
function aboveIdeal(real: number, square: number, error: number): number {
  const lack = (error * (2 + error)) / (1 + error) ** 2;
  const discriminant = real * real - square * lack;
  return real >= 0 || discriminant < 0 ? 0 : (Math.sqrt(discriminant) - real) / lack;
}
