import { describe, expect, it } from 'vitest';
import { ac, dc, midSupply, source, stageOf, stageSpec, swing } from '../support/stages.js';

describe('follower', () => {
  it('puts the input at the output and at both pins, noise gain 1', () => {
    const stage = stageOf(stageSpec('follower', dc(0.5, 4.5)));
    expect(stage.output).toEqual({ min: 0.5, max: 4.5 });
    expect(stage.commonMode).toEqual({ min: 0.5, max: 4.5 });
    expect([stage.gain, stage.noiseGain.max, stage.dcNoiseGain.max]).toEqual([1, 1, 1]);
    expect(stage.resistors).toBeNull();
  });

  it('has the source in series with the + input and nothing with the - input', () => {
    const stage = stageOf(stageSpec('follower', dc(0.5, 4.5), { source: source(1e3) }));
    expect([stage.seriesPositive, stage.seriesNegative]).toEqual([1e3, 0]);
  });

  it('AC-coupled, swings about the bias, whose resistance is Rp; the source does not count', () => {
    const stage = stageOf(stageSpec('follower', ac(1), { reference: midSupply(0, 50e3), source: source(1e3) }));
    expect(stage.output).toEqual({ min: 2.5 - 1, max: 2.5 + 1 });
    expect(stage.commonMode).toEqual({ min: 1.5, max: 3.5 });
    expect([stage.seriesPositive, stage.seriesNegative]).toEqual([50e3, 0]);
  });

  it('has no current in a feedback network', () => {
    const stage = stageOf(stageSpec('follower', { ...dc(1, 2), input: swing(1, 2) }));
    expect(stage.vertices.map((at) => at.networkCurrent)).toEqual([0, 0]);
  });
});
