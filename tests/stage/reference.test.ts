import { describe, expect, it } from 'vitest';
import { referenceAt, referenceEnds } from '../../src/stage/reference.js';
import { GROUND, midSupply, voltage } from '../support/stages.js';

describe('reference voltages that go with a supply', () => {
  it('are one for ground, a stiff half of the supply, and an exact voltage', () => {
    expect(referenceEnds(GROUND, 5)).toEqual([0]);
    expect(referenceEnds(midSupply(), 4.2)).toEqual([2.1]);
    expect(referenceEnds(voltage(1.25), 3)).toEqual([1.25]);
  });

  it('have two ends with a tolerance; a mid-supply one is a tolerance of its value and moves with the supply', () => {
    expect(referenceEnds(voltage(2, 0.01), 5)).toEqual([1.98, 2.02]);
    const [low, high] = referenceEnds(midSupply(0.02), 4);
    expect(low).toBeCloseTo(2 * 0.98, 12);
    expect(high).toBeCloseTo(2 * 1.02, 12);
    expect(referenceAt(midSupply(0.02), 4, 'nominal')).toBe(2);
  });
});
