import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import type { Stage } from '../../src/stage/index.js';
import { between, dc, fourResistors, legs, resistors, source, stageOf, stageSpec, swing, voltage, midSupply, value, ac } from '../support/stages.js';

// Many cases a test: slow on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

/** Every component by itself, as a stage built on the bench would have it. Ohm and volts. */
interface Bench {
  readonly r1: number;
  readonly r2: number;
  readonly r3: number;
  readonly r4: number;
  /** Resistance of the source in the leg to the - input, and in the one to the + input: two resistors. */
  readonly rs: number;
  readonly rp: number;
  readonly reference: number;
  readonly a: number;
  readonly b: number;
}

/** Output and common mode from the node equations, written without any ratio: r1 input, r2 feedback, r3 and r4 of the + leg. */
const SOLVED: Record<'follower' | 'non-inverting' | 'inverting' | 'difference', (at: Bench) => { output: number; pins: number }> = {
  follower: ({ a }) => ({ output: a, pins: a }),
  'non-inverting': ({ r1, r2, reference, a }) => ({ output: a + (r2 * (a - reference)) / (r1 + REFERENCE_OHMS), pins: a }),
  inverting: ({ r1, r2, rs, reference, a }) => ({ output: reference + (r2 * (reference - a)) / (r1 + rs), pins: reference }),
  difference: ({ r1, r2, r3, r4, rs, rp, reference, a, b }) => {
    const top = 1 / (r3 + rp);
    const bottom = 1 / (r4 + REFERENCE_OHMS);
    const pins = (a * top + reference * bottom) / (top + bottom);
    return { output: pins + (r2 * (pins - b)) / (r1 + rs), pins };
  },
};

const REFERENCE_OHMS = 500;
const SOURCE_TOLERANCE = 0.1;

interface Case {
  readonly topology: keyof typeof SOLVED;
  readonly tolerance: number;
  readonly nominal: Omit<Bench, 'rp'>;
  readonly referenceTolerance: number;
  readonly width: number;
}

const cases: fc.Arbitrary<Case> = fc.record({
  topology: fc.constantFrom<keyof typeof SOLVED>('follower', 'non-inverting', 'inverting', 'difference'),
  tolerance: fc.double({ min: 0, max: 0.05, noNaN: true }),
  referenceTolerance: fc.double({ min: 0, max: 0.05, noNaN: true }),
  width: fc.double({ min: 0.001, max: 0.2, noNaN: true }),
  nominal: fc.record({
    r1: fc.double({ min: 5e3, max: 20e3, noNaN: true }), r2: fc.double({ min: 5e3, max: 40e3, noNaN: true }),
    r3: fc.double({ min: 5e3, max: 20e3, noNaN: true }), r4: fc.double({ min: 5e3, max: 40e3, noNaN: true }),
    rs: fc.double({ min: 0, max: 2e3, noNaN: true }), reference: fc.double({ min: 19, max: 21, noNaN: true }),
    a: fc.double({ min: 19.8, max: 20.2, noNaN: true }), b: fc.double({ min: 19.8, max: 20.2, noNaN: true }),
  }),
});

/** On 40 V about 20 V: with a gain up to 8 the nominal output, 9 V..32 V at most, is never a contradiction. */
function specOf({ topology, tolerance, nominal, referenceTolerance, width }: Case): StageSpec {
  const { r1, r2, r3, r4, a, b } = nominal;
  return stageSpec(topology, topology === 'difference' ? legs(swing(a, a + width), swing(b, b + width)) : dc(a, a + width), {
    supply: between(38, 42),
    reference: voltage(nominal.reference, referenceTolerance, REFERENCE_OHMS),
    source: source(nominal.rs, SOURCE_TOLERANCE),
    ...(topology === 'follower' ? {} : { resistors: topology === 'difference' ? fourResistors({ r1, r2, r3, r4 }, tolerance) : resistors(r2, r1, tolerance) }),
  });
}

const NAMES = ['r1', 'r2', 'r3', 'r4', 'rs', 'rp', 'reference', 'a', 'b'] as const;

