import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { safeLine, safeText } from '../../src/presentation/safe-text.js';

describe('text from outside on a terminal', () => {
  it.each([
    ['\u001b[31mred', '\\u{1b}[31mred'],
    ['a\u0085b\u009b2J', 'a\\u{85}b\\u{9b}2J'],
    ['\u202eevil\u2066', '\\u{202e}evil\\u{2066}'],
    ['zero\u200bwidth\ufeff', 'zero\\u{200b}width\\u{feff}'],
    ['soft\u00adhyphen', 'soft\\u{ad}hyphen'],
    ['\ud800', '\\u{d800}'],
    ['\ue000', '\\u{e000}'],
    ['\u{e0041}', '\\u{e0041}'],
    ['10 kΩ ±1 %, µ √ é 電', '10 kΩ ±1 %, µ √ é 電'],
  ])('%j', (text, expected) => { expect(safeText(text)).toBe(expected); });

  it('on one line blanks of any kind become one', () => { expect(safeLine('  a\r\nb\t c  ')).toBe('a b c'); });

  it('never leaves a control, format, surrogate or private character', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => { expect(safeText(text)).not.toMatch(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\u2028\u2029]/u); }));
  });

  it('changes nothing in what is already safe', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => { expect(safeText(safeText(text))).toBe(safeText(text)); }));
  });
});
