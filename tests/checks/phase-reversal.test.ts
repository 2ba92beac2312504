import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { FULL, max, replacing, typ } from '../support/parts.js';
import { dc, midSupply, resistors, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('phase-reversal');
const follower = (more: Partial<StageSpec> = {}): StageSpec => stageSpec('follower', dc(1, 2), { avoid: ['phase-reversal'], ...more });
const stands = (spec: StageSpec, phaseReversal: boolean | null, figures = FULL): string => judge(spec, figures, { identity: { phaseReversal } }).outcome;
const beyond = (volts: number, more: Partial<StageSpec> = {}): StageSpec => follower({ overdrive: value(volts), sequencing: 'supply-first', ...more });

describe('phase reversal', () => {
  it('is asked with avoid only, and never decides a part without it', () => {
    expect(verdictOrNull('phase-reversal', follower({ avoid: [], overdrive: value(0.5) }), FULL, { identity: { phaseReversal: true } })).toBeNull();
  });

  it('goes by what the list states; silence is unknown', () => {
    expect([stands(follower(), true), stands(follower(), false), stands(follower(), null)]).toEqual(['fail', 'pass', 'unknown']);
    expect(judge(follower(), FULL)).toMatchObject({ reason: 'missing-figure', missing: [{ figure: 'phaseReversal', kind: null }] });
  });

  it('is out of reach of inputs that rest at the reference', () => {
    const inverting = stageSpec('inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0), reference: midSupply(), avoid: ['phase-reversal'] });
    expect([stands(inverting, true), stands(inverting, null)]).toEqual(['pass', 'pass']);
  });

  it('is ruled out by a stage that says both: nothing beyond the rails, the supply first', () => {
    expect(stands(beyond(0), true)).toBe('pass');
    expect(stands(follower({ overdrive: value(0) }), true)).toBe('fail');
    expect(stands(follower({ sequencing: 'supply-first' }), true)).toBe('fail');
    expect(stands(beyond(0, { sequencing: 'signal-first' }), true)).toBe('fail');
    expect(stands(beyond(0.001), true)).toBe('fail');
  });

  it('cannot come where the inputs work as far beyond both rails as they are taken', () => {
    const both = (low: number, high: number) => replacing('inputLowHeadroom', max('inputLowHeadroom', low)).filter(({ parameter }) => parameter !== 'inputHighHeadroom').concat(max('inputHighHeadroom', high));
    expect([0.099, 0.1, 0.101].map((volts) => stands(beyond(volts), true, both(-0.1, -0.1)))).toEqual(['pass', 'pass', 'fail']);
    expect(stands(beyond(0.1), true, both(-0.1, 0))).toBe('fail');
    expect(stands(beyond(0.1, { sequencing: 'signal-first' }), true, both(-0.1, -0.1))).toBe('fail');
  });

  it('cannot be decided where only a typical range reaches so far', () => {
    const typical = FULL.filter(({ parameter }) => !parameter.startsWith('input')).concat(typ('inputLowHeadroom', -0.2), typ('inputHighHeadroom', -0.2));
    expect(judge(beyond(0.15), typical, { identity: { phaseReversal: true } })).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
    expect(stands(beyond(0.1), true, typical)).toBe('pass');
  });

  it('says why', () => {
    const why = (spec: StageSpec, phaseReversal: boolean | null = true): readonly string[] | undefined => judge(spec, FULL, { identity: { phaseReversal } }).notes;
    expect(why(beyond(0.5))).toEqual(['an input goes 500 mV beyond a rail: the output jumps to the other one']);
    expect(why(follower({ sequencing: 'signal-first' }))).toEqual(['the signal is there before the supply: the output may start at the wrong rail']);
    expect(why(follower())).toEqual(['when an input leaves its range, at overload or power-up, the output jumps to the other rail']);
    expect(why(follower(), false)).toEqual(['the list says there is none']);
  });
});
