import { describe, expect, it } from 'vitest';
import { GLUE } from '../../src/presentation/spelling.js';
import { beyondText, comparisonText, cornerText, shortfall, spareText, turningText, unknownText } from '../../src/presentation/verdict-words.js';
import type { Verdict } from '../../src/verdicts/verdict.js';

const BLANK: Verdict = {
  check: 'dc-error', title: 'DC error', outcome: 'pass', required: 0.02, offered: 0.01, offeredBest: 0.01, unit: 'V', sense: 'at-most', margin: 2, spare: 0.01,
  basis: 'guaranteed', standsOn: 'guaranteed', worstAt: null, terms: [], rss: null, known: null, reason: null, missing: [], decidesAt: null, turnsAt: null,
  cautions: [], slot: null, how: null,
};
const verdict = (more: Partial<Verdict>): Verdict => ({ ...BLANK, ...more });
const plain = (text: string): string => text.replaceAll(GLUE, ' ');

describe('what is left of a passing check', () => {
  it('just below, at, and just above the limit', () => {
    expect(plain(spareText(verdict({ offered: 0.0199, spare: 1e-4, margin: 1.005 })))).toBe('0.5 % spare');
    expect(plain(spareText(verdict({ offered: 0.02, spare: 0, margin: 1 })))).toBe('met exactly');
    expect(plain(shortfall(verdict({ outcome: 'fail', offered: 0.0201, spare: -1e-4 })))).toBe('over by 100 µV (0.5 %)');
  });

  it.each([
    [{ check: 'output-low', margin: null, required: 0.2, offered: 0.0667, spare: 0.1333 }, '133 mV spare'],
    [{ check: 'slew-rate', sense: 'at-least', unit: 'V/s', required: 1e4, offered: 2.39e5, margin: 23.9, spare: 2.29e5 }, '23 times'],
    [{ check: 'slew-rate', sense: 'at-least', unit: 'V/s', required: 1e4, offered: 1.239e4, margin: 1.239, spare: 2390 }, '23 % spare'],
    [{ check: 'temperature-high', sense: 'at-least', unit: '°C', required: 60, offered: 125, margin: null, spare: 65 }, '65 °C spare'],
    [{ check: 'supply-high', sense: 'at-least', required: 4.2, offered: 5.5, margin: 1.31, spare: 1.3 }, '1.3 V spare'],
    [{ check: 'channels', sense: 'at-least', unit: '1', required: 1, offered: 2, margin: 2, spare: 1 }, 'has 2'],
    [{ check: 'status', sense: 'one-of', unit: null, required: ['approved'], offered: 'approved', spare: null, margin: null }, 'approved'],
    [{ check: 'output-current', sense: 'at-least', unit: 'A', required: 0, offered: 0.005, margin: null, spare: 0.005 }, '5 mA spare'],
  ] as const)('%j', (more, expected) => { expect(plain(spareText(verdict(more)))).toBe(expected); });
});

describe('by how much a failing check misses', () => {
  it.each([
    [{ offered: 0.0274, spare: -0.0074 }, 'over by 7.4 mV (37 %)'],
    [{ offered: 0.5, spare: -0.48 }, 'over by 480 mV (24 times)'],
    [{ offered: null, known: 0.03, spare: null }, 'over by at least 10 mV (50 %)'],
    [{ check: 'output-low', required: 0, offered: 0.022, spare: -0.022 }, 'short by 22 mV'],
    [{ check: 'temperature-low', unit: '°C', required: -20, offered: 0, spare: -20 }, 'short by 20 °C'],
    [{ check: 'status', sense: 'one-of', unit: null, required: ['approved', 'conditional'], offered: 'restricted', spare: null }, 'restricted, wanted approved or conditional'],
  ] as const)('%j', (more, expected) => { expect(plain(shortfall(verdict({ outcome: 'fail', ...more })))).toBe(expected); });

  it('never prints a fail as met', () => {
    expect(plain(comparisonText(verdict({ outcome: 'fail', offered: 0.0200001, spare: -1e-7 })))).toBe('20.0001 mV, allowed 20 mV');
  });
});

describe('where a verdict turns', () => {
  it.each([
    [{ figure: 'offsetDrift', kind: 'max', value: 29.87e-6, unit: 'V/K' }, '29.8 µV/°C or less'],
    [{ figure: 'gainBandwidth', kind: 'min', value: 1.1201e6, unit: 'Hz' }, '1.13 MHz or more'],
    [{ figure: 'supplyVoltage', kind: 'min', value: 3, unit: 'V' }, '3 V or less'],
    [{ figure: 'commonModeRejection', kind: 'min', value: 1e4, unit: 'V/V' }, '80 dB or more'],
  ] as const)('%j', (point, expected) => { expect(plain(turningText(point))).toBe(expected); });
});

it('a head-room turns at its current and supply', () => {
  const point = { figure: 'outputLowHeadroom', kind: 'max', value: 0.2999, unit: 'V', condition: { current: 1.4505e-3, supply: 3.2 } } as const;
  expect(plain(turningText(point))).toBe('299 mV or less at 1.45 mA, 3.2 V');
});

it('a reason that two checks share is said once', () => {
  const open = (check: string, figure: 'outputLowHeadroom' | 'outputHighHeadroom', value: number): Verdict =>
    verdict({ check, outcome: 'unknown', reason: 'beyond-data', decidesAt: { figure, kind: 'max', value, unit: 'V' } });
  const both = [open('output-low', 'outputLowHeadroom', 0.3), open('output-high', 'outputHighHeadroom', 0.4)];
  expect(plain(unknownText(both))).toBe(
    'output low and output high: this lies beyond what the figures cover; pass if output head-room to V- is 300 mV or less and output head-room to V+ is 400 mV or less',
  );
});

it('how far the points reach, and what flows', () => {
  expect(plain(beyondText({ covers: 248e-6, current: 463e-6, supply: 5 }, 'approved'))).toBe('the list covers up to 248 µA (1.5 × = 372 µA); 463 µA flows here');
});

it('what is met but for rounding reads equal', () => {
  expect(plain(comparisonText(verdict({ offered: 0.02 * (1 + 1e-12), spare: 0 })))).toBe('20 mV, allowed 20 mV');
});

it('a corner in words', () => {
  expect(plain(cornerText({ supply: 4.2, temperature: -20, currentTemperature: 60 }))).toBe('at 4.2 V supply, offset at -20 °C, currents at 60 °C');
  expect(plain(cornerText({ supply: 4.2, reference: 0, input: 0.33, temperature: -20, load: 3e-4 }))).toBe('at 4.2 V supply, 330 mV input, -20 °C, 300 µA sourced');
  expect(plain(cornerText({ supply: 5, reference: 2.5, positive: 1, negative: 2, load: -1e-3 }))).toBe('at 5 V supply, 2.5 V reference, 1 V at the + input, 2 V at the - input, 1 mA sunk');
  expect(cornerText({})).toBe('');
});
