import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { amperes, max, min, typ } from '../support/parts.js';
import { oscillatorStage } from '../support/shaped-stages.js';
import { between, value } from '../support/stages.js';

const judge = judgingBy('frequency-error');
const spec = (limit: number) => oscillatorStage(1e3, { limits: { frequencyError: value(limit) } });
const levels = (low: number, high: number) => [max('outputLowHeadroom', low, amperes(1e-3, 5)), max('outputHighHeadroom', high, amperes(1e-3, 5))];
const FAST = min('slewRate', 1e12);
/** RNG-29: VOH 3.5 V and VOL 0.05 V of 5 V, against 2RC·ln 2. */
const { expected, naive } = ENTRIES.find(({ id }) => id === 'RNG-29')!;
const CONVENTIONAL = 1 - (expected as number) / naive!.value!;

describe('frequency error of an oscillator', () => {
  it('of a conventional output is RNG-29, and turns there', () => {
    const verdict = judge(spec(CONVENTIONAL * 1.001), [...levels(0.05, 1.5), FAST]);
    expect(verdict).toMatchObject({ outcome: 'pass', unit: '1', sense: 'at-most', basis: 'guaranteed', worstAt: { supply: 5 } });
    expect((verdict.offered as number) / CONVENTIONAL).toBeCloseTo(1, 4);
    expect(verdict.how).toMatch(/duty of 65\.3 %/u);
    expect(judge(spec(CONVENTIONAL * 0.999), [...levels(0.05, 1.5), FAST]).outcome).toBe('fail');
  });

  it('adds what the edges take, as a term of its own', () => {
    const verdict = judge(spec(0.5), [...levels(0, 0), min('slewRate', 0.1e6)]);
    const [byLevels, byEdges] = verdict.terms;
    expect(byLevels!.value).toBeCloseTo(0, 12);
    expect(byEdges!.value).toBeCloseTo(verdict.offered as number, 12);
    // Each edge of 50 µs costs most of itself.
    expect(verdict.offered as number).toBeGreaterThan(0.05);
    expect(verdict.offered as number).toBeLessThan(1 - 1 / 1.1);
  });

  it('of a typical slew rate is undecided where only its derating is over the limit', () => {
    const at = (rate: number): number => judge(spec(0.5), [...levels(0, 0), min('slewRate', rate)]).offered as number;
    expect(judge(spec(at(0.8e5)), [...levels(0, 0), typ('slewRate', 1e5)])).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
  });

  it('fails where the output does not reach the thresholds, and is open where a figure is missing', () => {
    const stopped = judge(spec(0.01), [...levels(0.05, 2.6), FAST]);
    expect(stopped).toMatchObject({ outcome: 'fail', offered: 1 });
    expect(stopped.cautions.join()).toMatch(/does not oscillate/u);
    expect(judge(spec(0.01), [FAST])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'outputLowHeadroom' }, { figure: 'outputHighHeadroom' }] });
    expect(judge(spec(0.01), levels(0, 0))).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'slewRate' }] });
  });

  it('gives no number where the edges set the frequency', () => {
    const verdict = judge(spec(0.01), [...levels(0, 0), min('slewRate', 500)]);
    expect(verdict).toMatchObject({ outcome: 'unknown', offered: null });
    expect(verdict.cautions.join()).toMatch(/slew rate sets the frequency/u);
  });

  it('of clamped inputs never passes where the thresholds are further apart than the diodes allow', () => {
    // Equal resistors: a third of the supply between the inputs.
    const at = (volts: number, inputClamp: boolean | null, limit = 0.5) =>
      judge(oscillatorStage(1e3, { supply: between(volts * 0.9, volts), limits: { frequencyError: value(limit) } }), [max('outputLowHeadroom', 0, amperes(1e-3)), max('outputHighHeadroom', 0, amperes(1e-3)), min('slewRate', 0.1e6)], { identity: { inputClamp } });
    expect(at(5, true)).toMatchObject({ outcome: 'unknown', reason: 'beyond-data', offered: null });
    expect(at(5, true).cautions.join()).toMatch(/differential input 1\.67 V, clamp from about 0\.7 V/u);
    expect(at(2.101, true).outcome).toBe('unknown');
    expect(at(2.099, true).outcome).toBe('pass');
    expect(at(2.1, true).outcome).toBe('pass');
    expect(at(5, true, 0.001)).toMatchObject({ outcome: 'fail', cautions: [expect.stringMatching(/clamp from about/u), expect.anything()] });
    expect(at(5, null).outcome).toBe('pass');
    expect(at(5, null).cautions.join()).toMatch(/whether diodes join the inputs is not known/u);
    expect(at(2.099, null).cautions.join()).not.toMatch(/diodes/u);
    expect(at(5, false).cautions.join()).not.toMatch(/diodes/u);
  });

  it('is not asked without a limit', () => {
    expect(verdictOrNull('frequency-error', oscillatorStage(1e3), [])).toBeNull();
  });
});
