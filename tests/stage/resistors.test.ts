import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { E96 } from '../../src/quantities/e-series.js';
import { choosePair } from '../../src/stage/resistors.js';

const sum = (feedback: number, input: number): number => feedback + input;
const feedbackOnly = (feedback: number): number => feedback;

describe('chosen E96 pair', () => {
  it('meets a ratio of 1 exactly with the feedback resistor nearest 100 kΩ', () => {
    expect(choosePair({ ratio: 1, path: feedbackOnly })).toEqual({ feedback: 100e3, input: 100e3 });
  });

  it('counts Rf + Rg as the path of a non-inverting stage', () => {
    expect(choosePair({ ratio: 1, path: sum })).toEqual({ feedback: 49.9e3, input: 49.9e3 });
  });

  it('takes the least gain error first, even far from 100 kΩ', () => {
    const pair = choosePair({ ratio: 7, path: sum })!;
    expect(Math.abs(pair.feedback / pair.input / 7 - 1)).toBeLessThan(1e-4);
  });

  it('finds none for a ratio beyond all resistors', () => {
    expect(choosePair({ ratio: 1e9, path: feedbackOnly })).toBeNull();
  });

  it('is never beaten by another E96 pair inside 50..200 kΩ', () => {
    const decades = [1e2, 1e3, 1e4, 1e5];
    const every = decades.flatMap((decade) => E96.map((mantissa) => Number((mantissa * decade).toPrecision(3))));
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 50, noNaN: true }), (ratio) => {
        const pair = choosePair({ ratio, path: feedbackOnly })!;
        const error = Math.abs(pair.feedback / pair.input / ratio - 1);
        for (const feedback of every.filter((ohms) => ohms >= 50e3 && ohms <= 200e3)) {
          for (const input of every) expect(Math.abs(feedback / input / ratio - 1) - error >= -1e-9).toBe(true);
        }
        expect(pair.feedback >= 50e3 && pair.feedback <= 200e3).toBe(true);
      }),
      { seed: 7, numRuns: 5 },
    );
  });
});
