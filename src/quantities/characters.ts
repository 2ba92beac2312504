import { Refusal } from './refusal.js';

/** Text with look-alike characters mapped to one form, and for every index where it came from in the typed text. */
export interface Normalised {
  readonly text: string;
  /** origin[i] is the UTF-16 index in the typed text; one more entry than characters, the last is the typed length. */
  readonly origin: readonly number[];
}

/**
 * Rule Q-2: one code point per meaning. NFKC is not used (it turns 10⁻³ into 10−3 and ½ into 1⁄2), and case is never
 * folded (a lower-cased Ω is ω). What is not known is refused by code point and position.
 */
export function normaliseCharacters(typed: string): Normalised {
  // Printable ASCII stays as it is, character by character; most cells of a list are that.
  if (PLAIN.test(typed)) return { text: typed, origin: Array.from({ length: typed.length + 1 }, (_, index) => index) };
  let text = '';
  const origin: number[] = [];
  for (let index = 0; index < typed.length; ) {
    const character = String.fromCodePoint(typed.codePointAt(index) ?? 0);
    const mapped = mapCharacter(character) ?? refuse(character, index);
    origin.push(...Array.from({ length: mapped.length }, () => index));
    text += mapped;
    index += character.length;
  }
  return { text, origin: [...origin, typed.length] };
}

const PLAIN = /^[ -~]*$/u;

const MAPPED = new Map<string, string>([
  ['\u03bc', '\u00b5'], // Greek mu to micro sign
  ['\u2126', '\u03a9'], // ohm sign to capital omega
  ['\u212a', 'K'],
  ['\u2103', '°C'],
  ['\u2109', '°F'],
  ['\u2212', '-'],
  ['\u2026', '..'],
  ['\u00d7', 'x'],
  ['\u2019', "'"],
  ['\u22c5', '·'],
  ['\u2219', '·'],
  ['\u223c', '~'],
  ['\u2248', '~'],
  ['\u2264', '≤'],
  ['\u2265', '≥'],
  ...['\u00a0', '\u202f', '\u2009', '\u2007', '\u3000', '\t', '\n', '\r'].map((space): [string, string] => [space, ' ']),
]);

/** Non-ASCII characters that have a meaning of their own in a quantity; U+2013 separates a range. */
const KEPT = 'µΩω°√±–·‰½€⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻';
const INVISIBLE = /[\p{Cc}\p{Cf}\p{Z}\p{M}\p{Cn}\p{Co}\p{Cs}]/u;

function mapCharacter(character: string): string | null {
  const mapped = MAPPED.get(character);
  if (mapped !== undefined) return mapped;
  const code = character.codePointAt(0) ?? 0;
  if (code >= 0x20 && code < 0x7f) return character;
  if (code >= 0xff01 && code <= 0xff5e) return String.fromCodePoint(code - 0xfee0);
  return KEPT.includes(character) ? character : null;
}

/** Signs that belong to several currencies, or to one: the code says it. */
const CURRENCY_SIGNS = new Map([['£', 'GBP'], ['¥', 'JPY']]);

function refuse(character: string, index: number): never {
  const code = `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`;
  const invisible = INVISIBLE.test(character);
  const name = invisible ? `invisible character ${code}` : `character ${character} (${code})`;
  throw new Refusal('Q016', `${name} at position ${index + 1} has no meaning in a quantity`, {
    start: index,
    end: index + character.length,
    fix: CURRENCY_SIGNS.get(character) ?? 'delete it',
  });
}
