import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { ac, dc, demandsOf, load, midSupply, stageSpec, value } from '../support/stages.js';

const battery = { capacity: value(0.22 * 3600), usable: value(0.85), others: value(10e-6) };

describe('battery budget', () => {
  it('is PWR-06: 220 mAh, 85 % usable, 40 µA', () => {
    const budget = demandsOf(stageSpec('follower', dc(1, 2), { battery })).battery!;
    expect(budget.others).toBe(10e-6);
    expect(budget.hoursAt(40e-6)).toBeCloseTo(ENTRIES.find(({ id }) => id === 'PWR-06')!.expected as number, 6);
    expect(budget.hoursAt(0)).toBe(Infinity);
  });

  it('counts what the output sources: Vp/(π·RL) of a sine about mid-supply, the mean of a load to ground', () => {
    const sine = demandsOf(stageSpec('follower', ac(1), { battery, load: load(1e4, 'reference'), reference: midSupply() })).battery!;
    expect(sine.network).toBeCloseTo(1 / (Math.PI * 1e4), 12);
    expect(demandsOf(stageSpec('follower', dc(1, 2), { battery, load: load(1e4) })).battery!.network).toBeCloseTo(1.5 / 1e4, 12);
  });

  it('counts a load to the supply by itself, whatever the output sinks', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2), { battery, load: load(1e4, 'supply') })).battery!.network).toBeCloseTo(3.5 / 1e4, 12);
  });

  it('is none without a battery', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2))).battery).toBeNull();
  });
});
