import { describe, expect, it } from 'vitest';
import { preferredValue } from '../../src/formulas/preferred-values.js';
import { E12, E24, E96, nearestE96 } from '../../src/quantities/e-series.js';
import { published, rederived } from '../support/check-values.js';

describe('preferred numbers', () => {
  published('STD-05', () => [...E24]);
  published('STD-06', () => [...E12]);
  published('STD-07', () => [...E96]);
  it('makes E96 by its rule, which E24 breaks eight times (IEC 60063:2015)', () => {
    expect([...E96]).toEqual(E96.map((_, index) => preferredValue(96, index)));
    const rounded = E24.map((_, index) => Math.round(10 * 10 ** (index / 24)) / 10);
    expect(E24.filter((value, index) => value !== rounded[index])).toEqual([2.7, 3, 3.3, 3.6, 3.9, 4.3, 4.7, 8.2]);
  });
  published('STD-08', (of) => preferredValue(192, of('index')));
  published('STD-09', (of) => nearestE96(of('R_ohm')));
  rederived('STD-09', {
    by: 'a search over three decades of the rule',
    within: 1e-9,
    value: (of) => {
      const values = [1e3, 1e4, 1e5].flatMap((decade) => Array.from({ length: 96 }, (_, k) => decade * preferredValue(96, k)));
      const distance = (value: number): number => Math.abs(Math.log(value / of('R_ohm')));
      return values.reduce((best, value) => (distance(value) < distance(best) ? value : best));
    },
  });
});
