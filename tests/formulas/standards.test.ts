import { describe, expect, it } from 'vitest';
import { AEC_Q100_AMBIENT, COMMON_SUPPLIES } from '../../src/formulas/standards.js';

describe('standards', () => {
  it('lists the grades in order, each within the one before', () => {
    expect(AEC_Q100_AMBIENT.map(({ grade }) => grade)).toEqual([0, 1, 2, 3]);
    expect(AEC_Q100_AMBIENT.map(({ max }) => max)).toEqual([150, 125, 105, 85]);
  });
  it('has supplies from low to high', () => {
    for (const { min, max } of Object.values(COMMON_SUPPLIES)) expect(min).toBeLessThan(max);
  });
});
