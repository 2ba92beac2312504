import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import type { Figure } from '../../src/parts/figures.js';
import { amperes, assumed, max, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { ac, between, dc, midSupply, resistors, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('output-low');
const NG = 1 + (7 * 1.01) / 0.99;
const LOWER = 1 + (7 * 0.99) / 1.01;
/** 8 × 25 mV at the lower tolerance end: 0.1965 V of room, -20..60 °C. */
const SPEC: StageSpec = stageSpec('non-inverting', dc(0.025, 0.33), { resistors: resistors(70e3, 10e3), temperature: between(-20, 60) });
const ROOM = LOWER * 0.025;
const POINT = max('outputLowHeadroom', 0.05, amperes(1e-3, 5));

describe("the offset's share", () => {
  it('is NG at its upper corner × (offset + drift × the largest distance from 25 °C)', () => {
    const verdict = judge(SPEC, [POINT, max('offsetVoltage', 1e-3), max('offsetDrift', 2e-6)]);
    expect(verdict.required).toBeCloseTo(ROOM, 12);
    expect(verdict.offered).toBeCloseTo(0.05 + NG * (1e-3 + 2e-6 * 45), 12);
    expect(verdict.terms.map(({ name }) => name)).toEqual(['head-room', 'offset', 'offset drift']);
    expect(verdict.cautions).toEqual([]);
  });

  it('is the offset over temperature without drift', () => {
    const verdict = judge(SPEC, [POINT, max('offsetVoltage', 1e-3), max('offsetVoltage', 2e-3, { temperature: 'over' }), max('offsetDrift', 1)]);
    expect(verdict.offered).toBeCloseTo(0.05 + NG * 2e-3, 12);
  });

  it('turns the verdict where room and need meet', () => {
    const exact = (ROOM - 0.05) / NG;
    const of = (volts: number): string => judge(SPEC, [POINT, max('offsetVoltage', volts, { temperature: 'over' })]).outcome;
    expect([of(exact * 0.999), of(exact), of(exact * 1.001)]).toEqual(['pass', 'pass', 'fail']);
  });

  it('is derated with its figures and lowers the basis', () => {
    const verdict = judge(SPEC, [POINT, typ('offsetVoltage', 1e-3), typ('offsetDrift', 2e-6)]);
    expect(verdict.offered).toBeCloseTo(0.05 + NG * (3e-3 + 6e-6 * 45), 12);
    expect(verdict.offeredBest).toBeCloseTo(0.05 + NG * (1e-3 + 2e-6 * 45), 12);
    expect(verdict.basis).toBe('derated');
  });

  it('is 1 × offset where a capacitor blocks DC', () => {
    const spec = stageSpec('non-inverting', ac(0.25), { resistors: resistors(70e3, 10e3, 0), reference: midSupply() });
    expect(judge(spec, [POINT, max('offsetVoltage', 1e-3)]).offered).toBeCloseTo(0.05 + 1e-3, 12);
  });

  it('not known is not charged: a caution tells what uses the spare up', () => {
    const left = (ROOM - 0.05) / NG;
    const none = judge(SPEC, [POINT]);
    expect(none).toMatchObject({ outcome: 'pass', offered: 0.05 });
    expect(none.cautions).toHaveLength(1);
    expect(none.uncharged?.figure).toBe('offsetVoltage');
    expect(none.cautions[0]).toMatch(/^offset not known and not charged: (\d+\.\d+) mV of offset uses the spare up$/u);
    // Rounded down to three digits: never more than there is.
    expect(Number(/(\d+\.\d+) mV/u.exec(none.cautions[0] ?? '')?.[1])).toBe(Math.floor(left * 1e4) / 10);
    expect(judge(SPEC, [POINT, max('offsetVoltage', 1e-3)]).cautions[0]).toMatch(/^offset drift not known and not charged: [\d.]+ [µm]V\/(?:°C|K) uses the spare up$/u);
    expect(judge({ ...SPEC, temperature: between(25, 25) }, [POINT, max('offsetVoltage', 1e-3)]).cautions).toEqual([]);
  });

  it('charges a drift that is known beside an offset that is not: what is left is for the offset', () => {
    const verdict = judge(SPEC, [POINT, max('offsetDrift', 2e-6)]);
    expect(verdict.offered).toBeCloseTo(0.05 + NG * 2e-6 * 45, 12);
    const { value: turn = 0, ...of } = verdict.uncharged ?? {};
    expect(of).toEqual({ figure: 'offsetVoltage', kind: 'max', unit: 'V' });
    const withOffset = (volts: number): string => judge(SPEC, [POINT, max('offsetDrift', 2e-6), max('offsetVoltage', volts)]).outcome;
    expect([withOffset(turn * 0.999), withOffset(turn * 1.001)]).toEqual(['pass', 'fail']);
  });

  it('is in what is known without a head-room, and fails alone where it exceeds the room', () => {
    const of = (volts: number): ReturnType<typeof judge> => judge(SPEC, [max('offsetVoltage', volts, { temperature: 'over' })]);
    expect(of(1e-3)).toMatchObject({ outcome: 'unknown', offered: null, reason: 'missing-figure' });
    expect(of(1e-3).known).toBeCloseTo(NG * 1e-3, 12);
    expect(of((ROOM / NG) * 1.001)).toMatchObject({ outcome: 'fail', offered: null });
    expect(of((ROOM / NG) * 0.999).outcome).toBe('unknown');
  });

  it('counts in the bound beyond the data', () => {
    const beyond = { ...SPEC, load: { resistance: value(1e3), to: 'supply' } } as const;
    const of = (volts: number): ReturnType<typeof judge> => judge(beyond, [max('outputLowHeadroom', 0.1, amperes(1e-3, 5)), max('offsetVoltage', volts, { temperature: 'over' })]);
    const exact = (ROOM - 0.1) / NG;
    expect(of(exact * 0.99)).toMatchObject({ outcome: 'unknown', offered: null });
    expect(of(exact * 1.01)).toMatchObject({ outcome: 'fail', offered: null });
    const { known, terms, missing, decidesAt } = of(exact * 0.99);
    expect(of(exact * 1.01).known).toBeCloseTo(0.1 + NG * exact * 1.01, 12);
    expect(terms.map(({ name }) => name)).toEqual(['head-room of the heaviest point', 'offset']);
    expect(terms.reduce((sum, term) => sum + term.value, 0)).toBe(known);
    expect(missing).toMatchObject([{ figure: 'outputLowHeadroom', beyond: { covers: 1e-3, supply: 5 } }]);
    const flows = missing[0]?.beyond?.current ?? 0;
    expect(flows).toBeGreaterThan(1.5e-3);
    expect(decidesAt?.condition).toEqual({ current: flows, supply: 5 });
  });
});

describe('an assumed head-room', () => {
  const heavy = { ...SPEC, load: { resistance: value(1e3), to: 'supply' } } as const;

  it('holds at whatever current flows, so the value that decides passes', () => {
    const open = judge(heavy, [max('offsetVoltage', 1e-3, { temperature: 'over' })]);
    expect(open).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    const of = (volts: number): ReturnType<typeof judge> => judge(heavy, [assumed(max('outputLowHeadroom', volts)), max('offsetVoltage', 1e-3, { temperature: 'over' })]);
    const turns = open.decidesAt?.value ?? 0;
    expect(of(turns)).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect(of(turns * 1.001)).toMatchObject({ outcome: 'unknown', reason: 'assumed' });
  });
});

describe('the other reading', () => {
  it('is told at the vertex shown, too', () => {
    // Scaling makes 3 V the worst; as printed the larger current at 5 V is.
    const spec = { ...SPEC, supply: between(3, 5), load: { resistance: value(2e3), to: 'supply' } } as const;
    const verdict = judge(spec, [typ('outputLowHeadroom', 0.1, amperes(1e-3, 5)), typ('outputLowHeadroom', 0.15, amperes(2.6e-3, 5))]);
    expect(verdict.outcome).toBe('unknown');
    expect(verdict.worstAt).toMatchObject({ supply: 3 });
    expect(verdict.otherThere).toBeLessThan(Number(verdict.offeredBest));
    expect(verdict.offered).toBeCloseTo(((1.5 * (5 - 0.7)) / (3 - 0.7)) * (verdict.otherThere ?? 0), 12);
  });
});

describe('room below zero', () => {
  const high = judgingBy('output-high');
  const beyond = stageSpec('non-inverting', dc(0.1, 5 / 8), { resistors: resistors(70e3, 10e3) });
  const point = (volts: number): Figure => max('outputHighHeadroom', volts, amperes(1e-3, 5));

  it('fails every part, points or none', () => {
    expect(high(beyond, [])).toMatchObject({ outcome: 'fail', offered: null });
    expect(high(beyond, [point(0)]).outcome).toBe('fail');
    expect(high(beyond, [typ('outputHighHeadroom', 0, amperes(1e-3, 5))]).outcome).toBe('fail');
    expect(high(beyond, [max('outputHighHeadroom', 0)]).outcome).toBe('fail');
  });

  it('fails a part that claims to go beyond its rail, too', () => {
    expect(high(beyond, [point(-1)]).outcome).toBe('fail');
  });

  it('is not room of exactly zero', () => {
    expect(high(stageSpec('follower', dc(1, 5)), [point(0)])).toMatchObject({ outcome: 'pass', required: 0, offered: 0, spare: 0 });
    expect(high(stageSpec('follower', dc(1, 5)), [])).toMatchObject({ outcome: 'unknown' });
  });
});
