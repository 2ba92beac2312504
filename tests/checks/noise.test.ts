import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { LimitsSpec, StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { amperes, assumed, max, min, partOf, typ } from '../support/parts.js';
import { dc, resistors, source, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('noise');
const allowing = (limits: LimitsSpec): StageSpec => stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(90e3, 10e3), source: source(1e3), limits });
const within = (volts: number): StageSpec => allowing({ outputNoise: value(volts) });
/** Limits all through; only the most of the gain bandwidth is a typical. */
const FIGURES: readonly Figure[] = [
  max('voltageNoise', 20e-9), max('noiseCorner', 100), max('currentNoise', 1e-15), min('gainBandwidth', 0.6e6), typ('gainBandwidth', 1e6),
  max('outputLowHeadroom', 0.05, amperes(1e-3, 5)), max('outputHighHeadroom', 0.05, amperes(1e-3, 5)),
];
const without = (parameter: Figure['parameter']): Figure[] => FIGURES.filter((one) => one.parameter !== parameter);
const whole = judge(within(1), FIGURES);
const WORST = Number(whole.offered);
const BEST = Number(whole.offeredBest);

describe('noise at the output', () => {
  it('is the root of the squares of its terms, not their sum', () => {
    expect(whole).toMatchObject({ outcome: 'pass', unit: 'V', sense: 'at-most', basis: 'derated', adds: 'squares', worstAt: { temperature: 25 }, rss: null });
    expect(WORST / Math.hypot(...whole.terms.map((term) => term.value))).toBeCloseTo(1, 12);
    // NG·en·√(1.571·GBW/NG) with the resistors' own: 4kT(1 kΩ + 9 kΩ) beside 20 nV/√Hz, and a little 1/f.
    const density = Math.hypot(20e-9, Math.sqrt(4 * 1.380649e-23 * 298.15 * 10e3));
    expect(WORST / (10 * density * Math.sqrt((Math.PI / 2) * 0.1e6))).toBeCloseTo(1, 2);
  });

  it.each([[1.0001, 'pass'], [1, 'pass'], [0.9999, 'unknown']])('passes on the most of the bandwidth: %f of it %s', (share, outcome) => {
    expect(judge(within(WORST * share), FIGURES).outcome).toBe(outcome);
  });

  it.each([[1.0001, 'unknown'], [0.9999, 'fail']])('fails on the least printed: %f of it %s', (share, outcome) => {
    expect(judge(within(BEST * share), FIGURES).outcome).toBe(outcome);
  });

  it('is less with a filter behind, where more bandwidth no longer matters', () => {
    const filtered = { ...within(1), following: { corner: value(1e3), order: 2 } };
    const [slow, fast] = [1e6, 10e6].map((hertz) => Number(judge(filtered, [...without('gainBandwidth'), typ('gainBandwidth', hertz)]).offered));
    expect(slow!).toBeLessThan(WORST / 5);
    expect(fast! / slow!).toBeCloseTo(1, 2);
  });

  it('tells peak to peak, signal to noise and bits beside it', () => {
    expect(whole.notes).toEqual([expect.stringContaining('6.6 × rms'), expect.stringContaining('with a sine of 2 V'), expect.stringContaining('ENOB')]);
  });

  it('turns at a voltage noise', () => {
    const point = judge(within(WORST * 0.99), FIGURES).decidesAt!;
    expect(point).toMatchObject({ figure: 'voltageNoise', kind: 'max', unit: 'V/√Hz' });
    const at = (share: number): string => judge(within(WORST * 0.99), [...without('voltageNoise'), max('voltageNoise', point.value * share)]).outcome;
    expect([at(0.9999), at(1.0001)]).toEqual(['pass', 'unknown']);
  });

  it('is not asked without a limit', () => {
    expect(verdictOrNull('noise', allowing({}), FIGURES)).toBeNull();
  });
});

