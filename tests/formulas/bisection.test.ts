import { describe, expect, it } from 'vitest';
import { lowestHolding, turningPoint } from '../../src/formulas/bisection.js';
import { refuses } from '../support/examples.js';

describe('turningPoint', () => {
  it('finds the square root of two to the last bits', () => {
    expect(turningPoint((x) => x * x >= 2, { low: 1, high: 2 })).toBeCloseTo(Math.SQRT2, 14);
  });
  it('searches downwards as well', () => {
    expect(turningPoint((x) => x <= 0.25, { low: 1, high: 0 })).toBe(0.25);
  });
  refuses(() => turningPoint(() => true, { low: 1, high: 2 }), 'turningPoint: the condition must be false at 1, but is true there');
  refuses(() => turningPoint(() => false, { low: 1, high: 2 }), 'turningPoint: the condition must be true at 2, but is false there');
});

describe('lowestHolding', () => {
  it('finds from where on a condition holds for good, though it holds again further down', () => {
    expect(lowestHolding((x) => x >= 3, 1000)).toBe(3);
    expect(lowestHolding((x) => x >= 3 || x < 1, 1000)).toBe(3);
  });
  it('is 0 where the condition never stops holding', () => {
    expect(lowestHolding(() => true, 1)).toBe(0);
  });
  refuses(() => lowestHolding(() => false, 5), 'lowestHolding: the condition must be true at 5, but is false there');
});
