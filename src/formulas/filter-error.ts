import { lowestHolding } from './bisection.js';
import { requirePositive, requireWithin } from './domain.js';
import { divide, magnitude, type Complex } from './complex.js';
import type { GainDeviation } from './loop-error.js';
import type { LowPass } from './low-pass-response.js';
import { isStable } from './poles.js';

/**
 * Largest relative deviation of a low-pass from another over a band 0..top: of the magnitude, or of the phasor.
 * @param actual low-pass
 * @param ideal low-pass it is compared with
 * @param band top Hz, above 0; kind of deviation
 * @returns fraction
 * @example the 10 kHz unity-gain Butterworth Sallen-Key at GBW = 270 kHz is off by 1 % up to 10 kHz
 * Source: definition; the band sampled and refined.
 */
export function largestDeviation(actual: LowPass, ideal: LowPass, band: { readonly top: number; readonly kind: GainDeviation }): number {
  requirePositive('largestDeviation', { top: band.top });
  const at = (frequency: number): number => deviationAt(actual, ideal, { frequency, kind: band.kind });
  let best = 1;
  for (let k = 2; k <= POINTS; k += 1) if (at((band.top * k) / POINTS) > at((band.top * best) / POINTS)) best = k;
  const [from, to] = [(band.top * (best - 1)) / POINTS, (band.top * Math.min(POINTS, best + 1)) / POINTS];
  return refined(at, from, to);
}

/**
 * Gain-bandwidth from which on a filter stays within a deviation up to a frequency: found downwards and bisected.
 * @param responseAt the filter as a function of the gain-bandwidth in Hz (Infinity: ideal)
 * @param within top Hz above 0, error fraction above 0 and below 1, kind of deviation
 * @returns Hz
 * @example the 10 kHz unity-gain Butterworth Sallen-Key for 1 % up to 10 kHz: about 27 · 10 kHz
 * Source: own algebra; Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972 for the first-order treatment (from memory).
 */
export function gainBandwidthForDeviation(
  responseAt: (gainBandwidth: number) => LowPass,
  within: { readonly top: number; readonly error: number; readonly kind: GainDeviation },
): number {
  requireWithin('gainBandwidthForDeviation', { error: within.error }, { above: 0, below: 1 });
  const ideal = responseAt(Infinity);
  const holds = (gainBandwidth: number): boolean => {
    const actual = responseAt(gainBandwidth);
    return isStable(actual) && largestDeviation(actual, ideal, within) <= within.error;
  };
  return lowestHolding(holds, within.top * 1e9);
}

const POINTS = 128;

function deviationAt(actual: LowPass, ideal: LowPass, at: { frequency: number; kind: GainDeviation }): number {
  const ratio = divide(denominator(ideal, at.frequency), denominator(actual, at.frequency));
  return at.kind === 'vector' ? magnitude({ re: ratio.re - 1, im: ratio.im }) : Math.abs(magnitude(ratio) - 1);
}

function denominator({ a, b, c }: LowPass, frequency: number): Complex {
  const w = 2 * Math.PI * frequency;
  return { re: 1 - b * w * w, im: w * (a - c * w * w) };
}

function refined(of: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [from, to];
  for (let turn = 0; turn < 40; turn += 1) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (of(left) < of(right)) low = left;
    else high = right;
  }
  return Math.max(of(high), of(to));
}
