import fc from 'fast-check';
import stringWidth from 'string-width';
import { expect, it } from 'vitest';
import { displayWidth } from '../../src/presentation/layout.js';

const CHARACTERS = Array.from({ length: 0x1_0000 }, (_, code) => String.fromCharCode(code));

it('measures every character of the basic plane as string-width does', () => {
  expect(CHARACTERS.filter((one) => displayWidth(one) !== stringWidth(one))).toEqual([]);
});

it('and texts of them, in which one can change the width of its neighbour', () => {
  const trade = fc.constantFrom('µ', 'Ω', '√', '≤', '±', '°', '→', '─', '█', '5', 'k', ' ', 'é', '\u0301', '\ufe0f', '\u20e3', '\u200d', '温', '👍', '\u001b[1m');
  fc.assert(
    fc.property(fc.array(fc.oneof(trade, fc.constantFrom(...CHARACTERS)), { maxLength: 12 }), (characters) => {
      const text = characters.join('');
      expect(displayWidth(text)).toBe(stringWidth(text));
    }),
  );
});
