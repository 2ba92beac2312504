import { describe, expect, it } from 'vitest';
import { combinedRejection, leakThrough, rejectionOfResistors, resistorLimitedRejection } from '../../src/formulas/rejection.js';
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
