import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { LegSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import { contradictionCodes, midSupply, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const leg = (name: string, ohms: number, min: number, max = min): LegSpec => ({ name, level: { kind: 'signal', swing: swing(min, max) }, resistance: value(ohms) });
const toSupply = (ohms: number): LegSpec => ({ name: 'centre', level: { kind: 'supply' }, resistance: value(ohms) });
const toReference = (ohms: number): LegSpec => ({ name: 'rest', level: { kind: 'reference' }, resistance: value(ohms) });
const SIGNAL = { coupling: 'dc', shape: 'band-limited' } as const;
const stage = (legs: readonly LegSpec[], more: Partial<StageSpec> = {}): Stage =>
  stageOf(stageSpec('summing', SIGNAL, { legs, resistors: { feedback: value(10e3), tolerance: value(0) }, reference: midSupply(), ...more }));
const at = (tolerance: number): Partial<StageSpec> => ({ resistors: { feedback: value(10e3), tolerance: value(tolerance) } });

describe('summing stage', () => {
  it('swings 0.7 V from idle on three legs of ±0.2 V, with a noise gain of 4.5: every leg counts', () => {
    const one = stage([leg('a', 10e3, 2.3, 2.7), leg('b', 20e3, 2.3, 2.7), leg('c', 5e3, 2.3, 2.7)]);
    expect(one.output).toEqual({ min: expect.closeTo(1.8, 12) as number, max: expect.closeTo(3.2, 12) as number });
    expect(one.outputPeak).toBeCloseTo(0.7, 12);
    expect(one.noiseGain.nominal).toBeCloseTo(4.5, 12);
    expect(one.gain).toBe(-1);
  });

  it('counts a leg that rests at ground in noise gain and output', () => {
    const one = stage([leg('a', 20e3, 1, 2), leg('still', 40e3, 0)], { reference: voltage(2) });
    expect(one.noiseGain.nominal).toBeCloseTo(1.75, 12);
    expect(one.output.max).toBeCloseTo(2 * 1.75 - 0.5 * 1, 12);
    expect(one.seriesNegative).toBeCloseTo(1 / (1 / 10e3 + 1 / 20e3 + 1 / 40e3), 8);
  });

  it('lets a leg to the supply move with it and one to the reference do nothing to the output', () => {
    const one = stage([leg('a', 20e3, 2, 3), toSupply(20e3), toReference(10e3)], { supply: { min: 4, nominal: 5, max: 6, text: '' }, reference: voltage(3) });
    expect(one.noiseGain.nominal).toBeCloseTo(3, 12);
    expect(one.output.min).toBeCloseTo(3 + 0.5 * (3 - 3) + 0.5 * (3 - 6), 12);
    expect(one.output.max).toBeCloseTo(3 + 0.5 * (3 - 2) + 0.5 * (3 - 4), 12);
  });

  it('is never exceeded by any resistors inside their tolerances, and attained at their ends', () => {
    const share = fc.double({ min: -1, max: 1, noNaN: true });
    const one = stage([leg('a', 10e3, 2.3, 2.9), leg('b', 20e3, 1.9, 2.4), leg('c', 30e3, 2.6, 3)], at(0.05));
    const output = (f: number, [a, b, c]: readonly number[], high: boolean): number => {
      const rf = 10e3 * (1 + 0.05 * f);
      const term = (ohms: number, by: number, volts: number): number => (rf / (ohms * (1 + 0.05 * by))) * (2.5 - volts);
      return 2.5 + term(10e3, a!, high ? 2.9 : 2.3) + term(20e3, b!, high ? 2.4 : 1.9) + term(30e3, c!, high ? 3 : 2.6);
    };
    fc.assert(fc.property(share, fc.tuple(share, share, share), fc.boolean(), (f, places, high) => {
      const volts = output(f, places, high);
      expect(volts).toBeLessThanOrEqual(one.output.max + 1e-12);
      expect(volts).toBeGreaterThanOrEqual(one.output.min - 1e-12);
    }), { seed: 5 });
    const ends = [-1, 1].flatMap((f) => [-1, 1].flatMap((a) => [-1, 1].flatMap((b) => [-1, 1].flatMap((c) => [true, false].map((high) => output(f, [a, b, c], high))))));
    expect(one.output.max).toBeCloseTo(Math.max(...ends), 12);
    expect(one.output.min).toBeCloseTo(Math.min(...ends), 12);
  });

  it('has its peak with every leg at its low end, also where the signal lies on both sides of the reference', () => {
    expect(stage([leg('a', 10e3, 2, 3)], at(0.05)).outputPeak).toBeCloseTo((0.5 * 1.05) / 0.95, 12);
    expect(stage([leg('a', 10e3, 2, 3), leg('b', 20e3, 2, 3)], at(0.05)).outputPeak).toBeCloseTo((0.75 * 1.05) / 0.95, 12);
  });

  it('AC-coupled idles at the reference, signal legs blocked for direct current and fixed legs not', () => {
    const of = (legs: readonly LegSpec[]): Stage => stageOf(stageSpec('summing', { coupling: 'ac', shape: 'band-limited' }, { legs, ...at(0), reference: midSupply() }));
    const blocked = of([leg('a', 10e3, -0.5, 0.5), leg('b', 20e3, -0.5, 0.5)]);
    expect(blocked.output).toEqual({ min: expect.closeTo(1.75, 12) as number, max: expect.closeTo(3.25, 12) as number });
    expect([blocked.dcNoiseGain.max, blocked.noiseGain.max, blocked.seriesNegative]).toEqual([1, 2.5, 10e3]);
    const fixed = of([leg('a', 10e3, -0.5, 0.5), toSupply(20e3), toReference(10e3)]);
    expect(fixed.output).toEqual({ min: expect.closeTo(2.5 - 1.25 - 0.5, 12) as number, max: expect.closeTo(2.5 - 1.25 + 0.5, 12) as number });
    expect([fixed.dcNoiseGain.nominal, fixed.noiseGain.nominal, fixed.seriesNegative]).toEqual([2.5, 3.5, expect.closeTo(4e3, 8)]);
  });

  it('AC-coupled pulses stand about their average: a free duty takes Vpp on either side, the step stays Vpp', () => {
    const of = (duty?: number): Stage =>
      stageOf(stageSpec('summing', { coupling: 'ac', shape: 'pulse', ...(duty === undefined ? {} : { duty: value(duty) }) }, { legs: [leg('a', 10e3, -0.5, 0.5)], ...at(0), reference: midSupply() }));
    expect(of().output).toEqual({ min: 1.5, max: 3.5 });
    expect(of().outputStep).toBeCloseTo(1, 12);
    expect(of(0.1).output).toEqual({ min: expect.closeTo(1.6, 12) as number, max: expect.closeTo(2.6, 12) as number });
    expect(of(0.1).outputStep).toBeCloseTo(1, 12);
  });

  it('chooses E96 legs from their gains', () => {
    const one = stage([{ name: 'a', level: { kind: 'signal', swing: swing(2, 3) }, gain: value(0.3) }], { resistors: {} });
    expect(one.gain).toBeCloseTo(-100 / 332, 12);
    expect(one.assumptions).toEqual(expect.arrayContaining(['feedback resistor 100 kΩ', 'leg a: 332 kΩ from E96, gain -0.3012 V/V']));
  });

  it('takes signal.output as a cross-check and offers what a summing stage has', () => {
    const spec = stageSpec('summing', { ...SIGNAL, output: swing(1, 2) }, { legs: [leg('a', 10e3, 2, 3)], ...at(0), reference: midSupply() });
    expect(contradictionCodes(spec)).toEqual(['S202']);
    expect(() => stageOf(spec)).toThrow('legs, feedback resistor and reference give 2 V..3 V');
    expect(() => stage([leg('a', 1e3, 0, 3)])).toThrow('S201');
  });

  it('does not speak of a source', () => {
    expect(stage([leg('a', 10e3, 2, 3)]).assumptions.filter((line) => line.includes('source'))).toEqual([]);
  });
});