/** The bench with each component moved by itself: −1 and 1 are the ends of its box. */
function benchAt({ nominal: typed, tolerance, referenceTolerance, width }: Case, where: readonly number[]): Bench {
  const nominal = { ...typed, rp: typed.rs };
  const half = { r1: tolerance, r2: tolerance, r3: tolerance, r4: tolerance, rs: SOURCE_TOLERANCE, rp: SOURCE_TOLERANCE, reference: referenceTolerance };
  const moved = NAMES.map((name, at) => {
    const by = where[at] ?? 0;
    return [name, name === 'a' || name === 'b' ? nominal[name] + ((by + 1) / 2) * width : nominal[name] * (1 + by * half[name])];
  });
  return Object.fromEntries(moved) as Bench;
}

/**
 * Two ways to the same figure differ by rounding alone: a dozen operations, each off by half an ulp of voltages that the gain
 * carries to less than 64 times the largest one.
 */
const rounding = (volts: number): number => 64 * Number.EPSILON * Math.max(LARGEST_INPUT, Math.abs(volts));
const LARGEST_INPUT = 22;
const SETTINGS = { seed: 41, numRuns: 60 };
const ALL_CORNERS = Array.from({ length: 2 ** NAMES.length }, (_, index) => NAMES.map((_name, bit) => ((index >> bit) & 1 ? 1 : -1)));

describe('extremes of output and common mode', () => {
  it('are never exceeded by any stage inside all tolerance boxes', () => {
    const inside = fc.array(fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: NAMES.length, maxLength: NAMES.length }), { minLength: 20, maxLength: 20 });
    fc.assert(
      fc.property(cases, inside, (one, places) => {
        const stage = stageOf(specOf(one));
        for (const place of places) {
          const { output, pins } = SOLVED[one.topology](benchAt(one, place));
          expect(output >= stage.output.min - rounding(output) && output <= stage.output.max + rounding(output), `output ${output}`).toBe(true);
          expect(pins >= stage.commonMode.min - rounding(pins) && pins <= stage.commonMode.max + rounding(pins), `pins ${pins}`).toBe(true);
        }
      }),
      SETTINGS,
    );
  });

  it('are attained at the corners of every single component', () => {
    fc.assert(
      fc.property(cases, (one) => {
        const stage = stageOf(specOf(one));
        const solved = ALL_CORNERS.map((corner) => SOLVED[one.topology](benchAt(one, corner)));
        const ends = (values: readonly number[]): { min: number; max: number } => ({ min: Math.min(...values), max: Math.max(...values) });
        expectClose(stage.output, ends(solved.map(({ output }) => output)));
        expectClose(stage.commonMode, ends(solved.map(({ pins }) => pins)));
      }),
      SETTINGS,
    );
  });
});

function expectClose(actual: Stage['output'], expected: Stage['output']): void {
  expect(Math.abs(actual.min - expected.min), `lowest ${actual.min}, ${expected.min}`).toBeLessThanOrEqual(rounding(expected.min));
  expect(Math.abs(actual.max - expected.max), `highest ${actual.max}, ${expected.max}`).toBeLessThanOrEqual(rounding(expected.max));
}

describe('a built stage', () => {
  it('has the largest half span at one corner as its peak: gain at its upper tolerance', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3) }));
    expect(stage.outputPeak).toBeCloseTo(0.1 * (1 + (7 * 1.01) / 0.99), 12);
  });

  it('has the middle of a supply range as nominal, or what the tolerance stands about', () => {
    const nominal = { min: 4.5, nominal: 5, max: 5.25, text: '5 V +5/-10 %' };
    expect(stageOf(stageSpec('follower', dc(1, 2), { supply: nominal })).supply.nominal).toBe(5);
    expect(stageOf(stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) })).supply.nominal).toBeCloseTo(3.6, 12);
  });

  it('takes the top of the supply as peak, 25 °C and no load unless given', () => {
    const stage = stageOf(stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) }));
    expect([stage.supplyPeak, stage.temperature, stage.load, stage.frequency]).toEqual([4.2, { min: 25, nominal: 25, max: 25 }, null, null]);
    expect(stageOf(stageSpec('follower', dc(1, 2), { supplyPeak: value(7) })).supplyPeak).toBe(7);
  });

  it('has its nominal output at nominal supply, reference and resistors', () => {
    const stage = stageOf(stageSpec('inverting', ac(0.5), { supply: between(4, 6), resistors: resistors(20e3, 10e3), reference: midSupply(0.01) }));
    expect(stage.outputNominal).toEqual({ min: 1.5, max: 3.5 });
  });

  it('refuses a stage without gain', () => {
    expect(() => stageOf(stageSpec('inverting', dc(0, 1)))).toThrow('S208 the gain of the inverting stage is not given');
  });
});
