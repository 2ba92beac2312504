import { requireFinite, requireNotNegative, requirePositive, requireWithin } from './domain.js';

/** value and its scale in one unit; exponent above 0, 1 (straight) when absent. */
export interface OneSided {
  readonly value: number;
  /** Where the desirability is 0. */
  readonly worst: number;
  /** Where it has reached 1. */
  readonly target: number;
  readonly exponent?: number;
}

/**
 * Desirability when more is better: 0 up to `worst`, ((y−L)/(T−L))^s, 1 from `target` on: excess gains nothing.
 * @param scale target above worst
 * @returns 0..1
 * @example largerIsBetter({value: 1.3, worst: 1, target: 1.5}) is 0.6
 * Source: Derringer & Suich, Simultaneous optimization of several response variables, J. Quality Technology 12(4), 214-219, 1980 (forms from memory).
 */
export function largerIsBetter(scale: OneSided): number {
  requireScale('largerIsBetter', scale, scale.target - scale.worst);
  return clamped(scale);
}

/**
 * Desirability when less is better: the mirror of largerIsBetter().
 * @param scale target below worst
 * @returns 0..1
 * @example smallerIsBetter({value: 0.4, worst: 1, target: 0}) is 0.6
 * Source: Derringer & Suich (1980) (forms from memory).
 */
export function smallerIsBetter(scale: OneSided): number {
  requireScale('smallerIsBetter', scale, scale.worst - scale.target);
  return clamped(scale);
}

/**
 * Two-sided desirability: ((y−L)/(T−L))^s up to the target, ((U−y)/(U−T))^t above it, 0 outside L..U.
 * @param scale low below target below high; exponents s (rise) and t (fall) above 0, 1 when absent
 * @returns 0..1
 * @example twoSided({value: 3, low: 2, target: 4, high: 8, rise: 2}) is 0.25
 * Source: Derringer & Suich (1980) (forms from memory).
 */
export function twoSided(scale: {
  readonly value: number;
  readonly low: number;
  readonly target: number;
  readonly high: number;
  readonly rise?: number;
  readonly fall?: number;
}): number {
  const { value, low, target, high, rise = 1, fall = 1 } = scale;
  if (value <= target) return largerIsBetter({ value, worst: low, target, exponent: rise });
  return smallerIsBetter({ value, worst: high, target, exponent: fall });
}

/**
 * Overall desirability: the weighted geometric mean exp(Σ w·ln d/Σ w). One zero makes it zero.
 * @param scores d 0..1 with weight at least 0, the weights not all 0
 * @returns 0..1
 * @example weightedGeometricMean([{score: 0.6, weight: 1}, {score: 1, weight: 1}, {score: 0.4, weight: 1}]) is 0.621
 * Source: Derringer & Suich (1980) (forms from memory).
 */
export function weightedGeometricMean(scores: readonly { readonly score: number; readonly weight: number }[]): number {
  let sum = 0;
  let weights = 0;
  for (const { score, weight } of scores) {
    requireWithin('weightedGeometricMean', { score }, { from: 0, to: 1 });
    requireNotNegative('weightedGeometricMean', { weight });
    // A score of weight 0 does not count, even a zero: 0·ln 0 would be NaN.
    if (weight > 0) sum += weight * Math.log(score);
    weights += weight;
  }
  requirePositive('weightedGeometricMean', { 'sum of weights': weights });
  return Math.exp(sum / weights);
}

function clamped({ value, worst, target, exponent = 1 }: OneSided): number {
  const share = Math.min(1, Math.max(0, (value - worst) / (target - worst)));
  return share ** exponent;
}

function requireScale(where: string, { value, exponent = 1 }: OneSided, span: number): void {
  requireFinite(where, { value });
  requirePositive(where, { exponent, 'distance from worst to target': span });
}
