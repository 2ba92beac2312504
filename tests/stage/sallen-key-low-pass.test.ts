import { describe, expect, it } from 'vitest';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import type { FilterSpec, StageSpec } from '../../src/spec/spec.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import type { LowPassResponse } from '../../src/stage/response.js';
import { ac, contradictionCodes, dc, load, midSupply, resistors, source, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';
import { closedLoop, size } from './closed-loop.js';

const wanted = (corner: number, q: number): FilterSpec => ({ corner: value(corner), q: value(q) });
/** 1 kHz: R 10 kΩ each, C2 from Q. */
function fitted(q: number): FilterSpec {
  const c = 1 / (2 * Math.PI * 1e3 * 10e3);
  return { r1: value(10e3), r2: value(10e3), c1: value(2 * q * c), c2: value(c / (2 * q)) };
}
const EXACT: Partial<StageSpec> = { resistors: { tolerance: value(0) }, capacitors: { tolerance: value(0) } };
const stage = (signal = dc(1, 2, 1e3), more: Partial<StageSpec> = {}): Stage => stageOf(stageSpec('sallen-key-low-pass', signal, { filter: fitted(Math.SQRT1_2), ...EXACT, ...more }));
const responseOf = (of: Stage): LowPassResponse => of.response as LowPassResponse;

describe('Sallen-Key low-pass', () => {
  it('at a gain of 1 passes its input, pins and all, without gain resistors', () => {
    const one = stage();
    expect([one.output, one.commonMode]).toEqual([{ min: 1, max: 2 }, { min: 1, max: 2 }]);
    expect([one.gain, one.noiseGain.nominal, one.resistors, one.networkConductance]).toEqual([1, 1, null, 0]);
    expect([one.seriesPositive, one.seriesNegative]).toEqual([20e3, 0]);
  });

  it('with K gives Vref + K(vi − Vref), pins at Vref + (vo − Vref)/K', () => {
    const q = 1 / (3 - 2);
    const c = value(1 / (2 * Math.PI * 1e3 * 10e3));
    const filter = { r1: value(10e3), r2: value(10e3), c1: c, c2: c };
    const one = stage(dc(2, 3), { filter, resistors: resistors(30e3, 30e3, 0), reference: voltage(2), source: source(0) });
    expect(one.output).toEqual({ min: 2, max: 4 });
    for (const at of one.vertices) expect(at.commonMode).toBeCloseTo(at.reference + (at.output - at.reference) / 2, 12);
    expect(responseOf(one).q).toBeCloseTo(q, 9);
    expect([one.seriesNegative, one.networkConductance]).toEqual([15e3, 1 / 60e3]);
    for (const at of one.vertices) expect(at.networkCurrent).toBeCloseTo((at.output - 2) / 60e3, 15);
  });

  it('swings by its peak when the band contains it: 2.0656 V from 1 V at Q = 2, pins too', () => {
    const one = stage({ ...ac(1, 1e3) }, { filter: fitted(2), reference: midSupply() });
    expect(one.outputPeak).toBeCloseTo(2.065591117977, 6);
    expect(one.commonMode.max).toBeCloseTo(2.5 + 2.065591117977, 6);
    expect(one.outputNominal.max).toBeCloseTo(2.5 + 2.065591117977, 6);
    expect(responseOf(one).growth).toBeCloseTo(2.065591117977, 6);
    expect(stage({ ...ac(1, 100) }, { filter: fitted(2), reference: midSupply() }).outputPeak).toBeCloseTo(1 / Math.hypot(1 - 0.01, 0.05), 9);
    expect(stage({ ...ac(1) }, { filter: fitted(2), reference: midSupply() }).outputPeak).toBe(1);
  });

  it('swings by the highest peak of all components at the ends of their tolerances', () => {
    const more = { filter: fitted(2), reference: midSupply(), resistors: { tolerance: value(0.01) }, capacitors: { tolerance: value(0.05) } };
    // Q = √(C1/C2)/2 at equal resistors.
    const q = 2 * Math.sqrt(1.05 / 0.95);
    expect(stage({ ...ac(0.5, 2e3) }, more).outputPeak).toBeCloseTo((0.5 * q) / Math.sqrt(1 - 1 / (4 * q * q)), 6);
  });

  it('idles about its reference when AC-coupled, whatever the gain', () => {
    const c = value(1 / (2 * Math.PI * 1e3 * 10e3));
    const one = stage({ ...ac(0.25) }, { filter: { r1: value(10e3), r2: value(10e3), c1: c, c2: c }, resistors: resistors(30e3, 30e3, 0), reference: midSupply(0, 5e3) });
    expect(one.output).toEqual({ min: 2, max: 3 });
    expect(one.commonMode).toEqual({ min: 2.25, max: 2.75 });
    expect([one.dcNoiseGain.max, one.noiseGain.max, one.seriesPositive, one.seriesNegative]).toEqual([1, 2, 25e3, 30e3]);
  });

  it.each([[1, 0], [1, 1e3], [2, 1e3]])('has networks that give its own cubic: gain %f, source %f Ω', (gain, ohms) => {
    const more = { filter: wanted(1e3, 0.8), gain: value(gain), source: source(ohms), reference: voltage(1) };
    const one = stage(dc(1, 1.2, 1e3), { ...more, ...(gain === 1 ? {} : { resistors: { tolerance: value(0) } }) });
    for (const gbw of [30e3, 1e6, Infinity]) {
      for (const f of [10, 700, 1e3, 5e3, 60e3]) expect(size(closedLoop(one, f, gbw)) / magnitudeAt(responseOf(one).responseAt(gbw), f)).toBeCloseTo(1, 9);
    }
  });

  it('adds the source to R1, also when it chooses the components', () => {
    const written = responseOf(stage(dc(1, 2, 1e3), { source: source(2e3) }));
    expect([written.parts.r1, written.corner]).toEqual([12e3, expect.closeTo(1e3 / Math.sqrt(1.2), 6)]);
    const chosen = responseOf(stage(dc(1, 2, 1e3), { filter: wanted(1e3, 0.707), source: source(2e3) }));
    expect(Math.abs(chosen.corner / 1e3 - 1)).toBeLessThan(0.003);
  });

  it('prints what it chose, and that the stop band comes back', () => {
    const one = stage(dc(1, 2, 500), { filter: wanted(1e3, 0.707) });
    expect(one.assumptions.find((line) => line.startsWith('filter components chosen'))).toMatch(/R1 .* kΩ, R2 .* kΩ, C1 .*F, C2 .*F; they give .*Hz at a Q of 0\.70/u);
    expect(stage().cautions).toEqual([expect.stringContaining('about -40 dB for 100 Ω of output resistance')]);
  });

  it('refuses what is no filter', () => {
    const codes = (more: Partial<StageSpec>): string[] => contradictionCodes(stageSpec('sallen-key-low-pass', dc(0.1, 0.2, 1e3), more));
    expect(codes({ filter: {} })).toEqual(['S211']);
    expect(codes({ filter: wanted(20e6, 1) })).toEqual(['S211']);
    expect(codes({ filter: fitted(1), gain: value(0.5) })).toEqual(['S211']);
    // Equal R and C oscillate at K = 3.
    expect(codes({ filter: fitted(0.5), gain: value(3) })).toEqual(['S211']);
    expect(codes({ filter: fitted(1), resistors: { feedback: value(1e4) } })).toEqual(['S203']);
    expect(codes({ filter: { ...fitted(1), corner: value(1100) } })).toEqual(['S210']);
    expect(codes({ filter: { ...fitted(1), corner: value(1050) } })).toEqual([]);
  });

  it('takes signal.output as what it passes, its peak apart, and solves a gain of 1 without a reference', () => {
    const one = stage({ ...dc(0.5, 1.5, 1e3), output: swing(0.5, 1.5) }, { filter: fitted(1) });
    expect([one.gain, one.vertices[0]?.reference]).toEqual([1, 0]);
    expect(one.output.max).toBeGreaterThan(1.5);
    expect(contradictionCodes(stageSpec('sallen-key-low-pass', { ...dc(0.5, 1.5, 1e3), output: swing(1, 2) }, { filter: fitted(1) }))).toEqual(['S205']);
  });

  it('offers only what it has when the output is beyond the supply', () => {
    const fix = (signal: ReturnType<typeof dc>, more: Partial<StageSpec>): string | undefined => {
      const built = buildStage(stageSpec('sallen-key-low-pass', signal, { filter: wanted(1e3, 0.707), ...more }));
      return built.ok ? undefined : built.problems[0]?.fix;
    };
    expect(fix(dc(1, 6, 100), {})).toBe('keep the signal within 0 V..5 V');
    expect(fix(dc(0.5, 4.9, 2e3), { filter: fitted(3) })).toBe('the swing is larger than the supply: a smaller signal, a lower gain or q, or a larger supply');
    const lower = /^write gain: (\d+(?:\.\d+)?)$/u.exec(fix(dc(0.2, 0.9, 100), { gain: value(8) }) ?? '');
    expect(Number(lower?.[1])).toBeGreaterThan(1);
    const built = buildStage(stageSpec('sallen-key-low-pass', dc(0.2, 0.9, 100), { filter: wanted(1e3, 0.707), gain: value(Number(lower?.[1])) }));
    if (!built.ok) throw new Error('what is offered is a stage');
    // Inside at the corners too, where a gain does that.
    expect(built.stage.output.max).toBeLessThanOrEqual(built.stage.supply.min);
  });
});

describe('output current of a Sallen-Key low-pass', () => {
  const omega = 2 * Math.PI * 1e3;
  const c = 1 / (omega * 10e3);

  it('at a gain of 1 is what C1 carries: Vp/R1 with equal resistors at the corner, growing with the square of the frequency', () => {
    const swing = (frequency: number): number => {
      const one = stage(ac(0.5, frequency), { reference: midSupply() });
      return one.peaks[0]!.swing / one.outputPeak;
    };
    expect(swing(1e3) * 10e3).toBeCloseTo(1, 12);
    expect(swing(2e3) * 10e3).toBeCloseTo(4, 12);
    expect(stage(ac(0.5), { reference: midSupply() }).peaks[0]!.swing).toBe(0);
  });

  it('with a gain is the node voltages\' own answer, beside gain resistors and load capacitance', () => {
    const filter = { r1: value(10e3), r2: value(20e3), c1: value(c), c2: value(c) };
    const one = stage(ac(0.25, 1.5e3), { filter, resistors: resistors(30e3, 30e3, 0), reference: midSupply(), load: load(10e3, 'reference', 10e-9) });
    const w = 1.5 * omega;
    // Of 1 V at the output: the pin at 1/2, the inner node at (1 + jωR2C2)/2.
    const inner = { re: 0.5, im: (w * 20e3 * c) / 2 };
    const current = { re: w * c * inner.im + 1 / 60e3 + 1 / 10e3, im: w * c * (1 - inner.re) + w * 10e-9 };
    expect(one.peaks[0]!.swing / one.outputPeak / Math.hypot(current.re, current.im)).toBeCloseTo(1, 9);
  });
});
