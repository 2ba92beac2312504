import { describe, expect, it } from 'vitest';
import { amperes, max, ohms, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, load, midSupply, resistors, stageSpec } from '../support/stages.js';

const judge = judgingBy('output-high');
/** 4.5 V of 5 V into 1 kΩ to ground: 0.5 V of room at 4.5 mA. */
const SPEC = stageSpec('follower', dc(1, 4.5), { load: load(1e3) });
const at = (volts: number, amps = 4.5e-3): ReturnType<typeof max> => max('outputHighHeadroom', volts, amperes(amps, 5));

describe('output high', () => {
  it.each([[0.499, 'pass'], [0.5, 'pass'], [0.501, 'fail']])('0.5 V of room against %f V: %s', (volts, outcome) => {
    const verdict = judge(SPEC, [at(volts)]);
    expect(verdict).toMatchObject({ outcome, required: 0.5, offered: volts, sense: 'at-most', basis: 'guaranteed', margin: null });
    expect(verdict.spare).toBeCloseTo(0.5 - volts, 12);
  });

  it('counts the current sourced, load and feedback', () => {
    const spec = stageSpec('inverting', dc(2, 2), { resistors: resistors(10e3, 10e3, 0), reference: midSupply(), load: load(1e3) });
    // 3 V: 3 mA of load and 0.5 V/10 kΩ back to the reference.
    const verdict = judge(spec, [max('outputHighHeadroom', 0.1, amperes(1e-3, 5)), max('outputHighHeadroom', 1.1, amperes(6e-3, 5))]);
    expect(verdict.worstAt?.['load']).toBeCloseTo(3.05e-3, 15);
    expect(verdict.offered).toBeCloseTo(0.1 + (1.0 * (3.05 - 1)) / 5, 12);
  });

  it('judges every vertex with its own supply and current, and shows the one of least spare (the vertex trap)', () => {
    const spec = stageSpec('inverting', dc(0.2, 0.2), { supply: between(3, 5.5), resistors: resistors(9e3, 10e3, 0), reference: midSupply(), load: load(1e3) });
    const out = (supply: number): number => (supply / 2) * 1.9 - 0.9 * 0.2;
    const current = (supply: number): number => out(supply) / 1e3 + (out(supply) - supply / 2) / 9e3;
    // 100 Ω at either supply: 0.28 V of 0.33 V at 3.0 V, 0.53 V of 0.455 V at 5.5 V.
    const points = [3, 5.5].map((supply) => max('outputHighHeadroom', 1, amperes(10e-3, supply))).concat([3, 5.5].map((supply) => max('outputHighHeadroom', 0, amperes(0, supply))));
    const verdict = judge(spec, points);
    expect(verdict).toMatchObject({ outcome: 'fail', worstAt: { supply: 5.5 } });
    expect(verdict.required).toBeCloseTo(5.5 - out(5.5), 12);
    expect(verdict.offered).toBeCloseTo(100 * current(5.5), 12);
  });

  it('scales a set rated above the supply: an estimate that cannot reject alone', () => {
    const need = (0.2 * (10 - 0.7)) / (5 - 0.7);
    const pass = judge(SPEC, [max('outputHighHeadroom', 0.2, amperes(4.5e-3, 10))]);
    expect(pass).toMatchObject({ outcome: 'pass', basis: 'estimated', offeredBest: 0.2 });
    expect(pass.offered).toBeCloseTo(need, 12);
    expect(judge(SPEC, [max('outputHighHeadroom', 0.3, amperes(4.5e-3, 10))])).toMatchObject({ outcome: 'unknown', reason: 'estimated', offeredBest: 0.3 });
    expect(judge(SPEC, [max('outputHighHeadroom', 0.6, amperes(4.5e-3, 10))])).toMatchObject({ outcome: 'fail', offered: 0.6 });
  });

  it('with one point goes through the origin up to 1.5 × its current, then is undecided', () => {
    expect(judge(SPEC, [at(0.3, 3e-3)]).offered).toBeCloseTo(0.45, 12);
    expect(judge(SPEC, [at(0.3, 3e-3)])).toMatchObject({ outcome: 'pass', basis: 'estimated' });
    expect(judge(SPEC, [at(0.3, 2.999e-3)])).toMatchObject({ outcome: 'unknown', offered: null, known: 0.3, reason: 'beyond-data' });
  });

  it('beyond it fails where the heaviest point as printed already exceeds the room', () => {
    expect(judge(SPEC, [at(0.5, 1e-3)])).toMatchObject({ outcome: 'unknown', offered: null, known: 0.5 });
    expect(judge(SPEC, [at(0.501, 1e-3)])).toMatchObject({ outcome: 'fail', offered: null, known: 0.501 });
    // Derated it would exceed; as printed it does not.
    expect(judge(SPEC, [typ('outputHighHeadroom', 0.4, amperes(1e-3, 5))]).outcome).toBe('unknown');
  });

  it('has points with the load to the supply count only where the load helps', () => {
    const helped = max('outputHighHeadroom', 0.01, ohms(2e3, 'supply', 5));
    const up = (ohm: number): ReturnType<typeof stageSpec> => stageSpec('follower', dc(1, 4.5), { load: load(ohm, 'supply') });
    expect(judge(up(2e3), [helped])).toMatchObject({ outcome: 'pass', offered: 0.01, basis: 'guaranteed' });
    expect(judge(up(2.01e3), [helped])).toMatchObject({ outcome: 'unknown', offered: null, reason: 'missing-figure' });
    expect(judge(SPEC, [helped])).toMatchObject({ outcome: 'unknown', offered: null });
  });
});
