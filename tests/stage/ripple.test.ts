import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { dc, midSupply, resistors, stageOf, stageSpec, value, voltage } from '../support/stages.js';

const inverting = (more: Partial<StageSpec>): readonly string[] =>
  stageOf(stageSpec('inverting', dc(2, 3), { resistors: resistors(10e3, 10e3, 0), reference: midSupply(), supplyRipple: { amplitude: value(0.02), frequency: value(1e3) }, ...more })).cautions;

describe('ripple through a mid-supply reference', () => {
  it('is half of it times the gain from there to the output', () => {
    // 20 mV, half of it at the reference, twice that at the output of an inverter by one.
    expect(inverting({})).toEqual(['of the ripple on the supply up to 20 mV peak reaches the output through the mid-supply reference, which no bypass holds back, whatever the amplifier; it is not charged to the part']);
  });

  it('is less behind a bypass: one pole of its resistance and capacitor', () => {
    // 10 kΩ with 159.2 nF: 100 Hz, a decade below the ripple.
    const reference = { ...midSupply(0, 10e3), bypass: value(1 / (2 * Math.PI * 1e6)) };
    expect(inverting({ reference })[0]).toContain('up to 2 mV peak');
  });

  it('is none through a reference of its own, or without ripple', () => {
    expect(inverting({ reference: voltage(2.5) })).toEqual([]);
    const without = stageSpec('inverting', dc(2, 3), { resistors: resistors(10e3, 10e3, 0), reference: midSupply() });
    expect(stageOf(without).cautions).toEqual([]);
  });
});
