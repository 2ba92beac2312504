import { turningPoint } from './bisection.js';

/** A low-pass G/(1 + a·s + b·s² + c·s³): gain V/V, a in s, b in s², c in s³. With a finite gain-bandwidth c > 0. */
export interface LowPass {
  readonly gain: number;
  readonly a: number;
  readonly b: number;
  readonly c: number;
}

/**
 * −3 dB frequency: the lowest frequency where the magnitude is 1/√2 of the DC gain.
 * @param response stable low-pass
 * @returns Hz
 * @example halfPowerFrequency({gain: 1, a: Math.SQRT2, b: 1, c: 0}) is 1/(2π) Hz
 * Source: own algebra: |1/H|² is a cubic in ω², searched between its turning points.
 */
export function halfPowerFrequency(response: LowPass): number {
  const square = inverseSquare(response);
  const down = (x: number): boolean => square(x) >= 2;
  let low = 0;
  for (const high of turningPoints(response)) {
    if (down(high)) return toFrequency(turningPoint(down, { low, high }));
    low = high;
  }
  let high = Math.max(2 * low, 1e-30);
  while (!down(high)) high *= 2;
  return toFrequency(turningPoint(down, { low, high }));
}

/**
 * Highest magnitude, in V/V, and where it stands, in Hz (0 without a peak).
 * @param response stable low-pass
 * @example peakOf({gain: 1, a: 0.5, b: 1, c: 0}).gain is 2.066, the peak of Q = 2
 * Source: as halfPowerFrequency().
 */
export function peakOf(response: LowPass): { readonly gain: number; readonly frequency: number } {
  const square = inverseSquare(response);
  const best = turningPoints(response).reduce((x, candidate) => (square(candidate) < square(x) ? candidate : x), 0);
  return { gain: Math.abs(response.gain) / Math.sqrt(square(best)), frequency: toFrequency(best) };
}

/**
 * Magnitude at a frequency.
 * @param response low-pass
 * @param frequency Hz
 * @returns V/V
 * @example magnitudeAt({gain: 1, a: 1, b: 0, c: 0}, 1 / (2 * Math.PI)) is 0.707
 * Source: definition.
 */
export function magnitudeAt(response: LowPass, frequency: number): number {
  return Math.abs(response.gain) / Math.sqrt(inverseSquare(response)((2 * Math.PI * frequency) ** 2));
}

/** |denominator|² as a function of x = ω². */
function inverseSquare({ a, b, c }: LowPass): (x: number) => number {
  return (x) => (1 - b * x) ** 2 + x * (a - c * x) ** 2;
}

/** Positive x where that cubic turns, ascending: roots of 3c²x² + 2(b² − 2ac)x + (a² − 2b). */
function turningPoints({ a, b, c }: LowPass): readonly number[] {
  const [p, q, r] = [3 * c * c, b * b - 2 * a * c, a * a - 2 * b];
  const discriminant = q * q - p * r;
  if (discriminant < 0) return [];
  // The two roots as k/p and r/k: no cancellation, and r/k alone remains when c = 0.
  const k = q >= 0 ? -q - Math.sqrt(discriminant) : -q + Math.sqrt(discriminant);
  return [p === 0 ? NaN : k / p, r / k].filter((x) => Number.isFinite(x) && x > 0).sort((one, other) => one - other);
}

function toFrequency(x: number): number {
  return Math.sqrt(x) / (2 * Math.PI);
}
