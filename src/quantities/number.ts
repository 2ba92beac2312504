import { Refusal } from './refusal.js';

/** A number as decimal text: digits with at most one point, times 10^exponent. Never a binary number before Q-4's one conversion. */
export interface DecimalText {
  readonly mantissa: string;
  readonly exponent: number;
  /** An exponent was written; together with an SI prefix that makes two scale factors. */
  readonly scaled: boolean;
  readonly note?: string;
}

/** Where a number stands in the normalised text, and what is known about the decimal mark. */
export interface NumberPlace {
  readonly start: number;
  readonly decimal?: 'point' | 'comma' | undefined;
  /** The unit as typed, to be repeated in a fix. */
  readonly unit?: string | undefined;
}

/** The mantissa of a number at the start of the text; a blank groups only before exactly three digits, and a comma never leads. */
const MANTISSA = /^(?:\d+(?:(?:[.,'_]| (?=\d{3}(?!\d)))\d+)*(?:\.(?![\d.,]))?|\.\d+)/;
const EXPONENT = /^[eE]([+-]?\d+)/;
const TIMES_TEN = /^ *[x*·] *10 *(?:\^ *\(?([+-]?\d+)\)?|([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))/;
const POWER = /^(?:\^\(?([+-]?\d+)\)?|([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))/;

/** Length of the unsigned number the text starts with, 0 when it starts with none. A leading comma counts only where it separates nothing. */
export function numberLength(text: string, leadingComma = false): number {
  const mantissa = (leadingComma ? /^,\d+/.exec(text) : null)?.[0] ?? MANTISSA.exec(text)?.[0];
  if (mantissa === undefined) return 0;
  const rest = text.slice(mantissa.length);
  const tail = EXPONENT.exec(rest) ?? TIMES_TEN.exec(rest) ?? (mantissa === '10' ? POWER.exec(rest) : null);
  return mantissa.length + (tail?.[0].length ?? 0);
}

/** Reads an unsigned number (rules ). Throws Refusal Q005 when comma or grouping leave two readings. */
export function readNumber(text: string, place: NumberPlace): DecimalText {
  const mantissa = MANTISSA.exec(text)?.[0] ?? /^,\d+/.exec(text)?.[0] ?? '';
  const tail = text.slice(mantissa.length);
  const power = mantissa === '10' ? POWER.exec(tail) : null;
  if (power !== null) return { mantissa: '1', exponent: exponentOf(power), scaled: true };
  const match = EXPONENT.exec(tail) ?? TIMES_TEN.exec(tail);
  const exponent = match === null ? 0 : exponentOf(match);
  return { ...readMantissa(mantissa, { ...place, tail }), exponent, scaled: match !== null };
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function exponentOf(match: RegExpExecArray): number {
  const plain = match[1] ?? (match[2] ?? '0').replace(/./gu, plainDigit);
  // Anything beyond a thousand decades overflows or vanishes either way; the cap keeps the arithmetic on exponents exact.
  return Math.max(-1000, Math.min(1000, Number(plain)));
}

function plainDigit(character: string): string {
  if (character === '⁻') return '-';
  if (character === '⁺') return '';
  return String(SUPERSCRIPTS.indexOf(character));
}

interface MantissaPlace extends NumberPlace {
  /** Exponent as typed, repeated in a fix. */
  readonly tail: string;
}

type Mantissa = Pick<DecimalText, 'mantissa' | 'note'>;

function readMantissa(text: string, place: MantissaPlace): Mantissa {
  const { plain, grouped } = withoutNeutralGrouping(text, place);
  const points = plain.split('.').length - 1;
  const commas = plain.split(',').length - 1;
  if (points + commas === 0) return { mantissa: plain };
  if (points > 0 && commas > 0) return bothMarks(plain, place);
  const mark = points > 0 ? '.' : ',';
  if (points + commas > 1) return repeatedMark(plain, mark, place);
  return singleMark(plain, { ...place, mark, grouped });
}

/** Blanks, apostrophes and underscores between groups of three can only be grouping. */
function withoutNeutralGrouping(text: string, place: MantissaPlace): { plain: string; grouped: boolean } {
  if (!/[ '_]/.test(text)) return { plain: text, grouped: false };
  const [, whole = '', fraction = ''] = /^([^.,]*)(.*)$/.exec(text) ?? [];
  const wholeIsGrouped = /^\d{1,3}(?:([ '_])\d{3})(?:\1\d{3})*$/.test(whole);
  const fractionIsGrouped = /^[.,](?:\d{3}[ '_])+\d{1,3}$/.test(fraction);
  const fine = (wholeIsGrouped || /^\d*$/.test(whole)) && (fractionIsGrouped || !/[ '_]/.test(fraction));
  if (!fine) refuseGrouping(text, place);
  return { plain: text.replace(/[ '_]/g, ''), grouped: wholeIsGrouped };
}

function bothMarks(text: string, place: MantissaPlace): Mantissa {
  const decimal = text.lastIndexOf('.') > text.lastIndexOf(',') ? '.' : ',';
  const group = decimal === '.' ? ',' : '.';
  const [whole = '', fraction = '', ...more] = text.split(decimal);
  const grouping = new RegExp(`^\\d{1,3}(?:[${group}]\\d{3})+$`);
  if (more.length > 0 || !grouping.test(whole) || fraction.includes(group)) refuseGrouping(text, place);
  const mantissa = `${whole.replaceAll(group, '')}.${fraction}`;
  const declared = place.decimal === (decimal === ',' ? 'comma' : 'point');
  return declared ? { mantissa } : { mantissa, note: `${group} read as digit grouping, ${decimal} as decimal mark` };
}

function repeatedMark(text: string, mark: string, place: MantissaPlace): Mantissa {
  if (!new RegExp(`^\\d{1,3}(?:[${mark}]\\d{3})+$`).test(text)) refuseGrouping(text, place);
  const mantissa = text.replaceAll(mark, '');
  const declared = place.decimal === (mark === '.' ? 'comma' : 'point');
  if (declared) return { mantissa };
  return { mantissa, note: `${mark} read as digit grouping: repeated groups of three can be nothing else` };
}

function singleMark(text: string, place: MantissaPlace & { mark: string; grouped: boolean }): Mantissa {
  const { mark, decimal } = place;
  const asDecimal = text.replace(',', '.');
  const mayGroup = !place.grouped && /^\d{1,3}[.,]\d{3}$/.test(text) && !/^0+[.,]/.test(text);
  const isDecimalMark = mark === (decimal === 'comma' ? ',' : '.');
  if (isDecimalMark) return { mantissa: asDecimal };
  if (mayGroup && decimal !== undefined) return { mantissa: text.replace(mark, '') };
  if (mayGroup) refuseComma(text, place);
  return { mantissa: asDecimal, note: mark === ',' ? 'decimal comma' : 'decimal point, though the comma is declared as decimal mark' };
}

function refuseComma(text: string, place: MantissaPlace): never {
  const [whole = '', fraction = ''] = text.split(',');
  const rest = place.tail + (place.unit === undefined ? '' : ` ${place.unit}`);
  const short = fraction.replace(/0+$/, '') || '0';
  throw new Refusal('Q005', `${text} is ${whole}${fraction} with comma grouping and ${whole}.${fraction} with decimal comma`, {
    start: place.start,
    end: place.start + text.length,
    fix: `${whole}${fraction}${rest} or ${whole}.${short}${rest}`,
  });
}

function refuseGrouping(text: string, place: MantissaPlace): never {
  const rest = place.tail + (place.unit === undefined ? '' : ` ${place.unit}`);
  throw new Refusal('Q005', `${text}: these marks are neither digit groups of three nor one decimal mark`, {
    start: place.start,
    end: place.start + text.length,
    // Groups of two are a habit of digit grouping too; anything else (a version, a list) leaves open what was meant.
    fix: /^\d{1,3}(?:[,'_ ]\d{2,3})+$/.test(text) ? text.replace(/[^0-9]/g, '') + rest : undefined,
  });
}
