import { describe, expect, it } from 'vitest';
import type { OscillatorSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import type { OscillatorResponse } from '../../src/stage/response.js';
import { between, contradictionCodes, load, stageOf, stageSpec, swing, value } from '../support/stages.js';

const spec = (oscillator: Partial<OscillatorSpec> = {}, more: Partial<StageSpec> = {}): StageSpec =>
  stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, { oscillator: { frequency: value(1e3), ...oscillator }, ...more });
const stage = (...from: Parameters<typeof spec>): Stage => stageOf(spec(...from));
const responseOf = (of: Stage): OscillatorResponse => of.response as OscillatorResponse;
const EXACT: Partial<StageSpec> = { resistors: { tolerance: value(0) }, capacitors: { tolerance: value(0) } };

describe('relaxation oscillator', () => {
  it('chooses timing components that give 1/(2·RC·ln 2)', () => {
    const { timeConstant, toSupply, toGround, toOutput } = responseOf(stage());
    expect(Math.abs(1 / (2 * timeConstant * Math.LN2) / 1e3 - 1)).toBeLessThan(0.002);
    expect([toSupply, toGround, toOutput]).toEqual([100e3, 100e3, 100e3]);
  });

  it('has inputs between the thresholds of an output that reaches both rails, a third and two thirds', () => {
    const { commonMode } = stage({}, { supply: between(4, 5), ...EXACT });
    expect([commonMode.min, commonMode.max]).toEqual([expect.closeTo(4 / 3, 12), expect.closeTo(10 / 3, 12)]);
  });

  it('widens them by the threshold resistors', () => {
    const { commonMode } = stage({}, { resistors: { tolerance: value(0.1) } });
    expect(commonMode.min).toBeCloseTo((5 / 1.1) / (1 / 1.1 + 2 / 0.9), 12);
    expect(commonMode.max).toBeCloseTo((5 * (2 / 0.9)) / (1 / 1.1 + 2 / 0.9), 12);
  });

  it('asks the output for the levels of the logic it drives, CMOS unless said', () => {
    expect(stage().output).toEqual({ min: expect.closeTo(1.5, 12) as number, max: expect.closeTo(3.5, 12) as number });
    const one = stage({}, { drives: { threshold: swing(0.2, 0.8), maxEdge: value(1e-6) } });
    expect(one.output).toEqual({ min: expect.closeTo(1, 12) as number, max: expect.closeTo(4, 12) as number });
    expect(responseOf(one).drives).toEqual({ low: 0.2, high: 0.8, maxEdge: 1e-6 });
    expect(responseOf(stage()).drives).toBeNull();
  });

  it('steps the whole highest supply, within 5 % of the half period unless said', () => {
    const one = stage({}, { supply: between(3, 4.2) });
    expect(one.outputStep).toBeCloseTo(4.2, 12);
    expect(responseOf(one).edge).toBeCloseTo(25e-6, 15);
    expect(responseOf(stage({ edge: value(0.02) })).edge).toBeCloseTo(10e-6, 15);
  });

  it('feeds threshold and timing resistor, the capacitor still at the threshold it comes from', () => {
    const one = stage({ frequency: value(1 / (2 * 500e-6 * Math.log(3))), resistance: value(500e3), capacitance: value(1e-9), toOutput: value(50e3) }, EXACT);
    const high = one.vertices.find(({ inputs }) => inputs['level'] === 1)!;
    // + input at 3.5 V out: (5/100k + 3.5/50k)/(1/100k + 1/100k + 1/50k); capacitor at 5·(1/100k)/(4/100k).
    const pin = (5 / 100e3 + 3.5 / 50e3) / (4 / 100e3);
    expect(high.networkCurrent).toBeCloseTo((3.5 - pin) / 50e3 + (3.5 - 1.25) / 500e3, 15);
    const low = one.vertices.find(({ inputs }) => inputs['level'] === 0)!;
    expect(low.networkCurrent).toBeCloseTo(-high.networkCurrent, 15);
    expect(one.networkConductance).toBeCloseTo(0.5 / 50e3 + 1 / 500e3, 15);
  });

  it('charges its load capacitance by the slope of its edge', () => {
    const one = stage({}, { load: load(1e9, 'ground', 1e-9) });
    expect(one.peaks[0]!.swing).toBeGreaterThan((0.8 * 5 * 1e-9) / 25e-6 - 20e-6);
    expect(stage({}, { load: { to: 'ground', capacitance: value(1e-6) } }).peaks[0]!.swing).toBeCloseTo((0.8 * 5 * 1e-6) / 25e-6, 4);
  });

  it('has a spread of what its tolerances can do to the frequency', () => {
    expect(responseOf(stage({}, EXACT)).spread).toBe(0);
    const spread = responseOf(stage({}, { resistors: { tolerance: value(0) }, capacitors: { tolerance: value(0.05) } })).spread;
    expect(spread).toBeCloseTo(1 / 0.95 - 1, 12);
    expect(responseOf(stage()).spread).toBeGreaterThan(1 / (0.95 * 0.99) - 1);
  });

  it('refuses components that do not give the frequency, and frequencies that no components give', () => {
    const codes = (oscillator: Partial<OscillatorSpec>): string[] => contradictionCodes(spec(oscillator));
    expect(codes({ resistance: value(330e3), capacitance: value(2.2e-9) })).toEqual([]);
    expect(codes({ resistance: value(330e3), capacitance: value(1.8e-9) })).toEqual(['S210']);
    expect(codes({ frequency: value(50e6) })).toEqual(['S210']);
    expect(() => stage({ resistance: value(330e3), capacitance: value(1.8e-9) })).toThrow(/give 1\.214 kHz/u);
  });

  it('has no gain, no networks of a linear amplifier and no assumption about its signal', () => {
    const one = stage();
    expect([one.gain, one.gainUnit, one.network, one.resistors]).toEqual([0, null, null, null]);
    expect(one.assumptions.filter((line) => /signal|reference|source|stability|gain error/u.test(line))).toEqual([]);
    expect(one.assumptions).toEqual(expect.arrayContaining(['capacitor tolerance 5 %', 'logic levels 0.3 and 0.7 of the supply: CMOS logic, common practice']));
  });
});
