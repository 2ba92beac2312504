import { requireNotNegative, requireWithin } from './domain.js';

export interface Corners {
  readonly min: number;
  readonly max: number;
}

/**
 * Corners of the ratio of two resistors of ±t: ρ(1−t)/(1+t) .. ρ(1+t)/(1−t).
 * @param ratio Ω/Ω, at least 0
 * @param tolerance fraction, at least 0 and below 1
 * @returns Ω/Ω
 * @example ratioCorners(9, 0.01) is 8.822..9.182
 * Source: own algebra; a ratio is monotone in each resistor.
 */
export function ratioCorners(ratio: number, tolerance: number): Corners {
  requireNotNegative('ratioCorners', { ratio });
  requireWithin('ratioCorners', { tolerance }, { from: 0, below: 1 });
  return { min: (ratio * (1 - tolerance)) / (1 + tolerance), max: (ratio * (1 + tolerance)) / (1 - tolerance) };
}

/**
 * Corners of a divider's fraction α of two resistors of ±t; at α = 1/2 exactly (1±t)/2, that is ±t and not ±2t.
 * @param fraction 0..1
 * @param tolerance fraction, at least 0 and below 1
 * @returns V/V
 * @example fractionCorners(0.5, 0.01) is 0.495..0.505
 * Source: own algebra.
 */
export function fractionCorners(fraction: number, tolerance: number): Corners {
  requireWithin('fractionCorners', { fraction }, { from: 0, to: 1 });
  requireWithin('fractionCorners', { tolerance }, { from: 0, below: 1 });
  const at = (t: number): number => (fraction * (1 + t)) / (fraction * (1 + t) + (1 - fraction) * (1 - t));
  return { min: at(-tolerance), max: at(tolerance) };
}
