import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gainWords, pairAt } from '../../src/explanation/resistor-pair.js';
import { E24, E96 } from '../../src/quantities/e-series.js';

const isIn = (series: readonly number[], value: number): boolean => series.some((mantissa) => Math.abs(value / 10 ** Math.floor(Math.log10(value) + 1e-9) / mantissa - 1) < 1e-9);

describe('a pair of resistors for the gain there is', () => {
  it('keeps the gain with what stands in series: the bridge of 200 kΩ over 18.7 kΩ + 1.43 kΩ at half', () => {
    const pair = pairAt({ feedback: 200e3, input: 18.7e3, tolerance: 0.001, series: 1.43e3 }, 0.5, { exactly: false });
    if (pair === null) throw new Error('no pair');
    expect(pair.feedback / (pair.input + 1.43e3) / (200 / 20.13) - 1).toBeCloseTo(pair.gainShift, 12);
    expect(Math.abs(pair.gainShift)).toBeLessThan(0.003);
    expect(gainWords(pair)).toMatch(/^gain 0\.\d+ % (?:higher|lower)$/u);
  });

  it('is of the series its tolerance is sold in, near what is aimed at, and shifts the gain by 1 % at most', () => {
    const ohms = fc.integer({ min: 500, max: 2e6 });
    fc.assert(fc.property(ohms, ohms, fc.constantFrom(0.001, 0.01, 0.05), fc.constantFrom(0.02, 0.1, 0.5, 2, 10), (feedback, input, tolerance, ratio) => {
      const pair = pairAt({ feedback, input, tolerance, series: 0 }, ratio, { exactly: false });
      // In E96 some pair always keeps the gain; E24 has gaps.
      if (tolerance < 0.05) expect(pair).not.toBeNull();
      if (pair === null) return;
      for (const value of [pair.feedback, pair.input]) expect(isIn(E24, value) || (tolerance < 0.05 && isIn(E96, value)), String(value)).toBe(true);
      expect(Math.abs(pair.feedback / pair.input / (feedback / input) - 1)).toBeLessThan(0.01 + 1e-9);
      expect(Math.abs(Math.log(pair.feedback / (feedback * ratio)))).toBeLessThan(Math.log(1.151));
    }));
  });

  it('says the same gain where it is, and leaves the input resistor to the gain where that is written', () => {
    const decade = pairAt({ feedback: 200e3, input: 20e3, tolerance: 0.01, series: 0 }, 0.1, { exactly: false });
    expect(decade).toMatchObject({ feedback: 20e3, input: 2e3 });
    expect(decade === null ? '' : gainWords(decade)).toBe('same gain');
    expect(pairAt({ feedback: 7e6, input: 1e6, tolerance: 0.01, series: 0 }, 0.1, { exactly: true })).toMatchObject({ feedback: 680e3, gainShift: 0 });
  });
});
