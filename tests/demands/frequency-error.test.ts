import { describe, expect, it } from 'vitest';
import { oscillatorStage } from '../support/shaped-stages.js';
import { between, dc, demandsOf, load, stageSpec, value } from '../support/stages.js';

const limits = { frequencyError: value(0.02) };

describe('frequency error asked', () => {
  it('is the fraction written, at both ends of the supply, with the currents just after switching', () => {
    const demand = demandsOf(oscillatorStage(1e3, { limits, supply: between(4, 5) }))['frequency-error']!;
    expect(demand).toMatchObject({ required: 0.02, unit: '1', sense: 'at-most' });
    expect(demand.ends.map(({ supply }) => supply)).toEqual([4, 5]);
    // 5 V: capacitor at 1.667 V behind 10 kΩ, thresholds at 3.333 V behind 100 kΩ.
    expect(demand.ends[1]!.sourced).toBeCloseTo(5 * (2 / 3) / 1e4 + 5 / 3 / 1e5, 12);
    expect(demand.ends[1]!.sunk).toBeCloseTo(5 * (2 / 3) / 1e4 + 5 / 3 / 1e5, 12);
  });

  it('adds the load at the rail', () => {
    const [end] = demandsOf(oscillatorStage(1e3, { limits, load: load(1e4) }))['frequency-error']!.ends;
    expect(end!.sourced).toBeCloseTo(5 / 1e4 + 10 / 3 / 1e4 + 5 / 3 / 1e5, 12);
    expect(end!.sunk).toBeCloseTo(10 / 3 / 1e4 + 5 / 3 / 1e5, 12);
  });

  it('is not asked without a limit, nor of another stage', () => {
    expect(demandsOf(oscillatorStage(1e3))['frequency-error']).toBeNull();
    expect(demandsOf(stageSpec('follower', dc(1, 2), { limits }))['frequency-error']).toBeNull();
  });
});
