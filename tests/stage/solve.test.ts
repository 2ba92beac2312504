import { describe, expect, it } from 'vitest';
import { solvedReference } from '../../src/stage/solve.js';
import { ac, contradictionCodes, coupled, dc, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const output = (signal: ReturnType<typeof dc>, min: number, max: number): ReturnType<typeof dc> => ({ ...signal, output: swing(min, max) });

describe('output instead of gain', () => {
  it('solves gain from the spans and the reference at the centre: non-inverting', () => {
    const stage = stageOf(stageSpec('non-inverting', output(dc(1, 1.5), 1, 3)));
    // Gain 2/0.5 = 4; 2 = 4·1.25 - 3·Vref gives Vref = 1. E96 then rules.
    expect(stage.vertices[0]?.reference).toBeCloseTo(1, 12);
    expect(stage.gain).toBeCloseTo(4, 3);
    expect(stage.assumptions).toContain('gain 4 V/V solved from signal.output');
    expect(stage.assumptions).toContain('reference 1 V solved from signal.output');
  });

  it('inverting: Vref = (vo + G vi)/(1 + G)', () => {
    const stage = stageOf(stageSpec('inverting', output(dc(0, 1), 1, 3)));
    expect(stage.vertices[0]?.reference).toBeCloseTo((2 + 2 * 0.5) / 3, 12);
    expect(stage.gain).toBeCloseTo(-2, 3);
  });

  it('difference: Vref = vo - G(V2 - V1); AC-coupled: the middle of the output', () => {
    const difference = stageOf(stageSpec('difference', { ...coupled(swing(-0.1, 0.1), swing(2, 2)), output: swing(1.5, 3.5) }));
    expect(difference.vertices[0]?.reference).toBeCloseTo(2.5, 12);
    expect(difference.gain).toBeCloseTo(10, 2);
    expect(stageOf(stageSpec('inverting', { ...ac(0.1), output: swing(1, 2) })).vertices[0]?.reference).toBeCloseTo(1.5, 12);
  });

  it('keeps a written reference; resistors give the gain and then only the reference is solved', () => {
    const kept = stageOf(stageSpec('non-inverting', output(dc(0.25, 0.75), 0.5, 1.5), { reference: voltage(0) }));
    expect(kept.gain).toBeCloseTo(2, 3);
    const ruled = stageOf(stageSpec('inverting', output(dc(0, 1), 1, 3), { resistors: resistors(20e3, 10e3) }));
    expect(ruled.assumptions).toContain('reference 1 V solved from signal.output');
    expect(ruled.gain).toBe(-2);
  });

  it('refuses what no gain or no reference inside the supply can do', () => {
    expect(contradictionCodes(stageSpec('non-inverting', output(dc(0, 2), 2, 3)))).toEqual(['S205']);
    expect(contradictionCodes(stageSpec('non-inverting', output(dc(3.65, 4.15), 0.5, 2)))).toEqual(['S205']);
    expect(contradictionCodes(stageSpec('inverting', dc(0, 1)))).toEqual(['S208']);
  });

  it('is a cross-check when the gain is written', () => {
    const spec = (max: number): Parameters<typeof stageOf>[0] => stageSpec('non-inverting', output(dc(0.1, 0.5), 0.4, max), { gain: value(4), resistors: resistors(30e3, 10e3) });
    expect(contradictionCodes(spec(2))).toEqual([]);
    expect(contradictionCodes(spec(2.1))).toEqual(['S202']);
  });
});

describe('a solved reference', () => {
  it('is ground when only rounding is left of it, else an exact voltage', () => {
    expect(solvedReference(1e-12, 5, '0 V').kind).toBe('ground');
    expect(solvedReference(1, 5, '1 V')).toEqual({ kind: 'voltage', value: { min: 1, nominal: 1, max: 1, text: '1 V' } });
  });
});
