import { describe, expect, it } from 'vitest';
import { surroundingsOf } from '../../src/stage/surroundings.js';
import { ac, dc, GROUND, midSupply, source, stageSpec, value } from '../support/stages.js';

describe('what surrounds the amplifier', () => {
  it('is nothing in series unless given; the source is exact unless it has a tolerance', () => {
    expect(surroundingsOf(stageSpec('follower', dc(1, 2)), GROUND)).toEqual({
      ac: false, sourceResistance: 0, sourceTolerance: 0, referenceResistance: 0, referenceBypass: 0, signalResistance: 0, feedbackCapacitance: 0,
    });
    expect(surroundingsOf(stageSpec('follower', ac(1), { source: source(1e3, 0.05) }), midSupply(0, 5e3))).toEqual({
      ac: true, sourceResistance: 1e3, sourceTolerance: 0.05, referenceResistance: 5e3, referenceBypass: 0, signalResistance: 5e3, feedbackCapacitance: 0,
    });
  });

  it('carries the bypass of the reference and the feedback capacitor', () => {
    const around = surroundingsOf(stageSpec('inverting', ac(1), { capacitors: { feedback: value(10e-12) } }), { ...midSupply(0, 5e3), bypass: value(1e-6) });
    expect([around.referenceBypass, around.feedbackCapacitance]).toEqual([1e-6, 10e-12]);
  });

  it('shows of a bypassed reference the real part at the top frequency, and nothing to an edge', () => {
    const reference = { ...midSupply(0, 5e3), bypass: value(1e-6) };
    const corner = 1 / (2 * Math.PI * 5e3 * 1e-6);
    const shown = (signal: Parameters<typeof stageSpec>[1]) => surroundingsOf(stageSpec('non-inverting', signal), reference).signalResistance;
    expect(shown(dc(1, 2, corner))).toBeCloseTo(2500, 9);
    expect(shown(dc(1, 2, 100 * corner))).toBeCloseTo(5e3 / 10_001, 9);
    expect([shown(dc(1, 2)), shown({ ...dc(1, 2, corner), shape: 'pulse' })]).toEqual([0, 0]);
  });
});
