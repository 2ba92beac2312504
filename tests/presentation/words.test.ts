import { describe, expect, it } from 'vitest';
import { CHECKS } from '../../src/checks/index.js';
import { CHECK_IDS } from '../../src/demands/index.js';
import { PARAMETERS, type Parameter } from '../../src/parts/figures.js';
import { CHECK_WORDS, DECIBEL_FIGURES, figureWords, PARAMETER_WORDS, passingSide } from '../../src/presentation/words.js';

describe('words', () => {
  it('every figure has some, and no other', () => { expect(Object.keys(PARAMETER_WORDS)).toEqual(Object.keys(PARAMETERS)); });
  it('every check has some, in the order of the contract', () => { expect(Object.keys(CHECK_WORDS)).toEqual([...CHECK_IDS]); });
  it.each(CHECKS.map((check) => [check.id, check.title] as const))('%s is called as the check calls itself', (id, title) => {
    expect(CHECK_WORDS[id as keyof typeof CHECK_WORDS]).toBe(title);
  });
  it('figures spoken in decibels are those whose cells are ratios', () => {
    expect([...DECIBEL_FIGURES].sort()).toEqual((Object.keys(PARAMETERS) as Parameter[]).filter((name) => PARAMETERS[name].field === 'ratio').sort());
  });
  it.each([
    ['offsetVoltage', 'max', 'less'], ['slewRate', 'min', 'more'], ['supplyVoltage', 'min', 'less'], ['supplyVoltage', 'max', 'more'],
    ['temperature', 'min', 'less'], ['temperature', 'max', 'more'], ['supplyAbsoluteMaximum', 'max', 'more'], ['minimumStableGain', 'max', 'less'],
  ] as const)('%s %s passes when it is %s', (figure, kind, side) => { expect(passingSide(figure, kind)).toBe(side); });
  it('a figure with its limit kind', () => { expect(figureWords('offsetDrift', 'max')).toBe('offset drift maximum'); });
});
