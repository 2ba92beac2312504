import { describe, expect, it } from 'vitest';
import { combinedRejection, leakThrough, rejectionAbove, rejectionOfResistors, resistorLimitedRejection } from '../../src/formulas/rejection.js';
import { example, refuses } from '../support/examples.js';

describe('common-mode rejection', () => {
  example('resistorLimitedRejection(1, 0.001)', () => resistorLimitedRejection(1, 0.001), 500);
  example('rejectionOfResistors with one 2 % high', () => rejectionOfResistors({ r1: 1, r2: 1, r3: 1, r4: 1.02 }), 101.5);
  it('has no limit when the ratios are equal', () => {
    expect(rejectionOfResistors({ r1: 1, r2: 2, r3: 2, r4: 4 })).toBe(Infinity);
  });
  example('combinedRejection([500, 10e3])', () => combinedRejection([500, 10e3]), 476.19);
  example('leakThrough(12, 476.19)', () => leakThrough(12, 476.19), 0.0252);
  refuses(() => resistorLimitedRejection(1, 0), 'resistorLimitedRejection: tolerance must be finite, above 0, below 1, but is 0');
  refuses(() => rejectionOfResistors({ r1: 0, r2: 1, r3: 1, r4: 1 }), 'rejectionOfResistors: r1 must be finite, above 0, but is 0');
  refuses(() => combinedRejection([1, 0]), 'combinedRejection: rejection must be finite, above 0, but is 0');
  refuses(() => leakThrough(-1, 1), 'leakThrough: change must be finite, at least 0, but is -1');
});

describe('rejection above its corner', () => {
  example('rejectionAbove(10e3, {frequency: 10e3, corner: 100})', () => rejectionAbove(10e3, { frequency: 10e3, corner: 100 }), 99.995);
  it('is 3 dB down at the corner, flat below, and does not fall without one', () => {
    expect(rejectionAbove(1e4, { frequency: 100, corner: 100 })).toBeCloseTo(1e4 / Math.SQRT2, 6);
    expect(rejectionAbove(1e4, { frequency: 0, corner: 100 })).toBe(1e4);
    expect(rejectionAbove(1e4, { frequency: 1e9, corner: Infinity })).toBe(1e4);
  });
  refuses(() => rejectionAbove(1e4, { frequency: 1e3, corner: 0 }), 'rejectionAbove: corner must be finite, above 0, but is 0');
  refuses(() => rejectionAbove(0, { frequency: 1e3, corner: 1 }), 'rejectionAbove: rejection must be finite, above 0, but is 0');
});
