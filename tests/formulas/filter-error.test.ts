import { describe, expect, it } from 'vitest';
import { gainBandwidthForDeviation, largestDeviation } from '../../src/formulas/filter-error.js';
import { multipleFeedback, sallenKey } from '../../src/formulas/filters.js';
import { example, refuses } from '../support/examples.js';

const F0 = 10e3;
/** Unity-gain Sallen-Key with equal resistors. */
const equalResistors = (q: number) => (gainBandwidth: number) =>
  sallenKey({ r1: 1e4, r2: 1e4, c1: (2 * q) / (2 * Math.PI * F0 * 1e4), c2: 1 / (2 * q * 2 * Math.PI * F0 * 1e4), gain: 1 }, gainBandwidth);
const butterworth = equalResistors(Math.SQRT1_2);
const magnitude = { top: F0, error: 0.01, kind: 'magnitude' } as const;

describe('deviation of a filter from the ideal one', () => {
  example('largestDeviation(…) of the Butterworth at 274.6 kHz', () => largestDeviation(butterworth(274_579), butterworth(Infinity), magnitude), 0.01);
  example('gainBandwidthForDeviation(…) of the Butterworth', () => gainBandwidthForDeviation(butterworth, magnitude), 274_579);

  it('is, to the two digits of a table worked out apart from it, 27, 320, 2280 and 9550 times f0 for 1 % in the band up to f0', () => {
    for (const [q, times] of [[Math.SQRT1_2, 27], [2, 320], [5, 2280], [10, 9550]] as const) {
      const found = gainBandwidthForDeviation(equalResistors(q), magnitude) / F0;
      expect(Math.abs(found / times - 1)).toBeLessThan(0.02);
    }
  });

  it('is met there and not just below for multiple feedback, and the vector needs more', () => {
    const [c1, c2, r2] = [4e-9, 1e-9, 10e3];
    const r3 = 1 / ((2 * Math.PI * F0) ** 2 * r2 * c1 * c2);
    const filter = (gainBandwidth: number) => multipleFeedback({ r1: r2, r2, r3, c1, c2 }, gainBandwidth);
    const needed = gainBandwidthForDeviation(filter, magnitude);
    expect(gainBandwidthForDeviation(filter, { ...magnitude, kind: 'vector' })).toBeGreaterThan(needed);
    expect(largestDeviation(filter(needed * 1.0001), filter(Infinity), magnitude)).toBeLessThanOrEqual(0.01);
    expect(largestDeviation(filter(needed * 0.999), filter(Infinity), magnitude)).toBeGreaterThan(0.01);
  });

  refuses(() => largestDeviation(butterworth(1e6), butterworth(Infinity), { top: 0, kind: 'vector' }), 'largestDeviation: top must be finite, above 0, but is 0');
  refuses(() => gainBandwidthForDeviation(butterworth, { ...magnitude, error: 0 }), 'gainBandwidthForDeviation: error must be finite, above 0, below 1, but is 0');
});
