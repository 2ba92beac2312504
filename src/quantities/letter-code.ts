import type { DecimalText } from './number.js';
import type { Figure } from './syntax.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';

/** A letter code such as `4k7`: the letter is decimal point, prefix and unit in one. */
export interface LetterCode {
  readonly number: DecimalText;
  /** Unit the letter stands for when none follows. */
  readonly unit: 'Ω' | 'F' | 'V';
}

/** IEC 60062:2016 letters for resistance and capacitance; V by habit. `m` and the decades are shared, so the kind settles the unit. */
const LETTERS = new Map<string, { units: string; exponent: number }>([
  ['R', { units: 'Ω', exponent: 0 }],
  ['L', { units: 'Ω', exponent: -3 }],
  ['k', { units: 'Ω', exponent: 3 }],
  ['K', { units: 'Ω', exponent: 3 }],
  ['M', { units: 'Ω', exponent: 6 }],
  ['G', { units: 'Ω', exponent: 9 }],
  ['T', { units: 'Ω', exponent: 12 }],
  ['m', { units: 'ΩF', exponent: -3 }],
  ['p', { units: 'F', exponent: -12 }],
  ['n', { units: 'F', exponent: -9 }],
  ['N', { units: 'F', exponent: -9 }],
  ['u', { units: 'F', exponent: -6 }],
  ['U', { units: 'F', exponent: -6 }],
  ['µ', { units: 'F', exponent: -6 }],
  ['V', { units: 'V', exponent: 0 }],
]);

/** Reads a letter code (rule Q-9). Throws Refusal Q011 for a letter that is none, Q005 never: the letter is the point. */
export function readLetterCode(figure: Figure, reading: Reading): LetterCode {
  const [, whole = '', letter = '', fraction = ''] = /^(\d*)(\D)(\d+)$/.exec(figure.number.text) ?? [];
  const meaning = LETTERS.get(letter);
  if (meaning === undefined) {
    const message = `${letter} in ${figure.number.text} is no decimal letter (R K M G T L p n u m V)`;
    throw new Refusal('Q011', message, { ...figure.number, fix: undefined });
  }
  const wanted = reading.rule.dimensions[0] ?? '';
  const unit = meaning.units.includes(wanted) && wanted !== '' ? wanted : meaning.units.charAt(0);
  const note = letter === 'N' || letter === 'U' ? `${letter} read as ${letter === 'N' ? 'nano' : 'micro'}` : undefined;
  const number = { mantissa: `${whole === '' ? '0' : whole}.${fraction}`, exponent: meaning.exponent, scaled: meaning.exponent !== 0 };
  return { number: note === undefined ? number : { ...number, note }, unit: unit as LetterCode['unit'] };
}

/** Tolerance letters of IEC 60062:2016, percent. */
const TOLERANCE_LETTERS = new Map<string, number>([
  ['B', 0.1],
  ['C', 0.25],
  ['D', 0.5],
  ['F', 1],
  ['G', 2],
  ['J', 5],
  ['K', 10],
  ['M', 20],
]);

/** Percent of a tolerance letter on a resistance. Throws Refusal Q006 for K and M (too easily read as prefixes) and for any other letter. */
export function readToleranceLetter(letter: string, figure: Figure, context: { reading: Reading; plain: string }): number {
  const { reading, plain } = context;
  const percent = TOLERANCE_LETTERS.get(letter);
  const accepted = percent !== undefined && percent < 10 && reading.kind === 'resistance';
  if (accepted) return percent;
  const end = figure.unit?.end ?? figure.end;
  const named = percent === undefined ? plain : `${plain} ±${percent} %`;
  throw new Refusal('Q006', reason(letter, percent, reading), { start: end - 1, end, fix: patched(reading, figure, named) });
}

function reason(letter: string, percent: number | undefined, reading: Reading): string {
  if (percent === undefined) return `${letter} is not a tolerance letter`;
  if (percent >= 10) return `${letter} as tolerance letter (${percent} %) is too easily read as ${letter === 'K' ? 'kilo' : 'mega'}`;
  return `the tolerance letter ${letter} is read on resistances only, and ${reading.rule.expected} is expected`;
}
