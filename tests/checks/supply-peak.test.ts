import { describe, expect, it } from 'vitest';
import { max } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('supply-peak');
const SPEC = stageSpec('follower', dc(1, 2), { supply: between(3, 4.2), supplyPeak: value(5) });

describe('supply peak', () => {
  it.each([[5.001, 'pass'], [5, 'pass'], [4.999, 'fail']])('5 V against an absolute maximum of %f V: %s', (volts, outcome) => {
    expect(judge(SPEC, [max('supplyAbsoluteMaximum', volts)])).toMatchObject({ outcome, required: 5, offered: volts, basis: 'guaranteed' });
  });

  it('is the top of the supply when no peak is given', () => {
    const { supplyPeak: _given, ...spec } = SPEC;
    expect(judge(spec, [max('supplyAbsoluteMaximum', 4.2)])).toMatchObject({ outcome: 'pass', required: 4.2 });
  });

  it('has the operating maximum serve without an absolute one: assumed, it can pass, not fail', () => {
    expect(judge(SPEC, [max('supplyVoltage', 5)])).toMatchObject({ outcome: 'pass', offered: 5, offeredBest: null, basis: 'assumed' });
    expect(judge(SPEC, [max('supplyVoltage', 4.9)])).toMatchObject({ outcome: 'unknown', offered: 4.9, reason: 'assumed', decidesAt: { figure: 'supplyAbsoluteMaximum', value: 5 } });
    expect(judge(SPEC, [max('supplyVoltage', 5)], { strict: true })).toMatchObject({ outcome: 'pass', basis: 'assumed' });
  });

  it('is undecided with neither', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', offered: null, reason: 'missing-figure' });
  });
});
