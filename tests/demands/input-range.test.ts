import { describe, expect, it } from 'vitest';
import { between, coupled, dc, demandsOf, fourResistors, midSupply, resistors, stageSpec, swing, ac } from '../support/stages.js';

describe('common-mode room', () => {
  it('is the lowest pin voltage to V-, and the least V+ minus the highest', () => {
    const demands = demandsOf(stageSpec('follower', dc(0.1, 2.5), { supply: between(3, 4.2) }));
    expect(demands['input-low']).toMatchObject({ required: 0.1, sense: 'at-most', corner: { input: 0.1 } });
    expect(demands['input-high']).toMatchObject({ required: 0.5, corner: { supply: 3, input: 2.5 } });
  });

  it('shares the corner of a mid-supply reference: half the supply, not the largest minus the smallest', () => {
    const demands = demandsOf(stageSpec('inverting', ac(0.1), { supply: between(4, 6), resistors: resistors(1e4, 1e4), reference: midSupply() }));
    expect(demands['input-low'].required).toBe(2);
    expect(demands['input-high'].required).toBe(2);
  });

  it('is negative where a pin goes below ground', () => {
    expect(demandsOf(stageSpec('difference', coupled(swing(0.5, 1), swing(-3, -2.8)), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, 0), reference: midSupply() }))['input-low'].required).toBeCloseTo((-3 + 0.25 + 2.5) / 2, 12);
  });
});
