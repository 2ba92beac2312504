import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, divide, magnitude, multiply, phase, subtract } from '../../src/formulas/complex.js';
import { refuses } from '../support/examples.js';

const one = { re: 1, im: 2 };
const other = { re: 3, im: -5 };

describe('complex numbers', () => {
  it('calculates the examples', () => {
    expect(add(one, other)).toEqual({ re: 4, im: -3 });
    expect(subtract(one, other)).toEqual({ re: -2, im: 7 });
    expect(multiply(one, other)).toEqual({ re: 13, im: 1 });
    const quotient = divide({ re: 13, im: 1 }, other);
    expect(quotient.re).toBeCloseTo(1, 14);
    expect(quotient.im).toBeCloseTo(2, 14);
    expect(magnitude({ re: 3, im: -4 })).toBe(5);
    expect(phase({ re: 0, im: -2 })).toBe(-90);
    expect(phase({ re: -1, im: 0 })).toBe(180);
  });
  it('divides without overflow', () => {
    expect(divide({ re: 1e200, im: 1e200 }, { re: 1e200, im: 1e200 })).toEqual({ re: 1, im: 0 });
  });
  it('undoes a product by a division', () => {
    const part = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    const number = fc.record({ re: part, im: part }).filter((value) => magnitude(value) > 1e-6);
    fc.assert(
      fc.property(number, number, (a, b) => {
        const back = divide(multiply(a, b), b);
        expect(magnitude(subtract(back, a))).toBeLessThanOrEqual(1e-12 * magnitude(a));
      }),
    );
  });
  refuses(() => divide(one, { re: 0, im: 0 }), 'divide: other must not be 0');
});
