import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { amperes, max, min, ohms, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { ac, dc, load, midSupply, resistors, stageSpec } from '../support/stages.js';

const judge = judgingBy('output-current');
/** 4 V into 1 kΩ: sources 4 mA, sinks nothing. */
const SOURCING = stageSpec('follower', dc(1, 4), { load: load(1e3) });
/** ±1 V about half the supply into 1 kΩ and 10 kΩ of feedback: 1.1 mA both ways. */
const BOTH = stageSpec('inverting', ac(1), { resistors: resistors(10e3, 10e3, 0), reference: midSupply(), load: load(1e3, 'reference') });
const high = (amps: number, supply = 5): ReturnType<typeof max> => max('outputHighHeadroom', 0.1, amperes(amps, supply));
const low = (amps: number, supply = 5): ReturnType<typeof max> => max('outputLowHeadroom', 0.1, amperes(amps, supply));

describe('output current', () => {
  it.each([[4.001e-3, 'pass'], [4e-3, 'pass'], [3.999e-3, 'fail']])('4 mA against a usable %f A: %s', (amps, outcome) => {
    expect(judge(SOURCING, [min('outputCurrent', amps)])).toMatchObject({ outcome, offered: amps, sense: 'at-least', basis: 'guaranteed' });
  });

  it('never takes a short-circuit current as usable', () => {
    expect(judge(SOURCING, [min('shortCircuitCurrent', 1), typ('shortCircuitCurrent', 1)])).toMatchObject({ outcome: 'unknown', offered: null, reason: 'missing-figure' });
  });

  it('without one is good up to 1.5 × the heaviest head-room point, undecided beyond, never a fail', () => {
    expect(judge(SOURCING, [high(4e-3 / 1.5)])).toMatchObject({ outcome: 'pass', basis: 'estimated', offeredBest: null });
    const beyond = judge(SOURCING, [high(2.6e-3)]);
    expect(beyond).toMatchObject({ outcome: 'unknown', reason: 'estimated', basis: null });
    expect(beyond.offered).toBeCloseTo(1.5 * 2.6e-3, 15);
  });

  it('takes the heaviest point of any supply', () => {
    expect(judge(SOURCING, [high(0.1e-3), high(3e-3, 10)])).toMatchObject({ outcome: 'pass', offered: 1.5 * 3e-3 });
  });

  it('goes by its own side in each direction', () => {
    expect(judge(SOURCING, [low(10e-3)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    expect(judge(BOTH, [high(1e-3), low(1e-3)]).outcome).toBe('pass');
    expect(judge(BOTH, [high(1e-3)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    expect(judge(BOTH, [high(1e-3), low(0.7e-3)])).toMatchObject({ outcome: 'unknown', reason: 'estimated' });
    expect(judge(BOTH, [high(1e-3), low(0.7e-3)]).offered).toBeCloseTo(1.05e-3, 15);
  });

  it('leaves assisted points out', () => {
    expect(judge(SOURCING, [max('outputHighHeadroom', 0.1, ohms(1, 'supply', 5))])).toMatchObject({ outcome: 'unknown' });
  });

  it('is the usable current where both are known', () => {
    expect(judge(SOURCING, [min('outputCurrent', 3e-3), high(10e-3)])).toMatchObject({ outcome: 'fail', offered: 3e-3 });
  });

  it('with --strict leaves typical points out', () => {
    const typical = [typ('outputHighHeadroom', 0.1, amperes(10e-3, 5))];
    expect(judge(SOURCING, typical).outcome).toBe('pass');
    expect(judge(SOURCING, typical, { strict: true }).outcome).toBe('unknown');
  });

  it('of nothing at all needs no figure', () => {
    const none: StageSpec = stageSpec('follower', dc(1, 4));
    expect(judge(none, [])).toMatchObject({ outcome: 'pass', required: 0, basis: 'guaranteed' });
  });
});
