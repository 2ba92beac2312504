import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { E96 } from '../../src/quantities/e-series.js';
import { choosePair } from '../../src/stage/resistors.js';

// Many cases a test: slow on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

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

  it('takes the feedback path nearest 100 kΩ in ratio next', () => {
    // Every exact 2:1 pair of E96 with feedback inside 50..200 kΩ, in order of |ln(Rf/100 kΩ)|.
    const decade = E96.map((mantissa) => Math.round(mantissa * 100));
    const values = [...decade.map((n) => n * 1e2), ...decade.map((n) => n * 1e3)];
    const exact = values.filter((rf) => rf >= 50e3 && rf <= 200e3 && values.includes(rf / 2)).sort((a, b) => Math.abs(Math.log(a / 1e5)) - Math.abs(Math.log(b / 1e5)));
    expect(exact.length).toBeGreaterThan(1);
    expect(choosePair({ ratio: 2, path: feedbackOnly })).toEqual({ feedback: exact[0], input: exact[0]! / 2 });
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
        const feedbacks = every.filter((ohms) => ohms >= 50e3 && ohms <= 200e3);
        const least = Math.min(...feedbacks.map((feedback) => Math.min(...every.map((input) => Math.abs(feedback / input / ratio - 1)))));
        expect(error).toBeLessThanOrEqual(least + 1e-9);
        expect(pair.feedback >= 50e3 && pair.feedback <= 200e3).toBe(true);
      }),
      { seed: 7, numRuns: 25 },
    );
  });
});
