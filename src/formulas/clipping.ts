import { turningPoint } from './bisection.js';
import { requireWithin } from './domain.js';

/**
 * Total harmonic distortion of a sine clipped on both sides at a fraction c of its peak. With a = asin c the fundamental is
 * (2/π)(a + c·cos a) and the mean square (2/π)[a/2 − sin 2a/4 + c²(π/2 − a)].
 * @param ratio c, above 0, at most 1
 * @returns fraction of the fundamental
 * @example clippingDistortion(0.9) is 0.0422
 * Source: own algebra, Fourier integrals.
 */
export function clippingDistortion(ratio: number): number {
  requireWithin('clippingDistortion', { ratio }, { above: 0, to: 1 });
  const angle = Math.asin(ratio);
  const flat = ratio ** 2 * (Math.PI / 2 - angle);
  const meanSquare = (2 / Math.PI) * (angle / 2 - Math.sin(2 * angle) / 4 + flat);
  const fundamental = (2 / Math.PI) * (angle + ratio * Math.cos(angle));
  return Math.sqrt(Math.max(0, (2 * meanSquare) / fundamental ** 2 - 1));
}

/**
 * Deepest clipping within a distortion limit: the ratio c, by bisection of clippingDistortion().
 * @param distortion fraction, above 1e-6 (rounding hides less) and below 0.48 (a square wave has 0.483)
 * @returns V/V
 * @example clippingRatio(0.001) is 0.9958
 * Source: clippingDistortion(), which falls steadily as c rises.
 */
export function clippingRatio(distortion: number): number {
  requireWithin('clippingRatio', { distortion }, { above: 1e-6, below: 0.48 });
  return turningPoint((ratio) => clippingDistortion(ratio) <= distortion, { low: 1e-3, high: 1 });
}
