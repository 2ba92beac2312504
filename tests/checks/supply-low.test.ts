import { describe, expect, it } from 'vitest';
import { assumed, max, min } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('supply-low');
const SPEC = stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) });

describe('lowest supply', () => {
  it.each([[2.999, 'pass'], [3, 'pass'], [3.001, 'fail']])('3 V against an operating minimum of %f V: %s', (volts, outcome) => {
    expect(judge(SPEC, [min('supplyVoltage', volts)])).toMatchObject({ outcome, required: 3, offered: volts, sense: 'at-most', basis: 'guaranteed', margin: 3 / volts });
  });

  it('is undecided without the minimum, whatever the maximum, and tells where it turns', () => {
    expect(judge(SPEC, [max('supplyVoltage', 5.5)])).toMatchObject({
      outcome: 'unknown', offered: null, basis: null, reason: 'missing-figure', decidesAt: { figure: 'supplyVoltage', kind: 'min', value: 3, unit: 'V' },
    });
  });

  it('passes on a minimum the user assumed, never fails on it', () => {
    expect(judge(SPEC, [assumed(min('supplyVoltage', 2.7))])).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect(judge(SPEC, [assumed(min('supplyVoltage', 3.3))])).toMatchObject({ outcome: 'unknown', reason: 'assumed' });
  });
});
