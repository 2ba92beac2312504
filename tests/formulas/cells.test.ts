import { describe, expect, it } from 'vitest';
import { cell, increase } from '../../src/formulas/cells.js';

describe('dense arrays', () => {
  it('reads a number, and NaN outside', () => {
    expect(cell(Float64Array.of(1, 2), 1)).toBe(2);
    expect(cell(Float64Array.of(1, 2), 2)).toBeNaN();
  });
  it('adds in place', () => {
    const values = Float64Array.of(1, 2);
    increase(values, 1, 3);
    expect([...values]).toEqual([1, 5]);
  });
});
