import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { ac, between, coupled, dc, demandsOf, fourResistors, midSupply, resistors, source, stageSpec, swing, value } from '../support/stages.js';

const asked = (spec: StageSpec): NonNullable<ReturnType<typeof demandsOf>['dc-error']> => demandsOf({ ...spec, limits: { dcError: value(0.02) } })['dc-error']!;

describe('what the DC error is multiplied by', () => {
  it('is not asked without a limit', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2)))['dc-error']).toBeNull();
  });

  it('is the upper corner of the DC noise gain; 1 when AC-coupled', () => {
    const more = { resistors: resistors(70e3, 10e3), reference: midSupply() };
    expect(asked(stageSpec('non-inverting', dc(2.4, 2.6), more)).noiseGain).toBeCloseTo(1 + (7 * 1.01) / 0.99, 12);
    expect(asked(stageSpec('non-inverting', ac(0.1), more)).noiseGain).toBe(1);
  });

  it('are Rp and Rn at nominal resistors, and the tolerance of the resistors', () => {
    const demand = asked(stageSpec('non-inverting', dc(2.4, 2.6), { resistors: resistors(70e3, 10e3, 0.02), reference: midSupply(), source: source(1e3) }));
    expect(demand).toMatchObject({ positive: 1e3, negative: 8750, tolerance: 0.02, required: 0.02, sense: 'at-most' });
  });

  it('are the largest moves of common mode and output from half the supply at that corner', () => {
    const follower = asked(stageSpec('follower', dc(0.2, 2.5), { supply: between(3, 4.2) }));
    // 2.1 - 0.2 at 4.2 V; 2.5 - 1.5 at 3 V.
    expect(follower.commonModeMove).toBeCloseTo(1.9, 12);
    expect(follower.outputMove).toBeCloseTo(1.9, 12);
    const inverting = asked(stageSpec('inverting', ac(0.5), { supply: between(4, 6), resistors: resistors(20e3, 10e3, 0), reference: midSupply() }));
    expect(inverting.commonModeMove).toBe(0);
    expect(inverting.outputMove).toBeCloseTo(1, 12);
  });

  it('is the largest distance from 25 °C', () => {
    expect(asked(stageSpec('follower', dc(1, 2), { temperature: between(-20, 60) }))).toMatchObject({ kelvin: 45, temperature: -20 });
  });

  it('moves the pins of a difference stage with its common mode', () => {
    const demand = asked(stageSpec('difference', coupled(swing(0, 0), swing(2.5, 4.5)), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, 0), reference: midSupply() }));
    expect(demand.commonModeMove).toBeCloseTo((4.5 + 2.5) / 2 - 2.5, 12);
  });
});
