import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isStable, polesOf } from '../../src/formulas/poles.js';
import { example, refuses } from '../support/examples.js';

describe('poles', () => {
  example('polesOf({gain: 1, a: 1, b: 1, c: 0}), imaginary part,', () => polesOf({ gain: 1, a: 1, b: 1, c: 0 })[0]!.im, Math.sqrt(0.75));

  it('multiply out to the polynomial they came from', () => {
    const value = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(value, value, value, (a, b, c) => {
        const poles = polesOf({ gain: 1, a, b, c });
        expect(poles).toHaveLength(3);
        for (const { re, im } of poles) {
          const terms = [[1, 0], [a * re, a * im], [b * (re * re - im * im), 2 * b * re * im], [c * (re ** 3 - 3 * re * im * im), c * (3 * re * re * im - im ** 3)]] as const;
          const size = terms.reduce((sum, [x, y]) => sum + Math.hypot(x, y), 0);
          expect(Math.hypot(terms.reduce((sum, [x]) => sum + x, 0), terms.reduce((sum, [, y]) => sum + y, 0)) / size).toBeLessThan(1e-8);
        }
      }),
    );
  });

  it('isStable(…) is Routh’s word, and the sign of the poles agrees', () => {
    expect(isStable({ gain: 1, a: 1, b: 1, c: 2 })).toBe(false);
    for (const c of [0, 0.5, 0.99, 1.01, 3]) expect(polesOf({ gain: 1, a: 1, b: 1, c }).every(({ re }) => re < 0)).toBe(isStable({ gain: 1, a: 1, b: 1, c }));
  });

  refuses(() => polesOf({ gain: 1, a: 0, b: 1, c: 0 }), 'polesOf: a must be finite, above 0, but is 0');
});
