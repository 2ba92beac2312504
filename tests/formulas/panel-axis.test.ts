import { describe, expect, it } from 'vitest';
import { butterworthPower, panelAxis } from '../../src/formulas/panel-axis.js';

describe('axis of panels', () => {
  it('weighs one hertz between 1 Hz and 2 Hz, by both rules', () => {
    const { frequency, weight, difference, filter } = panelAxis([[Math.log(1), Math.log(2)]], null);
    expect(frequency).toHaveLength(15);
    expect(weight.reduce((sum, value) => sum + value, 0)).toBeCloseTo(1, 14);
    expect(difference.reduce((sum, value) => sum + value, 0)).toBeCloseTo(0, 14);
    expect(filter.every((value) => value === 1)).toBe(true);
  });
  it('puts panels one after another', () => {
    const { frequency, weight } = panelAxis([[0, 1], [1, 3]], { corner: 2, order: 1 });
    expect(frequency.every((value, i) => i === 0 || value > frequency[i - 1]!)).toBe(true);
    expect(weight.reduce((sum, value) => sum + value, 0)).toBeCloseTo(Math.exp(3) - 1, 11);
  });
  it('is 1/17 an octave above a second-order corner', () => {
    expect(butterworthPower(2e3, { corner: 1e3, order: 2 })).toBeCloseTo(1 / 17, 15);
    expect(butterworthPower(2e3, null)).toBe(1);
    expect(butterworthPower(1e15, { corner: 1e-9, order: 16 })).toBe(0);
  });
});
