import { describe, expect, it } from 'vitest';
import { between, contradictionCodes, dc, midSupply, resistors, stageOf, stageSpec, value, voltage } from '../support/stages.js';

const TIMES_8 = { resistors: resistors(70e3, 10e3) };

describe('contradictions of a stage', () => {
  it('are found in an output beyond the nominal supply; exactly at it is not one', () => {
    expect(contradictionCodes(stageSpec('non-inverting', dc(0.1, 5 / 8), TIMES_8))).toEqual([]);
    expect(contradictionCodes(stageSpec('non-inverting', dc(0.1, 5.001 / 8), TIMES_8))).toEqual(['S201']);
  });

  it('are not found at a worst corner: that fails parts', () => {
    const spec = stageSpec('non-inverting', dc(0.1, 5 / 8), TIMES_8);
    expect(stageOf(spec).output.max).toBeGreaterThan(5);
    // The middle of the supply is nominal: 4.9 V passes on 4.5..5.5 V.
    expect(contradictionCodes(stageSpec('follower', dc(0.1, 4.9), { supply: between(4.5, 5.5) }))).toEqual([]);
  });

  it('are found in an input below ground with no reference', () => {
    expect(contradictionCodes(stageSpec('non-inverting', dc(-0.1, 0.1), TIMES_8))).toEqual(['S204']);
    expect(contradictionCodes(stageSpec('follower', dc(-0.1, 0.1)))).toEqual(['S204']);
  });

  it('leave a negative input of an inverting stage alone: its output is positive', () => {
    expect(contradictionCodes(stageSpec('inverting', dc(-0.5, -0.1), { resistors: resistors(50e3, 10e3) }))).toEqual([]);
  });

  it('are found in a peak below the top of the supply; equal is not one', () => {
    const spec = (peak: number): Parameters<typeof stageOf>[0] => stageSpec('follower', dc(1, 2), { supply: between(3, 4.2), supplyPeak: value(peak) });
    expect(contradictionCodes(spec(4.2))).toEqual([]);
    expect(contradictionCodes(spec(4.19))).toEqual(['S206']);
  });

  it('are told at the field they stand at, citing the others', () => {
    const spec = stageSpec('inverting', dc(0, 1), { resistors: resistors(90e3, 10e3), reference: voltage(1) });
    const positions = { 'signal.input': { line: 4, column: 3 }, reference: { line: 7, column: 1 } };
    expect(contradictionCodes({ ...spec, positions })).toEqual(['S201']);
    expect(() => stageOf({ ...spec, positions })).toThrow('S201 the output is asked to swing 1 V..10 V, above the 5 V supply: no amplifier on this supply does that (see reference in line 7)');
  });

  it('reports all at once', () => {
    expect(contradictionCodes(stageSpec('inverting', dc(0, 5), { ...TIMES_8, reference: midSupply(), supplyPeak: value(4) }))).toEqual(['S201', 'S206']);
  });
});
