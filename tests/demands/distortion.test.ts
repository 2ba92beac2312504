import { describe, expect, it } from 'vitest';
import { oscillatorStage, step } from '../support/shaped-stages.js';
import { between, dc, demandsOf, midSupply, resistors, stageSpec, value } from '../support/stages.js';

const limits = { distortion: value(1e-3) };

describe('distortion asked', () => {
  it('is the fraction written, with slope and corners of the swing', () => {
    const demand = demandsOf(stageSpec('follower', dc(1, 4, 10e3), { supply: between(4.5, 5.5), limits })).distortion!;
    expect(demand).toMatchObject({ required: 1e-3, unit: '1', sense: 'at-most', closest: 0.5 });
    expect(demand.slewing!.slewRate).toBeCloseTo(2 * Math.PI * 10e3 * 1.5, 6);
    expect(demand.corners.map(({ peak }) => peak)).toEqual([1.5, 1.5]);
    expect(demand.corners[0]!.high.map(({ room }) => room)).toEqual([3.5, 0.5]);
    expect(demand.crossovers).toMatchObject([{ near: 0.5, far: 3.5, supply: 4.5 }, { near: 1.5, far: 4.5, supply: 5.5 }]);
  });

  it('counts the bare room: neither swing loss nor margin', () => {
    const more = { limits: { ...limits, swingLoss: value(0.1) }, margins: { outputHeadroom: value(0.05) } };
    expect(demandsOf(stageSpec('follower', dc(1, 4, 10e3), more)).distortion!.corners[0]!.low.map(({ room }) => room)).toEqual([1, 4]);
  });

  it('has no input crossover where the inputs stand still, whatever the supply does', () => {
    const inverting = stageSpec('inverting', dc(2, 3, 1e3), { resistors: resistors(1e4, 1e4), reference: midSupply(), supply: between(4.5, 5.5), limits });
    expect(demandsOf(inverting).distortion!.crossovers).toEqual([]);
  });

  it('without a frequency, and of a step, counts only clipping and crossover, and says so', () => {
    for (const signal of [dc(1, 4), step(1, 4, 1e-3)]) {
      const demand = demandsOf(stageSpec('follower', signal, { limits })).distortion!;
      expect([demand.slewing, demand.because.includes('only clipping and the input crossover count')]).toEqual([null, true]);
    }
  });

  it('is not asked without a limit, nor of an oscillator', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 4))).distortion).toBeNull();
    expect(demandsOf(oscillatorStage(1e3, { limits })).distortion).toBeNull();
  });
});
