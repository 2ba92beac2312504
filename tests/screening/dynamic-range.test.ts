import { describe, expect, it } from 'vitest';
import { judged } from '../support/judged.js';
import { amperes, max, typ } from '../support/parts.js';
import { between, dc, load, stageSpec } from '../support/stages.js';

const levels = (low: number, high: number) => [max('outputLowHeadroom', low, amperes(2e-3, 4)), max('outputHighHeadroom', high, amperes(2e-3, 4))];
const spec = stageSpec('follower', dc(1, 2), { supply: between(4, 5), load: load(1e4) });

describe('dynamic range lost to head-room', () => {
  it('is the swing at the lowest supply against one from rail to rail, dB', () => {
    const { dynamicRange } = judged(spec, levels(0.5, 1.5));
    expect(dynamicRange).toMatchObject({ ideal: 4 });
    expect(dynamicRange!.available).toBeCloseTo(2, 12);
    expect(dynamicRange!.lossDecibels).toBeCloseTo(6.0206, 4);
  });

  it('of a conventional output on 5 V, at most 3.8 V (common practice), costs more than 2.4 dB', () => {
    const conventional = judged({ ...spec, supply: between(5, 5) }, [max('outputLowHeadroom', 0, amperes(2e-3, 5)), max('outputHighHeadroom', 1.2, amperes(2e-3, 5))]);
    expect(conventional.dynamicRange!.available).toBeCloseTo(3.8, 12);
    expect(conventional.dynamicRange!.lossDecibels).toBeCloseTo(20 * Math.log10(5 / 3.8), 12);
  });

  it('is read pessimistically, and null where a head-room is not known or nothing is left', () => {
    expect(judged(spec, [typ('outputLowHeadroom', 0.1, amperes(2e-3, 4)), max('outputHighHeadroom', 0, amperes(2e-3, 4))]).dynamicRange!.available).toBeCloseTo(3.85, 12);
    expect(judged(spec, levels(0.5, 1.5).slice(1)).dynamicRange).toBeNull();
    expect(judged(spec, levels(2, 2)).dynamicRange).toBeNull();
  });
});
