import { describe, expect, it } from 'vitest';
import { assumed, max, min } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('supply-high');
const SPEC = stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) });

describe('highest supply', () => {
  it.each([[4.201, 'pass'], [4.2, 'pass'], [4.199, 'fail']])('4.2 V against an operating maximum of %f V: %s', (volts, outcome) => {
    expect(judge(SPEC, [max('supplyVoltage', volts)])).toMatchObject({ outcome, required: 4.2, offered: volts, sense: 'at-least', basis: 'guaranteed', margin: volts / 4.2 });
  });

  it('is undecided without the maximum, whatever the minimum', () => {
    expect(judge(SPEC, [min('supplyVoltage', 1.8)])).toMatchObject({ outcome: 'unknown', offered: null, reason: 'missing-figure', decidesAt: { kind: 'max', value: 4.2 } });
  });

  it('passes on a maximum the user assumed, never fails on it', () => {
    expect(judge(SPEC, [assumed(max('supplyVoltage', 5.5))])).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect(judge(SPEC, [assumed(max('supplyVoltage', 3.6))])).toMatchObject({ outcome: 'unknown', reason: 'assumed' });
  });
});
