import { describe, expect, it } from 'vitest';
import type { ShuntSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import { between, exactly, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const SIGNAL = { coupling: 'dc', shape: 'band-limited' } as const;
const shunt = (more: Partial<ShuntSpec> = {}): ShuntSpec => ({ resistance: value(10e-3), current: swing(0, 5), bus: exactly(12), ...more });
const stage = (more: Partial<StageSpec> = {}): Stage => stageOf(stageSpec('high-side-sense', SIGNAL, { shunt: shunt(), resistors: resistors(100e3, 10e3, 0), ...more }));

describe('high-side sense', () => {
  it('gives Vref + G·I·Rsh, its pins at (G·Vbus + Vref)/(1+G): 10.909 V from 12 V at a gain of 10', () => {
    const one = stage({ reference: voltage(0.5) });
    expect(one.output).toEqual({ min: expect.closeTo(0.5, 9) as number, max: expect.closeTo(0.5 + 10 * 0.05, 9) as number });
    expect(stage().commonMode.max).toBeCloseTo(120 / 11, 12);
    expect([one.gain, one.noiseGain.nominal]).toEqual([10, 11]);
  });

  it('lets a bus of 17.5 V stand at 3.5 V on the pins with a gain of 0.25', () => {
    const one = stage({ shunt: shunt({ bus: exactly(17.5) }), resistors: resistors(10e3, 40e3, 0) });
    expect(one.commonMode.max).toBeCloseTo(3.5, 12);
  });

  it('takes every combination of current and bus', () => {
    const one = stage({ shunt: shunt({ bus: between(10, 14), tolerance: value(0.01) }) });
    expect(new Set(one.vertices.map(({ inputs }) => `${inputs['current']} ${inputs['bus']}`)).size).toBe(4);
    expect(one.commonMode).toEqual({ min: expect.closeTo(100 / 11, 9) as number, max: expect.closeTo(140 / 11, 9) as number });
    expect(one.output.max).toBeCloseTo(10 * 0.05 * 1.01, 9);
  });

  it('is left (1+G)/(4t) of rejection by its resistors: 68.8 dB at a gain of 10 and 0.1 %', () => {
    expect(20 * Math.log10(stage({ resistors: resistors(100e3, 10e3, 0.001), reference: voltage(1) }).resistorRejection!)).toBeCloseTo(68.78665387661, 2);
  });

  it('solves gain and reference from signal.output', () => {
    const one = stageOf(stageSpec('high-side-sense', { ...SIGNAL, output: swing(0.5, 2.5) }, { shunt: shunt() }));
    expect(one.gain).toBeCloseTo(40, 1);
    expect(one.vertices[0]?.reference).toBeCloseTo(0.5, 9);
  });
});