describe('signal to noise', () => {
  const RATIO = 2 / (2 * Math.SQRT2) / WORST;

  it('stands on the swing that is there, in volts per volt, its terms in volts', () => {
    const verdict = judge(allowing({ snr: value(RATIO * 0.999) }), FIGURES);
    expect(verdict).toMatchObject({ outcome: 'pass', unit: 'V/V', sense: 'at-least', termUnit: 'V', adds: 'squares' });
    expect(Number(verdict.offered) / RATIO).toBeCloseTo(1, 9);
    expect(judge(allowing({ snr: value(RATIO * 1.001) }), FIGURES).outcome).toBe('unknown');
    expect(judge(allowing({ snr: value(RATIO * 2) }), FIGURES).outcome).toBe('fail');
  });

  it('loses what the head-rooms take of the swing', () => {
    const deaf = [...FIGURES.filter(({ parameter }) => !parameter.startsWith('output')), max('outputLowHeadroom', 1.5, amperes(1e-3, 5)), max('outputHighHeadroom', 2.5, amperes(1e-3, 5))];
    // Wanted 1..3 V; left 1.5..2.5 V.
    const [full, half] = [FIGURES, deaf].map((figures) => Number(judge(allowing({ snr: value(10) }), figures).offered));
    expect(half! / full!).toBeCloseTo(0.5, 6);
    const shut = [...FIGURES.filter(({ parameter }) => !parameter.startsWith('output')), max('outputLowHeadroom', 3, amperes(1e-3, 5)), max('outputHighHeadroom', 3, amperes(1e-3, 5))];
    expect(judge(allowing({ snr: value(10) }), shut)).toMatchObject({ outcome: 'fail', offered: 0 });
  });

  it('and a limit in volts beside it must both hold', () => {
    const both = (volts: number, ratio: number): string => judge(allowing({ outputNoise: value(volts), snr: value(ratio) }), FIGURES).outcome;
    expect([both(1, 10), both(1e-6, 10), both(1, 1e9)]).toEqual(['pass', 'fail', 'fail']);
  });
});

describe('a missing figure', () => {
  it('leaves the check undecided with what is known, and names the value at which it turns', () => {
    const verdict = judge(within(WORST * 1.1), without('voltageNoise'));
    expect(verdict).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', offered: null, missing: [{ figure: 'voltageNoise', kind: 'max' }], decidesAt: { figure: 'voltageNoise' } });
    expect(verdict.known! < WORST).toBe(true);
    const at = (share: number): string => judge(within(WORST * 1.1), [...without('voltageNoise'), max('voltageNoise', verdict.decidesAt!.value * share)]).outcome;
    expect([at(0.9999), at(1.0001)]).toEqual(['pass', 'unknown']);
  });

  it('fails all the same when the resistors alone are too loud', () => {
    const verdict = judge(within(10e-6), without('voltageNoise'));
    expect(verdict).toMatchObject({ outcome: 'fail', offered: null });
    expect(verdict.known! > 10e-6).toBe(true);
    expect(judge(allowing({ snr: value(1e7) }), without('voltageNoise'))).toMatchObject({ outcome: 'fail', offered: null });
  });

  it('counts as missing with --strict, and assumed for a run it can pass and not fail', () => {
    expect(judge(within(1), [...without('voltageNoise'), typ('voltageNoise', 20e-9)], { strict: true }).outcome).toBe('unknown');
    const loud = [...without('voltageNoise'), assumed(max('voltageNoise', 1e-6))];
    expect(judge(within(WORST), loud).outcome).toBe('unknown');
    expect(judge(within(1), [...without('gainBandwidth'), assumed(typ('gainBandwidth', 1e6))])).toMatchObject({ outcome: 'pass', basis: 'assumed' });
  });

  describe('that the class lends', () => {
    const lender = partOf([max('noiseCorner', 1e3), max('currentNoise', 5e-12)], { id: 'GX-1', tier: 'generic', class: 'quiet' });
    const run = { sets: [lender], identity: { class: 'quiet' } };

    it('passes while the borrowed terms are no more than a tenth of the limit', () => {
      const verdict = judge(within(1), without('noiseCorner'), run);
      expect(verdict).toMatchObject({ outcome: 'pass', basis: 'borrowed' });
      const borrowed = verdict.terms.find(({ basis }) => basis === 'borrowed')!.value;
      expect(judge(within(Math.max(borrowed * 10.001, Number(verdict.offered))), without('noiseCorner'), run).outcome).toBe('pass');
      const loud = judge(within(1), without('currentNoise'), run);
      const current = Math.hypot(...loud.terms.filter(({ basis }) => basis === 'borrowed').map((term) => term.value));
      // More than a tenth, and the limit is still met: undecided.
      expect(current * 5).toBeGreaterThan(Number(loud.offered));
      expect(judge(within(current * 5), without('currentNoise'), run)).toMatchObject({ outcome: 'unknown', reason: 'borrowed' });
      expect(judge(allowing({ snr: value(2 / (2 * Math.SQRT2) / (current * 5)) }), without('currentNoise'), run)).toMatchObject({ outcome: 'unknown', reason: 'borrowed' });
    });
  });
});
