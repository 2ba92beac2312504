import { describe, expect, it } from 'vitest';
import { max, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { coupled, dc, fourResistors, midSupply, stageSpec, swing } from '../support/stages.js';

const judge = judgingBy('input-low');
const SPEC = stageSpec('follower', dc(0.2, 2.5));
const room = 0.2;

describe('input range low', () => {
  it.each([[room - 0.001, 'pass'], [room, 'pass'], [room + 0.001, 'fail'], [-0.1, 'pass']])('0.2 V of room against a head-room of %f V: %s', (volts, outcome) => {
    const verdict = judge(SPEC, [max('inputLowHeadroom', volts)]);
    expect(verdict).toMatchObject({ outcome, offered: volts, sense: 'at-most', basis: 'guaranteed', margin: null });
    expect(verdict.required).toBeCloseTo(room, 12);
    expect(verdict.spare).toBeCloseTo(room - volts, 12);
  });

  it('derates a typical one by half its magnitude, beyond the rail as well', () => {
    // 0.13 V · 1.5 = 0.195 V; 0.14 V · 1.5 = 0.21 V.
    expect(judge(SPEC, [typ('inputLowHeadroom', 0.13)])).toMatchObject({ outcome: 'pass', basis: 'derated', offeredBest: 0.13 });
    expect(judge(SPEC, [typ('inputLowHeadroom', 0.14)])).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
    expect(judge(SPEC, [typ('inputLowHeadroom', 0.21)])).toMatchObject({ outcome: 'fail', offered: 0.21 });
    expect(judge(SPEC, [typ('inputLowHeadroom', -0.2)]).offered).toBeCloseTo(-0.1, 15);
  });

  it('is undecided without the figure, whatever the other side', () => {
    expect(judge(SPEC, [max('inputHighHeadroom', 0)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });

  it('lets pins go below ground where the head-room is negative', () => {
    const spec = stageSpec('difference', coupled(swing(0.5, 1), swing(-3, -2.8)), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, 0), reference: midSupply() });
    // ((-3 + 0.25) + 2.5)/2 = -0.125 V.
    expect(judge(spec, [max('inputLowHeadroom', -0.125)])).toMatchObject({ outcome: 'pass', required: -0.125, worstAt: { positive: -2.75 } });
    expect(judge(spec, [max('inputLowHeadroom', -0.124)]).outcome).toBe('fail');
  });
});
