import { describe, expect, it } from 'vitest';
import { knownOf } from '../../src/checks/check.js';
import { LOOP_TERMS, loopFigures, type LoopFigures, type OwnPole } from '../../src/checks/phase-margin-figures.js';
import type { PhaseMarginDemand } from '../../src/demands/index.js';
import { readingsOf, type Readings } from '../../src/parts/readings.js';
import type { Figure } from '../../src/parts/figures.js';
import { assumed, max, typ, under } from '../support/parts.js';
import { dc, demandsOf, resistors, stageSpec, value } from '../support/stages.js';

const LIMITS = { phaseMargin: value(60) };
const FOLLOWER = demandsOf(stageSpec('follower', dc(1, 2), { limits: LIMITS }))['phase-margin']!;
const AMPLIFIER = demandsOf(stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3), limits: LIMITS }))['phase-margin']!;
const figuresOf = (asked: PhaseMarginDemand, readings: Readings): LoopFigures => loopFigures(asked, knownOf(LOOP_TERMS, { asked, readings }), readings);
const own = (figures: readonly Figure[], outlook: 'pessimistic' | 'optimistic' = 'pessimistic'): OwnPole => figuresOf(FOLLOWER, readingsOf(under(figures, { outlook }))).own;

describe('the pole of the part itself', () => {
  it('lies at fu·tan PM', () => {
    expect(own([typ('phaseMargin', 60), typ('unityCrossover', 1e6)])).toMatchObject({ hertz: expect.closeTo(1e6 * Math.sqrt(3), 3) as number, basis: 'derated', slot: 'phaseMargin.typ' });
  });

  it('is none from 90° on, and is only assumed to be none where nothing is stated', () => {
    expect(own([typ('phaseMargin', 95), typ('unityCrossover', 1e6)])).toMatchObject({ hertz: Infinity, basis: 'derated' });
    expect(own([typ('unityCrossover', 1e6)])).toMatchObject({ hertz: Infinity, basis: 'assumed' });
  });

  it('is estimated from the printed gain bandwidth without a crossover: f2 = fc·sin²PM/cos PM', () => {
    expect(own([typ('phaseMargin', 60), typ('gainBandwidth', 1e6)])).toMatchObject({ hertz: expect.closeTo(1.5e6, 3) as number, basis: 'estimated' });
    expect(own([typ('phaseMargin', 60)])).toMatchObject({ hertz: Infinity, basis: 'estimated' });
  });

  it('is as good as can be for a margin assumed for a run', () => {
    expect(own([assumed(typ('phaseMargin', 60)), typ('unityCrossover', 1e6)], 'optimistic').hertz).toBe(Infinity);
    expect(own([typ('phaseMargin', 60), assumed(typ('unityCrossover', 1e6))], 'optimistic').hertz).toBe(Infinity);
  });

  it('stays a pole for a part stated with no margin at all', () => {
    expect(own([typ('phaseMargin', 0), typ('unityCrossover', 1e6)]).hertz).toBeCloseTo(1e6 * Math.tan((0.1 * Math.PI) / 180), 3);
  });
});

it('a figure is read only where it counts', () => {
  const loaded = { ...FOLLOWER, load: { ...FOLLOWER.load, capacitance: 1e-9 } };
  const readings = readingsOf(under([typ('inputCapacitance', 5e-12), max('capacitiveLoad', 1e-10)]));
  expect(figuresOf(loaded, readings)).toMatchObject({ needsInput: false, inputCapacitance: null, capacitiveLoad: { value: 1e-10 }, outputResistance: null, speed: null });
  expect(figuresOf(AMPLIFIER, readings)).toMatchObject({ needsInput: true, inputCapacitance: { value: 5e-12 }, capacitiveLoad: null });
  const known = readingsOf(under([typ('outputResistance', 100), max('capacitiveLoad', 1e-10)]));
  expect(figuresOf(loaded, known)).toMatchObject({ capacitiveLoad: null, outputResistance: { printed: 100 } });
});
