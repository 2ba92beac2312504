import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exactDecimal, exactQuantity } from '../../src/intake/exact.js';

describe('exactDecimal', () => {
  it.each([
    [8.5e-5, -6, '85'],
    [0.0024, -3, '2.4'],
    [-0.1, 0, '-0.1'],
    [4e3, 6, '0.004'],
    [1e21, 0, '1000000000000000000000'],
    [0, -3, '0'],
    [-0, 0, '0'],
  ])('%s in units of 10^%s is %s', (value, exponent, text) => {
    expect(exactDecimal(value, exponent)).toBe(text);
  });

  it('is the same number again when the point is shifted back', () => {
    const exponents = fc.constantFrom(-15, -12, -9, -6, -3, 0, 3, 6);
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e12, max: 1e12 }), exponents, (value, exponent) => {
        const text = exactDecimal(value, exponent);
        expect(text).not.toMatch(/e/iu);
        expect(Number(`${text}e${exponent}`)).toBe(value === 0 ? 0 : value);
      }),
    );
  });

  it('refuses what is not a finite number', () => {
    expect(() => exactDecimal(Number.NaN, 0)).toThrow(RangeError);
  });
});

describe('exactQuantity', () => {
  it.each([
    [2000, 'Ω', '2 kΩ'],
    [2200, 'Ω', '2.2 kΩ'],
    [600, 'Ω', '600 Ω'],
    [0.001, 'A', '1 mA'],
    [3e-5, 'A', '30 µA'],
    [1e6, 'Ω', '1 MΩ'],
  ])('%s %s is %s', (value, unit, text) => {
    expect(exactQuantity(value, unit)).toBe(text);
  });
});
