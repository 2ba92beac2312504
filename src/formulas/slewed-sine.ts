import { turningPoint } from './bisection.js';
import { requirePositive } from './domain.js';

/** Below this ratio SR/(2π·f·Vp) the output is a pure triangle: 1/√(1+π²/4) = 0.5370. Source: own algebra. */
export const TRIANGLE_RATIO = 1 / Math.sqrt(1 + Math.PI ** 2 / 4);

/** Total harmonic distortion of a triangle, √(π⁴/96 − 1) = 12.1 %. Source: Fourier series of a triangle. */
export const TRIANGLE_DISTORTION = Math.sqrt(Math.PI ** 4 / 96 - 1);

/**
 * Peak of a sine through a hard slew limit, as a fraction of the wanted peak. 1 down to a ratio of 0.7246: an amplitude
 * test does not see slewing there. Below TRIANGLE_RATIO it is (π/2)·ratio, that is SR/(4f).
 * @param ratio SR/(2π·f·Vp), above 0
 * @returns 0..1
 * @example slewedPeak(0.4) is 0.628
 * Source: own algebra (the output follows the sine, leaves it where the slope is exceeded, and meets it again).
 */
export function slewedPeak(ratio: number): number {
  requirePositive('slewedPeak', { ratio });
  if (ratio >= 1) return 1;
  if (ratio <= TRIANGLE_RATIO) return (Math.PI / 2) * ratio;
  const { meets } = ramp(ratio);
  return meets <= 1.5 * Math.PI ? 1 : -Math.sin(meets);
}

/**
 * Total harmonic distortion of a sine through a hard slew limit.
 * @param ratio SR/(2π·f·Vp), above 0
 * @returns fraction of the fundamental
 * @example slewedDistortion(0.75) is 0.0808
 * Source: own algebra, Fourier integrals of the piecewise waveform.
 */
export function slewedDistortion(ratio: number): number {
  requirePositive('slewedDistortion', { ratio });
  if (ratio >= 1) return 0;
  if (ratio <= TRIANGLE_RATIO) return TRIANGLE_DISTORTION;
  const { square, sine, cosine } = halfPeriodIntegrals(ratio);
  const fundamental = (2 / Math.PI) * (sine ** 2 + cosine ** 2);
  return Math.sqrt(Math.max(0, square / fundamental - 1));
}

/** Angles where the falling ramp leaves the sine and meets it again. */
function ramp(ratio: number): { readonly leaves: number; readonly meets: number } {
  const leaves = Math.PI / 2 + Math.asin(ratio);
  const top = Math.sin(leaves);
  const met = (angle: number): boolean => top - ratio * (angle - leaves) <= Math.sin(angle);
  // Just after leaving the ramp is above the sine by less than rounding shows, so the search starts at the steepest point.
  return { leaves, meets: turningPoint(met, { low: Math.max(leaves, Math.PI), high: leaves + Math.PI }) };
}

/** ∫v², ∫v·sin and ∫v·cos over half a period: the ramp from `leaves` to `meets`, then the sine to `leaves` + π. */
function halfPeriodIntegrals(ratio: number): { readonly square: number; readonly sine: number; readonly cosine: number } {
  const { leaves: a, meets: b } = ramp(ratio);
  const end = a + Math.PI;
  const top = Math.sin(a);
  const bottom = top - ratio * (b - a);
  const halfSquare = (angle: number): number => angle / 2 - Math.sin(2 * angle) / 4;
  return {
    square: (top ** 3 - bottom ** 3) / (3 * ratio) + halfSquare(end) - halfSquare(b),
    sine: top * Math.cos(a) - bottom * Math.cos(b) - ratio * (Math.sin(b) - Math.sin(a)) + halfSquare(end) - halfSquare(b),
    cosine:
      bottom * Math.sin(b) - top * Math.sin(a) - ratio * (Math.cos(b) - Math.cos(a)) + (Math.sin(end) ** 2 - Math.sin(b) ** 2) / 2,
  };
}
