import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { E24, E96 } from '../../src/quantities/e-series.js';
import { bestChoice, firstAtLeast, ladder, neighbours, remembered } from '../../src/stage/preferred.js';

describe('a ladder of preferred values', () => {
  it('runs from one value to another, both included, exact in decimals', () => {
    expect(ladder([1, 2.2, 4.7], 2.2e-9, 100e-9)).toEqual([2.2e-9, 4.7e-9, 1e-8, 2.2e-8, 4.7e-8, 1e-7]);
    expect(ladder(E96, 2e3, 50e3).at(-1)).toBe(49.9e3);
  });

  it('has the values on both sides of a wanted one, a value of its own counting as above', () => {
    const values = ladder(E24, 100, 1000);
    expect(neighbours(values, 105)).toEqual([100, 110]);
    expect(neighbours(values, 110)).toEqual([100, 110]);
    expect(neighbours(values, 5)).toEqual([100]);
    expect(neighbours(values, 5e4)).toEqual([1000]);
  });

  it('is searched as if from its beginning', () => {
    const values = ladder(E96, 1, 1e6);
    fc.assert(fc.property(fc.double({ min: 0.5, max: 2e6, noNaN: true }), (wanted) => {
      const found = values.findIndex((value) => value >= wanted * (1 - 1e-9));
      expect(firstAtLeast(values, wanted)).toBe(found === -1 ? values.length : found);
    }), { seed: 3 });
  });
});

describe('the best choice', () => {
  const of = (parts: string, error: number, ohms: number) => ({ parts, error, resistors: [ohms] });
  it('has the least error, whatever its size', () => {
    expect(bestChoice([of('near', 0.004, 10e3), of('far', 0.003, 50e3)], 10e3)).toBe('far');
  });
  it('takes errors up to 0.1 % as one and then the resistors nearest the aim in ratio', () => {
    expect(bestChoice([of('exact', 0, 50e3), of('sized', 0.0009, 9e3), of('other', 0.0002, 20e3)], 10e3)).toBe('sized');
  });
  it('is none of none', () => {
    expect(bestChoice([], 1)).toBeNull();
  });
});

describe('a remembered choice', () => {
  it('is made once for the same wish, and for another one anew', () => {
    let made = 0;
    const choose = remembered(({ ohms }: { ohms: number }) => [ohms, (made += 1)]);
    expect([choose({ ohms: 1 }), choose({ ohms: 1 }), choose({ ohms: 2 }), made]).toEqual([[1, 1], [1, 1], [2, 2], 2]);
  });
});
