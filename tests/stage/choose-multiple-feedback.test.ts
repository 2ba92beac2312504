import { describe, expect, it } from 'vitest';
import { multipleFeedback } from '../../src/formulas/filters.js';
import { E24 } from '../../src/quantities/e-series.js';
import { chooseMultipleFeedback } from '../../src/stage/choose-multiple-feedback.js';
import { naturalOf } from '../../src/stage/filter-response.js';

describe('components of a multiple-feedback low-pass', () => {
  const WISHES = [[1e3, 0.707, 1, 0], [5e3, 1, 2, 0], [5e3, 1, 2, 1e3], [10e3, 5, 10, 0], [1e3, 20, 1, 0], [1, 0.707, 1, 0], [1e3, 0.707, 0.01, 0]] as const;
  it.each(WISHES)('for %f Hz at Q %f, gain −%f, source %f Ω give all three to 0.5 %%', (frequency, q, gain, source) => {
    const parts = chooseMultipleFeedback({ frequency, q, gain, source })!;
    const response = multipleFeedback({ ...parts, r1: parts.r1 + source }, Infinity);
    const got = naturalOf(response);
    for (const [is, wanted] of [[got.corner, frequency], [got.q, q], [-response.gain, gain]] as const) expect(Math.abs(is / wanted - 1)).toBeLessThan(0.005);
  });

  it('have the smallest E24 value for C1 from C2·4Q²(1+|H0|) on', () => {
    const { c1, c2 } = chooseMultipleFeedback({ frequency: 5e3, q: 1, gain: 2, source: 0 })!;
    const least = 4 * (1 + 2);
    expect(c1 / c2).toBeGreaterThanOrEqual(least * (1 - 1e-9));
    const below = [...E24.map((one) => one * 10 ** Math.floor(Math.log10(c1) + 1e-9)), 0.91 * 10 ** Math.floor(Math.log10(c1) + 1e-9)].filter((one) => one < c1 * (1 - 1e-9));
    expect(Math.max(...below) / c2).toBeLessThan(least);
  });

  it('are none where capacitors would be strays', () => {
    expect(chooseMultipleFeedback({ frequency: 30e6, q: 1, gain: 1, source: 0 })).toBeNull();
  });
});
