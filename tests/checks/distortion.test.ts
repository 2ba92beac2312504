import { describe, expect, it } from 'vitest';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { amperes, max, min, typ } from '../support/parts.js';
import { dc, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('distortion');
const CLEAN = [max('outputLowHeadroom', 0.01, amperes(1e-3, 5)), max('outputHighHeadroom', 0.01, amperes(1e-3, 5)), max('offsetVoltage', 0, { temperature: 'over' })];
const spec = (limit: number) => stageSpec('follower', dc(0.5, 2.5, 10e3), { limits: { distortion: value(limit) } });
/** Half of the slew rate is needed: r = 1/2, HD3 = (f/GBW)·2ρ³/(3r). */
const HALF = min('slewRate', 2 * 2 * Math.PI * 10e3);
const rho = 2 - Math.sqrt(3);
const HD3 = (0.01 * 2 * rho ** 3) / 1.5;
const bipolar = { identity: { inputType: 'bipolar' as const } };

describe('distortion', () => {
  it('is the sum of its terms, the root of their squares beside it, and turns where the limit is met', () => {
    const figures = [...CLEAN, HALF, min('gainBandwidth', 1e6)];
    const verdict = judge(spec(HD3 * 1.001), figures, bipolar);
    expect(verdict).toMatchObject({ outcome: 'pass', unit: '1', sense: 'at-most', basis: 'guaranteed' });
    expect(verdict.offered).toBeCloseTo(HD3, 12);
    expect(verdict.terms.map(({ name }) => name)).toEqual(['slewing', 'clipping']);
    expect(verdict.rss).toBeCloseTo(HD3, 12);
    expect(judge(spec(HD3 * 0.999), figures, bipolar).outcome).toBe('fail');
  });

  it('with an input type that is not known passes only as a bipolar pair and fails only as a FET one', () => {
    const figures = [...CLEAN, HALF, min('gainBandwidth', 1e6)];
    expect(judge(spec(HD3 * 1.001), figures)).toMatchObject({ outcome: 'pass', basis: 'estimated' });
    expect(judge(spec(HD3 * 0.9), figures)).toMatchObject({ outcome: 'unknown', reason: 'estimated' });
    expect(judge(spec(HD3 * 0.2), figures).outcome).toBe('fail');
  });

  it('without a figure is undecided, but fails on what is known', () => {
    expect(judge(spec(1e-3), [HALF, min('gainBandwidth', 1e6)], bipolar)).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'outputLowHeadroom' }, { figure: 'outputHighHeadroom' }] });
    expect(judge(spec(HD3 / 2), [HALF, min('gainBandwidth', 1e6)], bipolar)).toMatchObject({ outcome: 'fail', offered: null });
  });

  it('of a typical slew rate is undecided where only its derating is over the limit', () => {
    const figures = [...CLEAN, typ('slewRate', 2 * 2 * Math.PI * 10e3), min('gainBandwidth', 1e6)];
    expect(judge(spec(HD3 * 1.2), figures, bipolar)).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
  });

  it('near V+ says that the input crossover is not known', () => {
    const near = stageSpec('follower', dc(2, 4, 100), { limits: { distortion: value(0.1) } });
    const verdict = judge(near, [...CLEAN, min('slewRate', 1e6), min('gainBandwidth', 1e6)], bipolar);
    expect(verdict).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect(verdict.cautions.join()).toMatch(/input crossover/u);
  });

  it('is not asked without a limit', () => {
    expect(verdictOrNull('distortion', stageSpec('follower', dc(1, 2, 1e3)), [])).toBeNull();
  });
});
