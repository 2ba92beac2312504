import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inputCrossoverDistortion } from '../../src/formulas/input-crossover.js';
import { example, refuses } from '../support/examples.js';

describe('input crossover', () => {
  const swing = { step: 1e-3, crossover: 3.5, level: 2.5, peak: 2 };
  example('inputCrossoverDistortion', () => inputCrossoverDistortion(swing), 1.87404e-4);
  it('vanishes where the swing just touches the crossover', () => {
    expect(inputCrossoverDistortion({ ...swing, crossover: 4.5 })).toBe(0);
  });
  it('stays a number at both ends, where the quotient may round to a hair beyond 1, and next to nothing', () => {
    for (let far = 1.3; far < 4; far += 0.1) {
      const [level, peak] = [(1.2 + far) / 2, (far - 1.2) / 2];
      for (const crossover of [level - peak, level + peak]) expect(inputCrossoverDistortion({ step: 1e-3, level, peak, crossover })).toBeLessThan(1e-5);
    }
  });
  it('is what the Fourier series of a rectangle leaves from the second harmonic on: 2·dV·sin(nπD)/(nπ)', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 0.98, noNaN: true }), fc.double({ min: 0.1, max: 5, noNaN: true }), (duty, peak) => {
        const [step, level] = [1e-3, 2.5];
        let sum = 0;
        for (let n = 2; n <= 20_000; n += 1) sum += ((2 * step * Math.sin(n * Math.PI * duty)) / (n * Math.PI)) ** 2 / 2;
        const relation = inputCrossoverDistortion({ step, level, peak, crossover: level + peak * Math.cos(Math.PI * duty) });
        // What lies beyond the last term is below a thousandth.
        expect(relation / (Math.sqrt(sum) / (peak / Math.SQRT2))).toBeCloseTo(1, 3);
      }),
      { numRuns: 30 },
    );
  });
  refuses(
    () => inputCrossoverDistortion({ ...swing, crossover: 5 }),
    'inputCrossoverDistortion: crossover must be finite, at least 0.5, at most 4.5, but is 5',
  );
});
