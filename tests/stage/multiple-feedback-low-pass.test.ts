import { describe, expect, it } from 'vitest';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import type { FilterSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import type { LowPassResponse } from '../../src/stage/response.js';
import { ac, contradictionCodes, dc, midSupply, source, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';
import { closedLoop, size } from './closed-loop.js';

const PARTS: FilterSpec = { r1: value(10e3), r2: value(20e3), r3: value(5e3), c1: value(10e-9), c2: value(1e-9) };
const EXACT: Partial<StageSpec> = { resistors: { tolerance: value(0) }, capacitors: { tolerance: value(0) } };
const stage = (signal = dc(1, 2), more: Partial<StageSpec> = {}): Stage => stageOf(stageSpec('multiple-feedback-low-pass', signal, { filter: PARTS, reference: voltage(1.5), ...EXACT, ...more }));
const responseOf = (of: Stage): LowPassResponse => of.response as LowPassResponse;
const parallel = (a: number, b: number): number => (a * b) / (a + b);

describe('multiple-feedback low-pass', () => {
  it('gives Vref(1+|H0|) − |H0|·vi with both pins at the reference', () => {
    const one = stage();
    expect(one.output).toEqual({ min: 1.5 * 3 - 2 * 2, max: 1.5 * 3 - 2 * 1 });
    expect(one.commonMode).toEqual({ min: 1.5, max: 1.5 });
    expect([one.gain, one.noiseGain.nominal, one.dcNoiseGain.nominal]).toEqual([-2, 3, 3]);
    for (const at of one.vertices) expect(at.networkCurrent).toBeCloseTo((at.output - 1.5) / 20e3, 15);
  });

  it('has Rp = reference.resistance and Rn = r3 + r1||r2, the source in r1', () => {
    const one = stage(dc(1, 2), { reference: { ...voltage(1.5), resistance: value(6e3) }, source: source(1e3) });
    expect(one.seriesPositive).toBe(6e3);
    expect(one.seriesNegative).toBeCloseTo(5e3 + parallel(20e3, 11e3), 8);
    expect(one.gain).toBeCloseTo(-20 / 11, 12);
    expect(one.assumptions).toContainEqual(expect.stringMatching(/^gain -1\.818 V\/V with the series resistance/u));
  });

  it('AC-coupled idles at the reference: DC noise gain 1, Rn = r3 + r2', () => {
    const one = stage({ ...ac(0.5) }, { reference: midSupply() });
    expect(one.output).toEqual({ min: 1.5, max: 3.5 });
    expect([one.dcNoiseGain.max, one.noiseGain.nominal, one.seriesNegative]).toEqual([1, 3, 25e3]);
  });

  it('peaks at the output only: the pins rest', () => {
    const one = stage({ ...ac(0.5, 4e3) }, { reference: midSupply(), filter: { corner: value(5e3), q: value(1) }, gain: value(2) });
    const { growth, q, corner } = responseOf(one);
    expect(growth).toBeCloseTo(q / Math.sqrt(1 - 1 / (4 * q * q)), 9);
    expect(corner * Math.sqrt(1 - 1 / (2 * q * q))).toBeLessThan(4e3);
    expect(one.outputPeak).toBeCloseTo(0.5 * Math.abs(one.gain) * growth, 9);
    expect(one.commonMode).toEqual({ min: 2.5, max: 2.5 });
  });

  it.each([0, 1e3])('has networks that give its own cubic: source %f Ω', (ohms) => {
    const one = stage(dc(1, 2), { source: source(ohms) });
    for (const gbw of [100e3, 1e6, Infinity]) {
      for (const f of [10, 2e3, 5e3, 60e3]) expect(size(closedLoop(one, f, gbw)) / magnitudeAt(responseOf(one).responseAt(gbw), f)).toBeCloseTo(1, 9);
    }
  });

  it('takes its gain from the components as written; one written beside must agree', () => {
    expect(stage(dc(1, 2), { gain: value(2) }).gain).toBe(-2);
    expect(contradictionCodes(stageSpec('multiple-feedback-low-pass', dc(1, 2), { filter: PARTS, reference: voltage(1.5), gain: value(2.1) }))).toEqual(['S203']);
    expect(contradictionCodes(stageSpec('multiple-feedback-low-pass', dc(1, 2), { filter: {}, reference: voltage(1.5) }))).toEqual(['S211']);
  });

  it('solves gain and reference from signal.output and prints what it chose', () => {
    const one = stageOf(stageSpec('multiple-feedback-low-pass', { ...dc(0, 1, 100), output: swing(1, 3) }, { filter: { corner: value(1e3), q: value(0.707) } }));
    expect(one.gain).toBeCloseTo(-2, 2);
    expect(one.vertices[0]?.reference).toBeCloseTo((2 + 2 * 0.5) / 3, 9);
    expect(one.assumptions.filter((line) => line.startsWith('filter components chosen'))).toHaveLength(1);
  });
});
