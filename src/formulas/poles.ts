import { turningPoint } from './bisection.js';
import type { Complex } from './complex.js';
import { requirePositive } from './domain.js';
import type { LowPass } from './low-pass-response.js';

/**
 * Poles of a low-pass: the roots of 1 + a·s + b·s² + c·s³, one to three of them.
 * @param response low-pass with a above 0
 * @returns 1/s, real ones first
 * @example polesOf({gain: 1, a: 1, b: 1, c: 0}) is −0.5 ± 0.866j
 * Source: any text on algebra: one real root by bisection, the rest a quadratic.
 */
export function polesOf({ a, b, c }: LowPass): readonly Complex[] {
  requirePositive('polesOf', { a });
  if (c === 0) return b === 0 ? [{ re: -1 / a, im: 0 }] : quadratic(a / b, 1 / b);
  const fast = b / c;
  // s = −x: 1 − a·x + b·x² − c·x³ is above 0 at 0 and below it far out.
  const beyond = (x: number): boolean => 1 - x * (a - x * (b - x * c)) <= 0;
  let high = 1 / a;
  while (!beyond(high)) high *= 2;
  const x = turningPoint(beyond, { low: 0, high });
  const last = 1 / (c * x);
  // Of two equal forms the one that does not subtract near-equal numbers.
  const middle = x > fast / 2 ? (a / c - last) / x : fast - x;
  return [{ re: -x, im: 0 }, ...quadratic(middle, last)];
}

/**
 * Whether a low-pass is stable: all poles left of the axis.
 * @param response low-pass
 * @returns true when a step settles
 * @example isStable({gain: 1, a: 1, b: 1, c: 2}) is false
 * Source: Routh's criterion for a cubic, any text on control.
 */
export function isStable({ a, b, c }: LowPass): boolean {
  return a > 0 && b >= 0 && c >= 0 && (c === 0 || a * b > c);
}

/** Roots of s² + m·s + n. */
function quadratic(m: number, n: number): readonly Complex[] {
  const discriminant = (m * m) / 4 - n;
  if (discriminant < 0) {
    const im = Math.sqrt(-discriminant);
    return [{ re: -m / 2, im }, { re: -m / 2, im: -im }];
  }
  const far = m >= 0 ? -m / 2 - Math.sqrt(discriminant) : -m / 2 + Math.sqrt(discriminant);
  return [{ re: n / far, im: 0 }, { re: far, im: 0 }];
}
