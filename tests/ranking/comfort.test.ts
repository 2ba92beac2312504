import { describe, expect, it } from 'vitest';
import { comfortOf, marginForOrder } from '../../src/ranking/comfort.js';
import { passing } from '../support/fitting.js';

describe('comfort of a margin', () => {
  it('is 0.5 at exactly met on limits and (1 - 0.8)/(1.5 - 0.8) on typical figures', () => {
    expect(comfortOf(passing('slew-rate', 1))).toBeCloseTo((1 - 0.8) / (1.2 - 0.8), 12);
    expect(comfortOf(passing('slew-rate', 1, { basis: 'derated' }))).toBeCloseTo((1 - 0.8) / (1.5 - 0.8), 12);
  });

  it('is 1 from the comfortable margin on: excess never wins', () => {
    expect(comfortOf(passing('slew-rate', 1.2))).toBe(1);
    expect(comfortOf(passing('slew-rate', 1.19))).toBeLessThan(1);
    expect(comfortOf(passing('slew-rate', 1000))).toBe(1);
    expect(comfortOf(passing('dc-error', 1.25))).toBe(1);
  });

  it('never falls below 0.2', () => {
    expect(comfortOf(passing('slew-rate', 0.8))).toBe(0.2);
    expect(comfortOf(passing('slew-rate', 0.1))).toBe(0.2);
  });

  it('counts 50 mV of spare head-room as a margin of 1.25', () => {
    expect(marginForOrder(passing('output-low', null, { spare: 0.05 }))).toBeCloseTo(1.25, 12);
    expect(marginForOrder(passing('output-high', null, { spare: 0 }))).toBe(1);
    expect(comfortOf(passing('output-low', null, { spare: 0.05 }))).toBeCloseTo(1, 12);
    expect(comfortOf(passing('output-low', null, { spare: 0.01 }))).toBeCloseTo((1 + 0.05 - 0.8) / 0.45, 12);
  });

  it('is none for ranges, words, temperatures and budgets: met is met', () => {
    for (const check of ['supply-low', 'input-low', 'temperature-high', 'package', 'supply-current', 'price']) expect(comfortOf(passing(check, 1))).toBeNull();
  });
});
