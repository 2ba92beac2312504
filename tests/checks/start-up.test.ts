import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { FULL, max, typ } from '../support/parts.js';
import { dc, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('start-up');
const stage = (limit: number | undefined, more: Partial<StageSpec> = {}): StageSpec =>
  stageSpec('follower', dc(1, 2), { dutyCycle: { on: value(2e-3), every: value(1) }, limits: limit === undefined ? {} : { startUp: value(limit) }, ...more });

describe('start-up', () => {
  it('is asked with a limit only', () => {
    expect(verdictOrNull('start-up', stage(undefined), FULL)).toBeNull();
  });

  it('is held against the time allowed, met exactly is met', () => {
    const at = (seconds: number): string => judge(stage(200e-6), [...FULL, max('startUpTime', seconds)]).outcome;
    expect([199e-6, 200e-6, 201e-6].map(at)).toEqual(['pass', 'pass', 'fail']);
  });

  it('adds the recovery where the signal is there first', () => {
    const known = [...FULL, max('startUpTime', 150e-6), max('overloadRecovery', 60e-6)];
    expect(judge(stage(200e-6), known)).toMatchObject({ outcome: 'pass', offered: 150e-6 });
    const first = judge(stage(200e-6, { sequencing: 'signal-first' }), known);
    expect([first.outcome, first.terms.map(({ name }) => name)]).toEqual(['fail', ['start-up', 'overload recovery']]);
    expect(first.offered).toBeCloseTo(210e-6, 12);
  });

  it('names what is not known and the value at which it turns', () => {
    expect(judge(stage(200e-6), FULL)).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'startUpTime' }], decidesAt: { figure: 'startUpTime', value: 200e-6 } });
    const half = judge(stage(200e-6, { sequencing: 'signal-first' }), [...FULL, max('startUpTime', 150e-6)]);
    expect(half).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'overloadRecovery' }], known: 150e-6 });
    expect(half.decidesAt?.value).toBeCloseTo(50e-6, 12);
    expect(judge(stage(100e-6, { sequencing: 'signal-first' }), [...FULL, max('startUpTime', 150e-6)]).outcome).toBe('fail');
  });

  it('derates a typical figure as the speed it goes with', () => {
    const at = (seconds: number): string => judge(stage(200e-6), [...FULL, typ('startUpTime', seconds)]).outcome;
    expect([119e-6, 121e-6, 199e-6, 201e-6].map(at)).toEqual(['pass', 'unknown', 'unknown', 'fail']);
  });
});
