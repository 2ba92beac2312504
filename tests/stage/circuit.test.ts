import { describe, expect, it } from 'vitest';
import { inputOf, parallel, plusOne, ratioSpan } from '../../src/stage/circuit.js';

describe('ratio of two resistors', () => {
  it('runs from rho(1-t)/(1+t) to rho(1+t)/(1-t)', () => {
    const span = ratioSpan({ value: 20e3, tolerance: 0.01 }, { value: 10e3, tolerance: 0.01 });
    expect(span.nominal).toBe(2);
    expect(span.min).toBeCloseTo((2 * 0.99) / 1.01, 15);
    expect(span.max).toBeCloseTo((2 * 1.01) / 0.99, 15);
  });

  it('keeps an exact part exact and gives a series part its own tolerance', () => {
    const span = ratioSpan({ value: 20e3, tolerance: 0.01, exact: 1e3 }, { value: 10e3, tolerance: 0.02, series: 1e3, seriesTolerance: 0.1 });
    expect(span.max).toBeCloseTo((20 * 1.01 + 1) / (10 * 0.98 + 1 * 0.9), 12);
    expect(span.min).toBeCloseTo((20 * 0.99 + 1) / (10 * 1.02 + 1 * 1.1), 12);
  });

  it('becomes a noise gain by adding one', () => {
    expect(plusOne({ min: 1, nominal: 2, max: 3 })).toEqual({ min: 2, nominal: 3, max: 4 });
  });
});

describe('parallel resistors', () => {
  it('are 0 when one is 0, also when both are', () => {
    expect(parallel(6e3, 3e3)).toBe(2e3);
    expect(parallel(0, 3e3)).toBe(0);
    expect(parallel(0, 0)).toBe(0);
  });
});

describe('an input by name', () => {
  it('is refused when the stage has none of that name', () => {
    expect(() => inputOf({ input: 1 }, 'positive')).toThrow(new RangeError('no input named positive at this stage'));
  });
});
