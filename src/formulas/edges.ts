import { requireNotNegative, requirePositive } from './domain.js';

/** Inverse error function value erf⁻¹(0.8): the 10 % and 90 % points of a Gaussian edge, in units of √2·σ. */
const GAUSSIAN_90 = 0.9061938024368232;

/** Peak slope of an edge in units of ΔV/t_r, t_r from 10 % to 90 %. Source: own algebra on each shape. */
export const PEAK_SLOPE = {
  ramp: 0.8,
  raisedCosine: Math.asin(0.8),
  gaussian: (2 * GAUSSIAN_90) / Math.sqrt(Math.PI),
  singlePole: Math.log(9),
} as const;
export type EdgeShape = keyof typeof PEAK_SLOPE;

/**
 * Slew rate that produces an edge while slewing: SR = 0.8·ΔV/t_r, the average slope from 10 % to 90 %.
 * @param step V, at least 0
 * @param riseTime s, 10 % to 90 %, above 0
 * @returns V/s
 * @example edgeSlewRate(4, 1e-6) is 3.2 V/µs
 * Source: common practice (definition of the 10..90 % rise time).
 */
export function edgeSlewRate(step: number, riseTime: number): number {
  return edgePeakSlewRate(step, riseTime, 'ramp');
}

/**
 * Slew rate that reproduces a given edge without slewing: its peak slope.
 * @param step V, at least 0
 * @param riseTime s, 10 % to 90 %, above 0
 * @param shape of the edge; a single-pole exponential is the steepest
 * @returns V/s
 * @example edgePeakSlewRate(1, 1e-6, 'singlePole') is 2.197 V/µs
 * Source: own algebra, PEAK_SLOPE.
 */
export function edgePeakSlewRate(step: number, riseTime: number, shape: EdgeShape): number {
  requireNotNegative('edgePeakSlewRate', { step });
  requirePositive('edgePeakSlewRate', { riseTime });
  return (PEAK_SLOPE[shape] * step) / riseTime;
}
