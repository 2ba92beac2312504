import { describe, expect, it } from 'vitest';
import type { IntegratorSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import { ac, contradictionCodes, dc, midSupply, source, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';
import { closedLoop, size } from './closed-loop.js';

const PARTS: IntegratorSpec = { resistance: value(100e3), capacitance: value(100e-9) };
const WINDOW = { ...PARTS, window: value(20e-3) };
const EXACT: Partial<StageSpec> = { resistors: { tolerance: value(0) }, capacitors: { tolerance: value(0) } };
const spec = (signal = dc(2.5, 3.5), more: Partial<StageSpec> = {}): StageSpec => stageSpec('integrator', signal, { integrator: WINDOW, reference: voltage(2.5), ...EXACT, ...more });
const stage = (...from: Parameters<typeof spec>): Stage => stageOf(spec(...from));
const bleed = (ohms: number): Partial<StageSpec> => ({ resistors: { feedback: value(ohms), tolerance: value(0) } });

describe('integrator with a reset', () => {
  it('goes from the reference to Vref − (vi − Vref)·T/(RC), pins at the reference', () => {
    const one = stage();
    expect(one.output.max).toBe(2.5);
    expect(one.output.min).toBeCloseTo(2.5 - 1 * 2, 12);
    expect(one.outputPeak).toBeCloseTo(1, 12);
    expect(one.outputStep).toBeCloseTo(2, 12);
    expect([one.commonMode, one.gain, one.gainUnit]).toEqual([{ min: 2.5, max: 2.5 }, -100, '1/s']);
    expect([...new Set(one.vertices.map(({ inputs }) => inputs['elapsed']))]).toEqual([0, 20e-3]);
  });

  it('counts the reset also when the input never comes to the reference', () => {
    const one = stage(dc(3, 3.5));
    expect([one.output.min, one.output.max]).toEqual([expect.closeTo(0.5, 12), 2.5]);
    expect(one.outputPeak).toBeCloseTo(1, 12);
  });

  it('reaches farthest with R and C at their low ends', () => {
    const one = stage(dc(2.5, 3), { resistors: { tolerance: value(0.01) }, capacitors: { tolerance: value(0.05) } });
    expect(one.output.min).toBeCloseTo(2.5 - (0.5 * 2) / (0.99 * 0.95), 12);
    expect(one.dcNoiseGain.max).toBeCloseTo(1 + 2 / (0.99 * 0.95), 12);
    expect(one.dcNoiseGain.min).toBeCloseTo(1 + 2 / (1.01 * 1.05), 12);
  });

  it('lets the current of its input through the capacitor into the output, wherever that stands', () => {
    for (const { inputs, networkCurrent } of stage().vertices) expect(networkCurrent).toBeCloseTo(-(inputs['input']! - 2.5) / 100e3, 15);
    expect(stage().peaks[0]).toMatchObject({ centre: expect.closeTo(-5e-6, 12) as number, swing: expect.closeTo(5e-6, 12) as number });
  });

  it('shows Vos(1 + T/RC) and Ib·T/C at its output: 1 V/s for 1 mV, 100 kΩ and 10 nF', () => {
    const one = stage(dc(2.5, 2.5), { integrator: { resistance: value(100e3), capacitance: value(10e-9), window: value(1) } });
    expect(one.dcNoiseGain.nominal * 1e-3).toBeCloseTo(1e-3 + 1, 12);
    expect(one.dcNoiseGain.nominal * one.seriesNegative * 1e-9).toBeCloseTo((1e-9 * 1) / 10e-9, 12);
  });

  it('agrees with the equations of the circuit stepped through the window, offset, bias current and bleed resistor included', () => {
    const [r, c, rb, window, vi, vref] = [100e3, 100e-9, 300e3, 20e-3, 3.1, 2.5];
    const stepped = (vos: number, ib: number): number => {
      const steps = 200_000;
      let held = 0;
      for (let at = 0; at < steps; at += 1) held -= ((vi - vref - vos) / r - ib + held / rb) * (window / steps / c);
      return vref + vos + held;
    };
    const one = stage(dc(vi, vi), bleed(rb));
    expect(one.output.min).toBeCloseTo(stepped(0, 0), 5);
    expect(one.dcNoiseGain.nominal * (3e-3 + 20e-9 * one.seriesNegative)).toBeCloseTo(stepped(3e-3, 20e-9) - stepped(0, 0), 7);
  });

  it('AC-coupled adds up no more than half a period of its lowest frequency', () => {
    const signal = { ...ac(0.5), frequency: { bottom: 100, top: 1e3, text: '' } };
    expect(stage(signal).outputPeak).toBeCloseTo(0.5 / (Math.PI * 100 * 10e-3), 12);
    expect(stage(ac(0.5)).outputPeak).toBeCloseTo(0.5 * 2, 12);
  });
});

describe('integrator that runs on', () => {
  const running = (more: Partial<StageSpec> = {}, bottom = 20): StageSpec => spec({ ...ac(0.5), frequency: { bottom, top: 1e3, text: '' } }, { integrator: PARTS, reference: midSupply(), ...more });

  it('AC-coupled swings A/(2π·f·RC) at its lowest frequency, and says that nothing holds it', () => {
    const one = stageOf(running());
    expect(one.outputPeak).toBeCloseTo(0.5 / (2 * Math.PI * 20 * 10e-3), 12);
    expect(one.cautions).toEqual([expect.stringContaining('no path for direct current')]);
    expect(one.dcNoiseGain.max).toBe(1);
  });

  it('has the DC gain of its bleed resistor, as its network has it', () => {
    const one = stageOf(running(bleed(200e3)));
    expect(one.cautions).toEqual([]);
    expect(one.outputPeak).toBeCloseTo(0.5 * size(closedLoop(one, 20, Infinity)), 12);
    expect(one.seriesNegative).toBe(200e3);
    const direct = stage(dc(2.4, 2.6), { integrator: PARTS, ...bleed(200e3) });
    expect(direct.output).toEqual({ min: expect.closeTo(2.3, 12) as number, max: expect.closeTo(2.7, 12) as number });
    expect([direct.dcNoiseGain.nominal, direct.seriesNegative]).toEqual([3, expect.closeTo(200e3 / 3, 6)]);
  });

  it('is refused where nothing bounds it', () => {
    expect(contradictionCodes(spec(dc(2.5, 3.5), { integrator: PARTS }))).toEqual(['S212']);
    expect(contradictionCodes(spec({ ...ac(0.1, 1e3) }, { integrator: PARTS }))).toEqual(['S212']);
    expect(contradictionCodes(spec({ ...ac(0.1, 1e3), shape: 'sine' }, { integrator: PARTS }))).toEqual([]);
    expect(contradictionCodes({ ...running(), limits: { dcError: value(0.1) } })).toEqual(['S212']);
  });
});

describe('integrator', () => {
  it('adds the source to R', () => {
    expect(stage(dc(2.5, 3), { source: source(25e3) }).output.min).toBeCloseTo(2.5 - 0.5 * (20 / 12.5), 12);
  });

  it('takes signal.output as a cross-check', () => {
    const of = (min: number): string[] => contradictionCodes(spec({ ...dc(2.5, 3.5), output: swing(min, 2.5) }));
    expect([of(0.5), of(0.7)]).toEqual([[], ['S202']]);
  });

  it('offers what it has when the output is beyond the supply', () => {
    expect(() => stage(dc(0, 5))).toThrow('S201');
  });
});
