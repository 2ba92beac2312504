import { describe, expect, it } from 'vitest';
import { oscillatorStage, step } from '../support/shaped-stages.js';
import { dc, demandsOf, load, resistors, stageSpec, value } from '../support/stages.js';

const limits = { settling: { within: value(2e-5), to: value(1e-3) } };

describe('settling asked', () => {
  it('is the time written, for the largest step of the output, with the load it charges', () => {
    const spec = stageSpec('non-inverting', step(0.1, 0.3), { resistors: resistors(70e3, 10e3, 0), limits, load: load(1e4, 'ground', 1e-9) });
    const demand = demandsOf(spec).settling!;
    expect(demand).toMatchObject({ required: 2e-5, unit: 's', sense: 'at-most', tolerance: 1e-3 });
    expect(demand.step).toBeCloseTo(1.6, 12);
    expect(demand.load!.resistiveCurrent).toBeCloseTo(2.4 / 1e4 + 2.4 / 80e3, 12);
    expect(demand.load!.capacitance).toBe(1e-9);
    expect(demand.closedLoop.at({ gainBandwidth: 1e6, inputCapacitance: 0 }).a).toBeCloseTo(8 / (2 * Math.PI * 1e6), 15);
  });

  it('is not asked without a limit, nor of an oscillator', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2))).settling).toBeNull();
    expect(demandsOf(oscillatorStage(1e3, { limits })).settling).toBeNull();
  });
});
