import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { readStage } from '../../src/spec/read.js';
import { buildStage } from '../../src/stage/index.js';
import { between, contradictionCodes, dc, midSupply, resistors, stageOf, stageSpec, value, voltage } from '../support/stages.js';

// Many cases a test: slow on a busy machine.
vi.setConfig({ testTimeout: 120_000 });

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

/** Problems of a stage file: what reading or building it refuses. */
function problemsOf(lines: readonly string[]): readonly { readonly code: string; readonly fix?: string }[] {
  const read = readStage(lines.join('\n'));
  if (!read.ok) return read.problems;
  const built = buildStage(read.spec);
  return built.ok ? [] : built.problems;
}

/** The file with the lines of a fix in place of its own; null when the fix is a sentence. */
function pasted(lines: readonly string[], fix: string): readonly string[] | null {
  const match = /^write (.*)$/u.exec(fix);
  if (match?.[1] === undefined) return null;
  const wanted = match[1].split(/ and (?=reference:)/u);
  return [...lines.filter((line) => !wanted.some((one) => one.split(':')[0] === line.split(':')[0])), ...wanted];
}

const BEYOND = ['S201', 'S204'];
const beyond = (lines: readonly string[]) => problemsOf(lines).find(({ code }) => BEYOND.includes(code));

describe('the fix of an output beyond the supply', () => {
  it('takes the contradiction away when it is pasted, for any stage', () => {
    let offered = 0;
    const levels = fc.integer({ min: -500, max: 2000 });
    fc.assert(
      fc.property(fc.constantFrom('inverting', 'non-inverting'), fc.integer({ min: 2, max: 30 }), levels, levels, fc.constantFrom('', 'mid-supply', '0.4 V', '6 V', '{value: 4 V, tolerance: 2 %, resistance: 1 kΩ}'), (topology, gain, a, b, reference) => {
        fc.pre(a !== b);
        const input = `${Math.min(a, b)} mV..${Math.max(a, b)} mV`;
        const lines = [`topology: ${topology}`, 'supply: 5 V', `gain: ${topology === 'inverting' ? '-' : ''}${gain}`, `signal: {input: ${input}}`, ...(reference === '' ? [] : [`reference: ${reference}`])];
        const found = beyond(lines);
        const fixed = found === undefined ? null : pasted(lines, found.fix ?? '');
        if (fixed === null) return;
        offered += 1;
        expect(problemsOf(fixed).map(({ code }) => code), fixed.join('\n')).toEqual([]);
      }),
      { seed: 7, numRuns: 300 },
    );
    expect(offered).toBeGreaterThan(100);
  });

  it('is the reference that centres the output where mid-supply would not do', () => {
    expect(beyond(['topology: inverting', 'supply: 5 V', 'gain: -2', 'signal: {input: 0.1..0.8 V}'])?.fix).toBe('write reference: 1.13 V');
  });

  it('is a sentence where neither reference nor gain does it', () => {
    expect(beyond(['topology: non-inverting', 'supply: 5 V', 'gain: 10', 'signal: {input: -0.1..0.3 V}'])?.fix).toMatch(/^no reference within the supply and no lower gain/u);
  });

  it('comes with the reference that no supply gives named as such', () => {
    const lines = ['topology: inverting', 'supply: 5 V', 'gain: -2', 'reference: 6 V', 'signal: {input: 1..7 V}'];
    expect(problemsOf(lines).map(({ code }) => code)).toEqual(['S201', 'S207']);
    expect(problemsOf(['temperature: -300..400 °C', ...lines]).map(({ code }) => code)).toContain('S207');
  });
});
