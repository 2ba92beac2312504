import { describe, expect, it } from 'vitest';
import { knownOf } from '../../src/checks/check.js';
import { rowOf } from '../../src/checks/in-numbers.js';
import { marginAt } from '../../src/checks/phase-margin-loop.js';
import { isInputAssumed, loopOf, marginFinding, MARGIN_NUMBERS } from '../../src/checks/phase-margin-numbers.js';
import { phaseMargin } from '../../src/checks/phase-margin.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { NumberFinding } from '../../src/verdicts/finding.js';
import { min, typ, under } from '../support/parts.js';
import { dc, demandsOf, load, resistors, stageSpec, value } from '../support/stages.js';

const asked = demandsOf(stageSpec('non-inverting', dc(0.1, 0.5, 2e3), { resistors: resistors(70e3, 10e3), load: load(10e3, 'ground', 1e-9), limits: { phaseMargin: value(45) } }))['phase-margin']!;

function found(figures: readonly Figure[]): NumberFinding | null {
  const known = knownOf(phaseMargin.terms, { asked, readings: { ...readingsOf(under(figures)), brief: true } });
  return MARGIN_NUMBERS.finding(asked, rowOf(MARGIN_NUMBERS, asked, known)) as NumberFinding | null;
}

const ALL = [min('gainBandwidth', 1e6), typ('phaseMargin', 60), typ('unityCrossover', 1e6), typ('inputCapacitance', 5e-12), typ('outputResistance', 200)];
const without = (parameter: string): Figure[] => ALL.filter((one) => one.parameter !== parameter);

describe('a phase margin in numbers', () => {
  it('is that of the loop at its largest gain bandwidth, the second pole at fu tan PM', () => {
    const most = found(ALL);
    const loop = loopOf(asked, { ownPole: 1e6 * Math.tan(Math.PI / 3), inputCapacitance: 5e-12, outputResistance: 200 });
    const { most: fastest } = readingsOf(under(ALL)).spread('gainBandwidth')!.ends!;
    expect(most?.offered).toBeCloseTo(marginAt(loop, fastest), 9);
  });

  it('is not told without a gain bandwidth, nor without the resistance its load stands behind', () => {
    expect([found(without('gainBandwidth')), found(without('outputResistance'))]).toEqual([null, null]);
    expect(found(without('inputCapacitance'))).not.toBeNull();
  });

  it('of an input that is not known is assumed only where the most an input has would take the margin', () => {
    const easy = { loop: loopOf(asked, { ownPole: Infinity, inputCapacitance: 0, outputResistance: 0 }), ends: { least: 1e5, most: 1e5 } };
    const hard = { ...easy, ends: { least: 1e7, most: 1e7 } };
    expect([isInputAssumed({ ...easy, required: 45 }), isInputAssumed({ ...hard, required: 45 })]).toEqual([false, true]);
    const numbers = { weakness: 0, needsInput: true, inputWeakness: NaN };
    expect([marginFinding(asked, { ...easy, ...numbers }, 80).basis, marginFinding(asked, { ...hard, ...numbers }, 80).basis]).toEqual(['guaranteed', 'assumed']);
    expect(marginFinding(asked, { ...hard, ...numbers, inputWeakness: 1 }, 80).basis).toBe('derated');
  });
});
