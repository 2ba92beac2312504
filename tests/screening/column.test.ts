import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { column } from '../../src/screening/column.js';

describe('a column', () => {
  it('holds what was put in each place, in any order, and the blank elsewhere', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.nat(500), fc.integer({ min: -1000, max: 1000 }))), fc.constantFrom(0, -1), (put, blank) => {
      const [numbers, kept] = [column(Int32Array, blank), new Map<number, number>()];
      for (const [place, value] of put) {
        numbers.put(place, value);
        kept.set(place, value);
      }
      for (let place = 0; place < 600; place += 1) expect(numbers.at(place)).toBe(kept.get(place) ?? blank);
      for (const [place, value] of kept) expect(numbers.numbers()[place]).toBe(value);
    }));
  });
});
