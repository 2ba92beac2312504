import { describe, expect, it } from 'vitest';
import { max, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('input-high');
/** 3.0 V - 2.8 V leaves 0.2 V at the top. */
const SPEC = stageSpec('follower', dc(0.2, 2.8), { supply: between(3, 4.2) });
const room = 0.2;

describe('input range high', () => {
  it.each([[room - 0.001, 'pass'], [room, 'pass'], [room + 0.001, 'fail'], [-0.1, 'pass']])('0.2 V of room against a head-room of %f V: %s', (volts, outcome) => {
    const verdict = judge(SPEC, [max('inputHighHeadroom', volts)]);
    expect(verdict).toMatchObject({ outcome, offered: volts, sense: 'at-most', basis: 'guaranteed', margin: null });
    expect(verdict.required).toBeCloseTo(room, 12);
    expect(verdict.spare).toBeCloseTo(room - volts, 12);
  });

  it('derates a typical one by half its magnitude, beyond the rail as well', () => {
    // 0.13 V · 1.5 = 0.195 V; 0.14 V · 1.5 = 0.21 V.
    expect(judge(SPEC, [typ('inputHighHeadroom', 0.13)])).toMatchObject({ outcome: 'pass', basis: 'derated', offeredBest: 0.13 });
    expect(judge(SPEC, [typ('inputHighHeadroom', 0.14)])).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
    expect(judge(SPEC, [typ('inputHighHeadroom', 0.21)])).toMatchObject({ outcome: 'fail', offered: 0.21 });
    expect(judge(SPEC, [typ('inputHighHeadroom', -0.2)]).offered).toBeCloseTo(-0.1, 15);
  });

  it('is undecided without the figure, whatever the other side', () => {
    expect(judge(SPEC, [max('inputLowHeadroom', 0)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });

  it('stands at the lowest supply', () => {
    expect(judge(SPEC, [max('inputHighHeadroom', 0)]).worstAt).toEqual({ supply: 3, reference: 0, input: 2.8 });
  });
});
