import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { FULL, max, min, partOf, replacing, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { photodiodeStage } from '../support/shaped-stages.js';
import { between, dc, demandsOf, exactly, fourResistors, legs, midSupply, resistors, source, stageSpec, swing, value } from '../support/stages.js';

const judge = judgingBy('dc-error');
const NG = 1 + (7 * 1.01) / 0.99;
const LOWER = 1 + (7 * 0.99) / 1.01;
/** Non-inverting 8 on 3.0..4.2 V about ground, 25..330 mV, source 1 kΩ, -20..60 °C. */
const within = (limit: number): StageSpec =>
  stageSpec('non-inverting', dc(0.025, 0.33), { supply: between(3, 4.2), resistors: resistors(70e3, 10e3), source: source(1e3), temperature: between(-20, 60), limits: { dcError: value(limit) } });

const FIGURES: readonly Figure[] = [
  max('offsetVoltage', 1e-3), max('offsetDrift', 2e-6), max('biasCurrent', 20e-9, { temperature: 85 }), max('offsetCurrent', 5e-9, { temperature: 85 }),
  min('commonModeRejection', 1e4), min('supplyRejection', 5e3), min('openLoopGain', 1e5),
];

// By hand: Rp = 1 kΩ, Rn = 70 kΩ || 10 kΩ = 8.75 kΩ, t = 1 %.
const RP = 1e3;
const RN = 8750;
const UNEQUAL = RN - RP + 0.01 * (RN + RP);
// Largest move of the common mode from half the supply at that corner: 2.1 V - 25 mV. Of the output: 2.1 V - 25 mV × lower NG.
const VCM = 2.1 - 0.025;
const VO = Math.max(2.1 - LOWER * 0.025, NG * 0.33 - 1.5);
const VS = 0.6;
const TERMS = [1e-3, 2e-6 * 45, 20e-9 * UNEQUAL, (5e-9 / 2) * (RP + RN), VCM / 1e4, VS / 5e3, VO / 1e5].map((term) => NG * term);
const TOTAL = TERMS.reduce((sum, term) => sum + term, 0);

describe('DC error', () => {
  it('is NG (upper corner) × the sum of the magnitudes, term by term', () => {
    const verdict = judge(within(0.02), FIGURES);
    expect(verdict.terms.map(({ name }) => name)).toEqual(['offset', 'offset drift', 'bias current', 'offset current', 'common mode', 'supply', 'open-loop gain']);
    verdict.terms.forEach((term, at) => expect(term.value / TERMS[at]!, term.name).toBeCloseTo(1, 9));
    expect(Number(verdict.offered) / TOTAL).toBeCloseTo(1, 9);
    expect(verdict.rss! / Math.hypot(...TERMS)).toBeCloseTo(1, 9);
    expect(verdict).toMatchObject({ outcome: 'pass', basis: 'guaranteed', worstAt: { temperature: -20 } });
  });

  it.each([[1.001, 'pass'], [1, 'pass'], [0.999, 'fail']])('against %f of its sum: %s', (share, outcome) => {
    expect(judge(within(TOTAL * share), FIGURES).outcome).toBe(outcome);
  });
});

/** A follower about half of 5 V that needs offset and nothing else. */
const QUIET = (more: Partial<StageSpec> = {}): StageSpec => stageSpec('follower', dc(2.5, 2.5), { limits: { dcError: value(1e-3) }, ...more });
const OFFSET = max('offsetVoltage', 0.5e-3);

describe('a term with zero multiplier', () => {
  it('needs no figure', () => {
    expect(judge(QUIET(), [OFFSET])).toMatchObject({ outcome: 'pass', offered: 0.5e-3, basis: 'guaranteed' });
    expect(judge(QUIET(), [OFFSET]).terms).toHaveLength(1);
  });

  it('needs none either where only rounding is left of it', () => {
    const four = fourResistors({ r1: 1e4, r2: 2e4, r3: 1e4, r4: 2e4 }, 0);
    const spec = stageSpec('difference', legs(swing(1.65, 1.65), swing(1.65, 1.65)), { supply: exactly(3.3), resistors: four, reference: midSupply(), limits: { dcError: value(1) } });
    // (1.65·2 + 1.65)/3 is not half of 3.3 V in binary.
    expect(demandsOf(spec)['dc-error']!.commonModeMove).not.toBe(0);
    expect(judge(spec, [OFFSET, max('biasCurrent', 1e-9), max('offsetCurrent', 1e-9)])).toMatchObject({ outcome: 'pass', basis: 'guaranteed' });
  });

  it('of drift needs none beside an offset over temperature', () => {
    const warm = QUIET({ temperature: between(-40, 85) });
    expect(judge(warm, [max('offsetVoltage', 0.5e-3, { temperature: 'over' })])).toMatchObject({ outcome: 'pass', offered: 0.5e-3 });
    expect(judge(warm, [OFFSET])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'offsetDrift', kind: 'max' }] });
  });
});

