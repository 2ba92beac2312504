import { describe, expect, it } from 'vitest';
import { openNoiseGain } from '../../src/demands/index.js';
import { max, min, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { dc, resistors, stageSpec, swing, value, voltage } from '../support/stages.js';

const judge = judgingBy('stable-gain');
const SPEC = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3) });
const LOWER = 1 + (7 * 0.99) / 1.01;

describe('minimum stable gain', () => {
  it.each([[LOWER - 0.001, 'pass'], [LOWER, 'pass'], [LOWER + 0.001, 'fail']])('noise gain 7.861 at its lower corner against %f: %s', (gain, outcome) => {
    const verdict = judge(SPEC, [max('minimumStableGain', gain)]);
    expect(verdict).toMatchObject({ outcome, offered: gain, sense: 'at-most', basis: 'guaranteed' });
    expect(verdict.required).toBeCloseTo(LOWER, 12);
  });

  it('is unity where none is known: assumed, and it passes a follower exactly', () => {
    expect(judge(stageSpec('follower', dc(1, 2)), [])).toMatchObject({ outcome: 'pass', required: 1, offered: 1, basis: 'assumed' });
  });

  it('must be unity with a capacitor across the feedback, whatever the gain', () => {
    const fitted = { ...SPEC, capacitors: { feedback: value(10e-12) } };
    expect(judge(fitted, [max('minimumStableGain', 5)])).toMatchObject({ outcome: 'fail', required: expect.closeTo(1, 9) as number });
    expect(judge(fitted, [max('minimumStableGain', 1)]).outcome).toBe('pass');
  });
});

describe('a transimpedance stage that leaves its capacitor to the part', () => {
  const photodiode = { current: swing(0, 10e-6), direction: 'out-of-node', capacitance: value(50e-12) } as const;
  const stage = stageSpec('transimpedance', { coupling: 'dc', shape: 'band-limited' }, { photodiode, resistors: { feedback: value(100e3) }, reference: voltage(0.5) });
  const OPEN = { feedback: 100e3, inputCapacitance: 50e-12 };

  it('is judged at the noise gain that the part\'s own gain bandwidth makes, the least of it', () => {
    const [slow, printed] = [openNoiseGain(OPEN, 6e6, 0.05), openNoiseGain(OPEN, 10e6, 0.05)];
    const at = (gain: number) => judge(stage, [max('minimumStableGain', gain), typ('gainBandwidth', 10e6)]);
    expect(at(slow)).toMatchObject({ outcome: 'pass', required: slow, basis: 'derated' });
    expect(at((slow + printed) / 2)).toMatchObject({ outcome: 'unknown', required: slow, reason: 'typical-only' });
    expect(at(printed * 1.001)).toMatchObject({ outcome: 'fail', required: printed });
  });

  it('counts the capacitance of the part\'s own input', () => {
    const required = (farad: number): number => Number(judge(stage, [max('minimumStableGain', 5), min('gainBandwidth', 10e6), typ('inputCapacitance', farad)]).required);
    expect(required(10e-12)).toBeCloseTo(openNoiseGain({ ...OPEN, inputCapacitance: 60e-12 }, 10e6, 0.05), 9);
  });

  it('needs no gain bandwidth of a part that is stable at unity, and is undecided without one otherwise', () => {
    expect(judge(stage, [])).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect(judge(stage, [max('minimumStableGain', 5)])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'gainBandwidth', kind: 'min' }] });
  });
});

it('is not asked of an oscillator', () => {
  expect(verdictOrNull('stable-gain', stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, { oscillator: { frequency: value(1e3) } }), [])).toBeNull();
});
