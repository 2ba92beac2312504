import { describe, expect, it } from 'vitest';
import { commonModeTerm, isNothing, supplyMultiplier, wholeBiasTerm, type ErrorTerm } from '../../src/checks/dc-error-terms.js';
import type { DcErrorDemand } from '../../src/demands/index.js';
import { offsetReading } from '../../src/parts/offset.js';
import { readingsOf } from '../../src/parts/readings.js';
import { max, under } from '../support/parts.js';

const ASKED: DcErrorDemand = {
  check: 'dc-error', required: 1, unit: 'V', sense: 'at-most', because: '', source: '', noiseGain: 2, kelvin: 0, positive: 1e3, negative: 3e3, tolerance: 0.01,
  commonModeMove: 0, outputMove: 0, sourceSpread: 0, supply: { min: 5, nominal: 5, max: 5 }, temperature: 25, hottest: 25,
};

describe('a rejection', () => {
  const term = (commonModeMove: number): ErrorTerm => commonModeTerm({ ...ASKED, commonModeMove }, readingsOf(under([])));

  it('of a move that is only rounding is nothing to charge', () => {
    expect(term(0)).toEqual({ kind: 'nothing' });
    expect(term(4e-16)).toEqual({ kind: 'nothing' });
    expect(term(1e-9).kind).toBe('missing');
  });

  it('missing tells at which value it would turn: NG × move / what is left', () => {
    const one = term(3);
    expect(one.kind === 'missing' ? one.turnsAt(1e-3) : null).toEqual({ figure: 'commonModeRejection', kind: 'min', value: (2 * 3) / 1e-3, unit: 'V/V' });
  });
});

describe('a supply', () => {
  const at = { ...ASKED, supply: { min: 4.5, nominal: 5, max: 5.5 } };

  it('moves away from where the offset is rated, else from its nominal', () => {
    const rated = (supply: number) => offsetReading(under([max('offsetVoltage', 1e-3, { supply })]));
    expect(supplyMultiplier(at, null)).toBeCloseTo(2 * 0.5, 12);
    expect(supplyMultiplier(at, rated(3.3))).toBeCloseTo(2 * 2.2, 12);
  });

  it('that does not move needs no rejection', () => {
    expect(isNothing(supplyMultiplier(ASKED, null))).toBe(true);
    expect(isNothing(1e-9)).toBe(false);
  });
});

it('the whole bias current says why it stands for both', () => {
  const bias = readingsOf(under([max('biasCurrent', 10e-9)])).figure('biasCurrent')!;
  const one = wholeBiasTerm(ASKED, bias, 80e-6);
  expect(one.kind === 'value' ? [one.term.name, one.term.value, one.term.how] : null).toEqual(['bias and offset current', 80e-6, 'offset current not known, through 4 kΩ, × noise gain 2']);
});
