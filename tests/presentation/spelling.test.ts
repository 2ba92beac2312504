import { describe, expect, it } from 'vitest';
import { finished, GLUE, glued, spelled } from '../../src/presentation/spelling.js';
import { styleOf } from '../support/sample-report.js';

const shown = (text: string): string => glued(text).replaceAll(GLUE, '~');

describe('number and unit held together', () => {
  it.each([
    ['3 mV at 45 K', '3~mV at 45~K'],
    ['25 mV..330 mV', '25~mV..330~mV'],
    ['8.5 nV/√Hz, 2 µV/°C', '8.5~nV/√Hz, 2~µV/°C'],
    ['× 3, ÷ 3.16, ≤ 20 mV', '×~3, ÷~3.16, ≤~20~mV'],
    ['-20 °C, 1 %, 70 dB, 0.34 EUR, 8 V/V', '-20~°C, 1~%, 70~dB, 0.34~EUR, 8~V/V'],
    ['300 µVrms, 100 mVpk', '300~µVrms, 100~mVpk'],
    ['2 sections of 4 amplifiers', '2 sections of 4 amplifiers'],
    ['TEAM-0012 A', 'TEAM-0012 A'],
  ])('%s', (text, expected) => { expect(shown(text)).toBe(expected); });
});

describe('spelling', () => {
  it('the minus is a hyphen', () => { expect(spelled('−20 °C', styleOf(80))).toBe('-20 °C'); });
  it('in ASCII every sign has a spelling', () => {
    expect(spelled('10 kΩ ±1 % ≤ 5 µV, 2π·f × 3 … nV/√Hz → −20 °C é', styleOf(80, { ascii: true }))).toBe('10 kohm +/-1 % <= 5 uV, 2pi*f x 3 ... nV/rtHz -> -20 C \\u{e9}');
  });
  it('joints become U+00A0 on a terminal and a blank in a pipe', () => {
    expect(finished([`3${GLUE}mV `], styleOf(80, { gluedUnits: true }))).toBe('3\u00a0mV\n');
    expect(finished([`3${GLUE}mV `], styleOf(80))).toBe('3 mV\n');
    expect(finished([`3${GLUE}mV `], styleOf(80, { gluedUnits: true, ascii: true }))).toBe('3 mV\n');
  });
});
