import { describe, expect, it } from 'vitest';
import type { ShuntSpec, StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import { contradictionCodes, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const SIGNAL = { coupling: 'dc', shape: 'band-limited' } as const;
const shunt = (more: Partial<ShuntSpec> = {}): ShuntSpec => ({ resistance: value(10e-3), current: swing(0, 5), ...more });
const stage = (more: Partial<StageSpec> = {}): Stage => stageOf(stageSpec('low-side-sense', SIGNAL, { shunt: shunt(), resistors: resistors(490e3, 10e3, 0), ...more }));

describe('low-side sense', () => {
  it('gives G·I·Rsh, its pins at I·Rsh about ground', () => {
    const one = stage();
    expect(one.output).toEqual({ min: 0, max: expect.closeTo(50 * 0.05, 12) as number });
    expect(one.commonMode).toEqual({ min: 0, max: expect.closeTo(0.05, 15) as number });
    expect([one.gain, one.noiseGain.nominal]).toEqual([50, 50]);
    for (const at of one.vertices) expect(at.networkCurrent).toBeCloseTo(at.output / 500e3, 15);
  });

  it('shifts by its reference: Vref + G(I·Rsh − Vref), the reference resistance in the gain leg', () => {
    const one = stage({ shunt: shunt({ current: swing(10, 20) }), resistors: resistors(40e3, 9e3, 0), reference: voltage(0.1, 0, 1e3) });
    expect(one.output.min).toBeCloseTo(0.1 + 5 * (0.1 - 0.1), 12);
    expect(one.output.max).toBeCloseTo(0.1 + 5 * (0.2 - 0.1), 12);
  });

  it('has both ends of the shunt among its corners', () => {
    expect(stage({ shunt: shunt({ tolerance: value(0.01) }) }).output.max).toBeCloseTo(50 * 0.05 * 1.01, 12);
    expect(stage({ shunt: shunt({ tolerance: value(0.01) }) }).outputPeak).toBeCloseTo(25 * 0.05 * 1.01, 12);
  });

  it('sees the shunt and a source in series with its + input', () => {
    expect(stage({ source: { resistance: value(100) } }).seriesPositive).toBeCloseTo(100.01, 9);
  });

  it('solves its gain from signal.output', () => {
    const one = stageOf(stageSpec('low-side-sense', { ...SIGNAL, output: swing(0, 2) }, { shunt: shunt() }));
    expect(one.gain).toBeCloseTo(40, 0);
    expect(one.assumptions).toContain('gain 40 V/V solved from signal.output');
  });

  it('names currents below ground with no reference as such', () => {
    expect(contradictionCodes(stageSpec('low-side-sense', SIGNAL, { shunt: shunt({ current: swing(-1, 5) }), gain: value(50) }))).toEqual(['S204']);
  });
});