describe('a missing figure', () => {
  const SUPPLY = QUIET({ supply: between(4.5, 5.5), limits: { dcError: value(1e-3) } });

  it('makes the check unknown: offered null, known the part that is known, and where it turns', () => {
    const spec = stageSpec('follower', dc(2.5, 2.5), { supply: between(5, 5), temperature: between(25, 85), limits: { dcError: value(1e-3) } });
    expect(judge(spec, [OFFSET])).toMatchObject({ outcome: 'unknown', offered: null, known: 0.5e-3, reason: 'missing-figure' });
    const turns = judge(spec, [OFFSET]).decidesAt;
    expect(turns).toMatchObject({ figure: 'offsetDrift', kind: 'max', unit: 'V/K' });
    expect(turns?.value).toBeCloseTo(0.5e-3 / 60, 15);
  });

  it('fails only where the known terms exceed the limit on their optimistic reading', () => {
    expect(judge(SUPPLY, [max('offsetVoltage', 1e-3)])).toMatchObject({ outcome: 'unknown', known: 1e-3 });
    expect(judge(SUPPLY, [max('offsetVoltage', 1.001e-3)])).toMatchObject({ outcome: 'fail', offered: null, known: 1.001e-3 });
    expect(judge(SUPPLY, [typ('offsetVoltage', 0.9e-3)])).toMatchObject({ outcome: 'unknown', offered: null });
    expect(judge(SUPPLY, [typ('offsetVoltage', 1.001e-3)])).toMatchObject({ outcome: 'fail', known: 1.001e-3 });
  });
});

describe('the supply term', () => {
  const over = (min_: number, max_: number): StageSpec => stageSpec('inverting', dc(2, 2), { supply: between(min_, max_), resistors: resistors(1e4, 1e4, 0), reference: midSupply(), limits: { dcError: value(1) } });
  const moved = (figure: Figure): number => judge(over(4, 6), [figure, max('biasCurrent', 0), max('offsetCurrent', 0), min('openLoopGain', 1e9), min('supplyRejection', 1e3)]).terms.find(({ name }) => name === 'supply')!.value;

  it('names both temperatures where the offset is worst in the cold and the currents when hot', () => {
    const of = (temperature: number): object | null => judge(within(1), replacing('biasCurrent', max('biasCurrent', 20e-12, { temperature }))).worstAt;
    expect(of(25)).toEqual({ supply: 4.2, temperature: -20, currentTemperature: 60 });
    expect(of(85)).toEqual({ supply: 4.2, temperature: -20 });
  });

  it('goes from the supply the offset is rated at, else from the nominal', () => {
    expect(moved(max('offsetVoltage', 1e-3))).toBeCloseTo((2 * 1) / 1e3, 12);
    expect(moved(max('offsetVoltage', 1e-3, { supply: 4 }))).toBeCloseTo((2 * 2) / 1e3, 12);
    expect(moved(max('offsetVoltage', 1e-3, { supply: 5.5 }))).toBeCloseTo((2 * 1.5) / 1e3, 12);
  });

  it('is charged at one fixed supply too where the offset is rated at another', () => {
    const verdict = judge(QUIET(), [max('offsetVoltage', 0.5e-3, { supply: 3 }), min('supplyRejection', 1e4)]);
    expect(verdict.offered).toBeCloseTo(0.5e-3 + 2 / 1e4, 12);
    expect(judge(QUIET(), [max('offsetVoltage', 0.5e-3, { supply: 3 })]).outcome).toBe('unknown');
  });
});

