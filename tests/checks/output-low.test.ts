import { describe, expect, it } from 'vitest';
import { amperes, max, min, ohms, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, load, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('output-low');
/** 0.2 V of room, and nothing to sink: the load goes to ground. */
const SPEC = stageSpec('follower', dc(0.2, 4), { load: load(10e3) });
/** 0.2 V of room while 4.8 mA flow in from the supply. */
const SINKING = stageSpec('follower', dc(0.2, 4), { load: load(1e3, 'supply') });
const at = (volts: number, amps: number): ReturnType<typeof max> => max('outputLowHeadroom', volts, amperes(amps, 5));

describe('output low', () => {
  it.each([[0.199, 'pass'], [0.2, 'pass'], [0.201, 'fail']])('0.2 V of room against %f V: %s', (volts, outcome) => {
    expect(judge(SINKING, [at(volts, 4.8e-3)])).toMatchObject({ outcome, required: 0.2, offered: volts, basis: 'guaranteed' });
  });

  it('needs the lightest point where nothing is sunk', () => {
    expect(judge(SPEC, [at(0.05, 1e-3), at(0.3, 10e-3)])).toMatchObject({ outcome: 'pass', offered: 0.05, basis: 'guaranteed' });
  });

  it('takes the maximum, else the typical with half its magnitude', () => {
    const typical = typ('outputLowHeadroom', 0.15, amperes(4.8e-3, 5));
    expect(judge(SINKING, [typical])).toMatchObject({ outcome: 'unknown', reason: 'typical-only', offeredBest: 0.15 });
    expect(judge(SINKING, [typical]).offered).toBeCloseTo(0.225, 12);
    expect(judge(SINKING, [typical, at(0.19, 4.8e-3)])).toMatchObject({ outcome: 'pass', offered: 0.19, basis: 'guaranteed' });
  });

  it('at 0 V is reached with swing to lose only: zero is never quite reached', () => {
    const zero = (loss: number): ReturnType<typeof stageSpec> => stageSpec('follower', dc(0, 4), { load: load(10e3), limits: { swingLoss: value(loss) } });
    const helped = max('outputLowHeadroom', 0.005, ohms(10e3, 'ground', 5));
    // No pull at 0 V: the point measured with the load to ground does not count.
    expect(judge(zero(0), [helped])).toMatchObject({ outcome: 'unknown', required: 0, offered: null });
    expect(judge(zero(0.005), [helped])).toMatchObject({ outcome: 'pass', required: 0.005, offered: 0.005, spare: 0 });
    expect(judge(zero(0.0049), [helped]).outcome).toBe('fail');
    expect(judge(zero(0.02), [at(0.02, 1e-3)])).toMatchObject({ outcome: 'pass', required: 0.02 });
  });

  it('@ 25 °C grows with the distance from it', () => {
    const cold = { ...SINKING, temperature: between(-20, 60) };
    const figure = max('outputLowHeadroom', 0.15, { ...amperes(4.8e-3, 5), temperature: 25 });
    const verdict = judge(cold, [figure]);
    expect(verdict.offered).toBeCloseTo(0.15 * (1 + 0.005 * 45), 12);
    expect(verdict).toMatchObject({ outcome: 'pass', basis: 'estimated', offeredBest: 0.15 });
  });

  it('with a load not stated can pass, not fail', () => {
    expect(judge(SPEC, [max('outputLowHeadroom', 0.1, { supply: 5 })])).toMatchObject({ outcome: 'pass', basis: 'assumed', offered: 0.1, offeredBest: 0 });
    expect(judge(SPEC, [max('outputLowHeadroom', 3, { supply: 5 })])).toMatchObject({ outcome: 'unknown', reason: 'assumed' });
  });

  it('with a supply not stated, or far away, can fail: only its basis is assumed', () => {
    expect(judge(SINKING, [max('outputLowHeadroom', 0.3, amperes(4.8e-3))])).toMatchObject({ outcome: 'fail', basis: 'assumed' });
    expect(judge(SINKING, [max('outputLowHeadroom', 0.3, amperes(4.8e-3, 2.4))])).toMatchObject({ outcome: 'fail', basis: 'assumed' });
    expect(judge(SINKING, [max('outputLowHeadroom', 0.3, amperes(4.8e-3, 2.5))])).toMatchObject({ outcome: 'fail', basis: 'guaranteed' });
  });

  it('reads only its own figures', () => {
    expect(judge(SPEC, [max('outputHighHeadroom', 0.01, amperes(1e-3, 5)), min('outputCurrent', 1)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });
});
