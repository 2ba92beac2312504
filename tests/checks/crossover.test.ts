import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { StageSpec } from '../../src/spec/spec.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { judgingBy, verdictOrNull, type Run } from '../support/judged.js';
import { FULL, max, min, replacing } from '../support/parts.js';
import { between, dc, midSupply, resistors, stageSpec } from '../support/stages.js';
import { oscillatorStage } from '../support/shaped-stages.js';

// Follower on 3..4.2 V, 1..2 V at its input: 1 V to 3.2 V below V+.
const FOLLOWER = stageSpec('follower', dc(1, 2, 1e3), { supply: between(3, 4.2), avoid: ['crossover'] });
const judge = judgingBy('crossover');
const region = (nearer: number, farther: number): Figure[] => [...FULL, min('inputCrossover', nearer), max('inputCrossover', farther)];
const outcome = (spec: StageSpec, figures: readonly Figure[], run: Run = {}): [string, Verdict['offered']] => {
  const verdict = judge(spec, figures, run);
  return [verdict.outcome, verdict.offered];
};

describe('crossover', () => {
  it('is asked with avoid only', () => {
    expect(verdictOrNull('crossover', { ...FOLLOWER, avoid: [] }, region(0.8, 1.3))).toBeNull();
    expect(verdictOrNull('crossover', { ...FOLLOWER, avoid: ['clamp'] }, region(0.8, 1.3))).toBeNull();
  });

  it('fails where the inputs come inside the region, not at its edges', () => {
    expect(outcome(FOLLOWER, region(0.5, 0.999))).toEqual(['pass', 'not reached']);
    expect(outcome(FOLLOWER, region(0.5, 1))).toEqual(['pass', 'not reached']);
    expect(outcome(FOLLOWER, region(0.5, 1.001))).toEqual(['fail', 'crossed twice a period']);
    expect(outcome(FOLLOWER, region(3.199, 3.5))).toEqual(['fail', 'crossed twice a period']);
    expect(outcome(FOLLOWER, region(3.2, 3.5))).toEqual(['pass', 'not reached']);
  });

  it('says how large the step is, how often it comes and what it distorts', () => {
    const { measures, notes } = judge(FOLLOWER, region(1.3, 1.7));
    expect(measures?.map(({ name, basis }) => [name, basis])).toEqual([['hand-overs a period', 'guaranteed'], ['offset step', 'estimated'], ['distortion', 'estimated']]);
    // The supply over the rejection: 4.2 V over 10 000.
    expect(measures?.slice(0, 2).map(({ value }) => value)).toEqual([2, expect.closeTo(4.2e-4, 12)]);
    expect(notes).toEqual([
      'the pairs hand over 1.3 V..1.7 V below V+, the stage takes the inputs 1 V..3.2 V below it',
      'the offset steps by up to 420 µV there, twice a period (2 kHz): distortion up to -73.5 dB',
    ]);
  });

  it('in the middle of the swing makes a square of the step', () => {
    // 1 V..2 V below V+ at 3 V: half of the time on each side, harmonics from the third on, dV = 3 V over 10 000.
    const distortion = judge(FOLLOWER, region(1.4999999, 1.5000001)).measures?.[2]?.value;
    expect(distortion).toBeCloseTo((3e-4 * Math.sqrt(0.25 - 2 / Math.PI ** 2)) / (0.5 / Math.SQRT2), 8);
  });

  it('between the corners of the supply counts as anywhere in the swing', () => {
    const narrow = stageSpec('follower', dc(1, 1.2, 1e3), { supply: between(3, 4.2), avoid: ['crossover'] });
    // 1.8..2 V below V+ at 3 V, 3..3.2 V at 4.2 V: 2.5 V is met at 3.6 V.
    const { outcome: stands, measures } = judge(narrow, region(2.4, 2.6));
    expect(stands).toBe('fail');
    expect(measures?.find(({ name }) => name === 'distortion')?.value).toBeGreaterThan(1e-3);
  });

  it('of inputs that rest tells that they rest there', () => {
    const inverting = stageSpec('inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0), reference: midSupply(), avoid: ['crossover'] });
    expect(outcome(inverting, region(2.4, 2.6))).toEqual(['fail', 'rested in']);
    expect(judge(inverting, region(2.4, 2.6)).measures?.map(({ name }) => name)).toEqual(['offset step']);
    expect(outcome(inverting, region(0.8, 1.3))).toEqual(['pass', 'not reached']);
  });

  it('of an oscillator, whose inputs jump, has no distortion', () => {
    const verdict = judge(oscillatorStage(1e3, { avoid: ['crossover'] }), region(2, 3));
    expect([verdict.outcome, verdict.measures?.map(({ name }) => name)]).toEqual(['fail', ['hand-overs a period', 'offset step']]);
  });

  it('leaves the size open without a rejection', () => {
    const { outcome: stands, notes } = judge(FOLLOWER, [...replacing('commonModeRejection'), min('inputCrossover', 1.3), max('inputCrossover', 1.7)]);
    expect([stands, notes?.[1]]).toEqual(['fail', 'the offset steps there, by how much is not known, twice a period (2 kHz)']);
  });
});

describe('no region stated', () => {
  it('is unknown where pairs might hand over', () => {
    expect(judge(FOLLOWER, FULL)).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'inputCrossover' }] });
  });

  it('needs none where the list says there is no step', () => {
    expect(outcome(FOLLOWER, FULL, { identity: { crossoverFree: true } })).toEqual(['pass', 'not reached']);
    expect(judge(FOLLOWER, FULL, { identity: { crossoverFree: false } }).outcome).toBe('unknown');
  });

  it('passes inputs with one pair, as an estimate, from 0.9 V of head-room on', () => {
    const at = (room: number) => judge(stageSpec('follower', dc(1, 2), { supply: between(3, 4.2), avoid: ['crossover'] }), replacing('inputHighHeadroom', max('inputHighHeadroom', room)));
    expect([at(0.899).outcome, at(0.9).outcome, at(0.901).outcome]).toEqual(['unknown', 'pass', 'pass']);
    expect(at(0.9).basis).toBe('estimated');
  });

  it('passes inputs that stay 2 V below V+, as an estimate', () => {
    const at = (high: number) => judge(stageSpec('follower', dc(0.5, high), { avoid: ['crossover'] }), FULL);
    expect([at(2.999).outcome, at(3).outcome, at(3.001).outcome]).toEqual(['pass', 'pass', 'unknown']);
    expect(at(3).basis).toBe('estimated');
  });
});
