import { describe, expect, it } from 'vitest';
import { E12, E24, E96, e192Mantissa, nearestE24, nearestE96 } from '../../src/quantities/e-series.js';

const power = (index: number, steps: number, decimals: number): number => Number((10 ** (index / steps)).toFixed(decimals));

describe('preferred values, IEC 60063:2015', () => {
  it('E96 is the rounded powers without exception', () => {
    expect(E96).toHaveLength(96);
    expect(E96.map((_, index) => power(index, 96, 2))).toEqual(E96);
  });
  it('E24 is the rounded powers but for eight values', () => {
    expect(E24).toHaveLength(24);
    const differing = E24.filter((value, index) => value !== power(index, 24, 1));
    expect(differing).toEqual([2.7, 3, 3.3, 3.6, 3.9, 4.3, 4.7, 8.2]);
  });
  it('E12 is every second value of E24', () => expect(E24.filter((_, index) => index % 2 === 0)).toEqual(E12));
  it('E192 contains E96 and has 9.20 at 185', () => {
    expect(E96.map((_, index) => e192Mantissa(2 * index))).toEqual(E96);
    expect(e192Mantissa(185)).toBe(9.2);
    expect(power(185, 192, 2)).toBe(9.19);
    expect(() => e192Mantissa(192)).toThrow(RangeError);
  });
  it('finds the nearest in ratio, over decades', () => {
    expect(nearestE96(12345)).toBe(12400);
    expect(nearestE96(0.0047)).toBe(0.00475);
    expect(nearestE96(9.9)).toBe(10);
    expect(nearestE96(9.85)).toBe(9.76);
    expect(nearestE96(100000)).toBe(100000);
    expect(nearestE24(4600)).toBe(4700);
    expect(() => nearestE96(0)).toThrow('positive');
    expect(() => nearestE96(Number.NaN)).toThrow(RangeError);
  });
});
