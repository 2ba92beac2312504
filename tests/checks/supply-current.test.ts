import { describe, expect, it } from 'vitest';
import { assumed, max, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { between, dc, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('supply-current');
const limited = (per: 'amplifier' | 'package' = 'amplifier', hottest = 25): ReturnType<typeof stageSpec> =>
  stageSpec('follower', dc(1, 2), { limits: { supplyCurrent: value(80e-6), supplyCurrentPer: per }, temperature: between(25, hottest) });

describe('supply current', () => {
  it.each([[79.9e-6, 'pass'], [80e-6, 'pass'], [80.1e-6, 'fail']])('80 µA against a limit of %f A: %s', (current, outcome) => {
    expect(judge(limited(), [max('quiescentCurrent', current)])).toMatchObject({ outcome, required: 80e-6, offered: current, sense: 'at-most' });
  });

  it('of a typical figure counts 1.4 of it; @ 25 °C and more than 15 K away 1.3', () => {
    expect(judge(limited(), [typ('quiescentCurrent', 80e-6 / 1.4)])).toMatchObject({ outcome: 'pass', basis: 'derated' });
    expect(judge(limited(), [typ('quiescentCurrent', 79e-6)])).toMatchObject({ outcome: 'unknown', offeredBest: 79e-6 });
    expect(judge(limited('amplifier', 60), [max('quiescentCurrent', 80e-6 / 1.3, { temperature: 25 })])).toMatchObject({ outcome: 'pass', basis: 'estimated' });
    expect(judge(limited('amplifier', 60), [max('quiescentCurrent', 70e-6, { temperature: 25 })])).toMatchObject({ outcome: 'unknown', reason: 'estimated' });
  });

  it('per package counts idle sections; unknown channels leave it undecided', () => {
    const figures = [max('quiescentCurrent', 40e-6)];
    expect(judge(limited('package'), figures, { identity: { channels: 2 } })).toMatchObject({ outcome: 'pass', offered: 80e-6, how: '× 2 sections' });
    expect(judge(limited('package'), figures, { identity: { channels: 4 } })).toMatchObject({ outcome: 'fail', offered: 160e-6 });
    expect(judge(limited('amplifier'), figures, { identity: { channels: 4 } }).outcome).toBe('pass');
    expect(judge(limited('package'), figures)).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'channels', kind: null }] });
  });

  it('is not asked without a limit; missing is undecided; an assumed figure cannot fail', () => {
    expect(verdictOrNull('supply-current', stageSpec('follower', dc(1, 2)), [])).toBeNull();
    expect(judge(limited(), [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    expect(judge(limited(), [assumed(max('quiescentCurrent', 1e-3))])).toMatchObject({ outcome: 'unknown', reason: 'assumed' });
  });

  it('with --strict a typical figure counts as missing', () => {
    expect(judge(limited(), [typ('quiescentCurrent', 1e-6)], { strict: true })).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });
});
