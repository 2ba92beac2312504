import { describe, expect, it } from 'vitest';
import { dominates, isAhead, undominated } from '../../src/formulas/dominance.js';
import { refuses } from '../support/examples.js';

describe('dominance', () => {
  it('needs nowhere worse and somewhere better', () => {
    expect(dominates([2, 1], [1, 1])).toBe(true);
    expect(dominates([2, 0], [1, 1])).toBe(false);
    expect(dominates([1, 1], [1, 1])).toBe(false);
  });
  it('compares alone for lists known to be sound', () => {
    expect(isAhead([2, 1], [1, 1])).toBe(true);
    expect(isAhead([1, 1], [1, 1])).toBe(false);
    expect(isAhead([2, 0], [1, 1])).toBe(false);
  });
  it('leaves what nothing dominates, twins included', () => {
    expect(undominated([[2, 1], [1, 1], [1, 2], [1, 2]])).toEqual([0, 2, 3]);
  });
  refuses(() => dominates([1], [1, 2]), 'dominates: both must have equally many scores, but have 1 and 2');
  refuses(() => undominated([[NaN]]), 'dominates: score must be finite, but is NaN');
});
