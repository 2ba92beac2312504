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
 * Total harmonic distortion of a sine clipped at a different fraction of its peak at the top and at the bottom; its mean does not count.
 * @param ratios top and bottom, above 0, at most 1
 * @returns fraction of the fundamental
 * @example clippedSineDistortion({top: 0.9, bottom: 1}) is 0.0321
 * Source: own algebra, Fourier integrals.
 */
export function clippedSineDistortion({ top, bottom }: { readonly top: number; readonly bottom: number }): number {
  requireWithin('clippedSineDistortion', { top, bottom }, { above: 0, to: 1 });
  if (top === 1 && bottom === 1) return 0;
  const [up, down] = [halfWave(top), halfWave(bottom)];
  const mean = (up.area - down.area) / (2 * Math.PI);
  const meanSquare = (up.square + down.square) / (2 * Math.PI) - mean ** 2;
  const fundamental = (up.sine + down.sine) / Math.PI;
  return Math.sqrt(Math.max(0, (2 * meanSquare) / fundamental ** 2 - 1));
}

/** ∫v, ∫v² and ∫v·sin over one half wave clipped at c. */
function halfWave(ratio: number): { readonly area: number; readonly square: number; readonly sine: number } {
  const angle = Math.asin(ratio);
  const flat = Math.PI - 2 * angle;
  const round = angle - Math.sin(2 * angle) / 2;
  return { area: 2 * (1 - Math.cos(angle)) + ratio * flat, square: round + ratio ** 2 * flat, sine: round + 2 * ratio * Math.cos(angle) };
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
