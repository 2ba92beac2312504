/** An SI prefix as it may be typed. */
export interface Prefix {
  readonly exponent: number;
  /** SI spelling. */
  readonly symbol: string;
  readonly note?: string;
  /** P: peta by the book, never meant here. */
  readonly refused?: true;
}

const only = (letter: string, name: string): string => `${letter} is no SI prefix, so it can only be ${name}`;

/** Rule Q-6; SI Brochure, 9th edition (2019), table 7. K for k is the spelling of IEC 60062. */
const PREFIXES = new Map<string, Prefix>([
  ['', { exponent: 0, symbol: '' }],
  ['f', { exponent: -15, symbol: 'f' }],
  ['p', { exponent: -12, symbol: 'p' }],
  ['n', { exponent: -9, symbol: 'n' }],
  ['N', { exponent: -9, symbol: 'n', note: only('N', 'nano') }],
  ['u', { exponent: -6, symbol: 'µ' }],
  ['µ', { exponent: -6, symbol: 'µ' }],
  ['U', { exponent: -6, symbol: 'µ', note: only('U', 'micro') }],
  ['m', { exponent: -3, symbol: 'm' }],
  ['k', { exponent: 3, symbol: 'k' }],
  ['K', { exponent: 3, symbol: 'k' }],
  ['M', { exponent: 6, symbol: 'M' }],
  ['G', { exponent: 9, symbol: 'G' }],
  ['g', { exponent: 9, symbol: 'G', note: only('g', 'giga') }],
  ['T', { exponent: 12, symbol: 'T' }],
  ['P', { exponent: 15, symbol: 'p', refused: true }],
]);

/** Prefix words, any letter case. `kil` and `meg` are what stands before `ohm`. */
const WORDS = new Map<string, string>([
  ['meg', 'M'],
  ['mega', 'M'],
  ['kil', 'k'],
  ['kilo', 'k'],
  ['giga', 'G'],
  ['milli', 'm'],
  ['micro', 'µ'],
  ['nano', 'n'],
  ['pico', 'p'],
  ['femto', 'f'],
]);

/** The prefix with this spelling, or null. */
export function findPrefix(text: string): Prefix | null {
  return PREFIXES.get(text) ?? PREFIXES.get(WORDS.get(text.toLowerCase()) ?? 'none') ?? null;
}