describe('borrowed terms', () => {
  const CLASS = (rejection: number): { sets: ReturnType<typeof partOf>[]; identity: { class: string } } => ({
    sets: [partOf([min('commonModeRejection', rejection)], { tier: 'generic', class: 'c', id: 'G' })],
    identity: { class: 'c' },
  });
  /** Common mode 1 V off half the supply; everything else known and small. */
  const spec = stageSpec('follower', dc(3.5, 3.5), { limits: { dcError: value(1e-3) } });
  const known = [max('offsetVoltage', 0.1e-3), min('openLoopGain', 1e9)];

  it('pass up to a tenth of the limit, exactly that included', () => {
    // 1 V / 10 000 = 0.1 mV, a tenth of 1 mV.
    expect(judge(spec, known, CLASS(1e4))).toMatchObject({ outcome: 'pass', basis: 'borrowed' });
    expect(judge(spec, known, CLASS(9.99e3))).toMatchObject({ outcome: 'unknown', reason: 'borrowed' });
  });

  it('never fail, and without a class the figure is missing', () => {
    expect(judge(spec, known, CLASS(1)).outcome).toBe('unknown');
    expect(judge(spec, known)).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    expect(judge(spec, known, { ...CLASS(1e4), strict: true })).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });

  it('are never offset and bias current: those are not borrowable', () => {
    const sets = [partOf([max('offsetVoltage', 1e-9), max('biasCurrent', 1e-15)], { tier: 'generic', class: 'c', id: 'G' })];
    expect(judge(spec, [min('openLoopGain', 1e9), min('commonModeRejection', 1e9)], { sets, identity: { class: 'c' } })).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'offsetVoltage', kind: 'max' }] });
  });
});

describe('the tolerance of the source', () => {
  const sourced = (tolerance?: number): StageSpec => ({ ...QUIET(), source: source(1e3, tolerance) });
  const figures = [OFFSET, max('biasCurrent', 10e-9), max('offsetCurrent', 0)];

  it('is told in a caution, not charged: t(Rp + Rn) is the one of the resistors', () => {
    const exact = judge(sourced(), figures);
    expect(exact.offered).toBeCloseTo(0.5e-3 + 10e-9 * 1e3 * 1.01, 12);
    expect(exact.cautions).toEqual([]);
    expect(judge(sourced(0.05), figures).offered).toBe(exact.offered);
    // 10 nA × 50 Ω.
    expect(judge(sourced(0.05), figures).cautions).toEqual(['the tolerance of the source resistance may add 500 nV of bias-current error, not charged']);
  });
});

describe('figures of other checks', () => {
  it('change nothing', () => {
    const all = judge(within(0.2), FULL);
    expect(all).toMatchObject({ outcome: 'pass' });
    expect(judge(within(0.2), replacing('slewRate')).offered).toBe(all.offered);
    expect(judge(within(0.2), replacing('outputCurrent')).offered).toBe(all.offered);
  });
});

describe('currents of stages whose network is one resistor', () => {
  it('of a transimpedance stage flow through its feedback resistor: 1 pA at 25 °C, 64 times at 85 °C, through 100 MΩ is 6.4 mV (DC-08)', () => {
    const spec = { ...photodiodeStage({ amperes: 10e-9, farad: 10e-12, ohms: 100e6 }), temperature: between(25, 85), limits: { dcError: value(10e-3) } };
    const verdict = judge(spec, [max('biasCurrent', 1e-12, { temperature: 25 }), max('offsetCurrent', 0, { temperature: 25 })], { identity: { inputType: 'fet' } });
    expect(verdict.terms.find(({ name }) => name === 'bias current')!.value).toBeCloseTo(6.4e-3, 9);
  });

  it('of an integrator with a bleed resistor flow through that one beside the input resistor', () => {
    const spec = stageSpec('integrator', dc(2.4, 2.6, 1e3), {
      integrator: { resistance: value(1e5), capacitance: value(10e-9) }, resistors: { feedback: value(1e6), tolerance: value(0) }, reference: midSupply(), limits: { dcError: value(1) },
    });
    const demand = demandsOf(spec)['dc-error']!;
    expect(demand.negative).toBeCloseTo((1e5 * 1e6) / 1.1e6, 3);
    expect(demand.noiseGain).toBeCloseTo(11, 9);
  });
});
