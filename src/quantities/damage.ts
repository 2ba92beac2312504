import { formatQuantity } from './format.js';
import { toNumber } from './decimal.js';
import { readNumber } from './number.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { readUnit } from './units.js';

/** Refuses what is no quantity at all: nothing, a word for nothing, and what spreadsheets make of cells. Throws Refusal. */
export function refuseDamage(reading: Reading): void {
  const text = reading.text.trim();
  const start = reading.text.length - reading.text.trimStart().length;
  const where = { start, end: start + text.length };
  refuseMissing(text, where);
  refuseSpreadsheet(text, where);
  refuseLostSuperscript(reading, start);
}

interface Extent {
  readonly start: number;
  readonly end: number;
}

const NOT_APPLICABLE = /^(?:#?n\/a|n\.a\.?|NA)$/i;
const NOT_YET = /^(?:tbd|tba|tbc|null|nil|none|unknown|\?+|-+|–+)$/i;

function refuseMissing(text: string, where: Extent): void {
  if (text === '') throw new Refusal('Q020', 'empty: there is no value', where);
  if (NOT_APPLICABLE.test(text)) {
    throw new Refusal('Q020', `${text} is no value`, { ...where, fix: 'leave the field out; unknown and not-applicable are different' });
  }
  if (NOT_YET.test(text)) throw new Refusal('Q020', `${text} is no value yet`, { ...where, fix: 'leave the field out' });
}

/** English month names and the German ones that differ: what spreadsheets turn `3/5` and `5-3` into. */
const MONTH = '(?:jan|feb|mar|mrz|mär|apr|may|mai|jun|jul|aug|sep|oct|okt|nov|dec|dez)[a-z]*\\.?';
const DATES = [
  new RegExp(`^\\d{1,4}[-. /]+${MONTH}(?:[-. /]+\\d{1,4})?$`, 'i'),
  new RegExp(`^${MONTH}[-. /]+\\d{1,4}(?:[-, /]+\\d{1,4})?$`, 'i'),
  /^\d{4}-\d{1,2}-\d{1,2}(?:[T ].*)?$/,
  /^\d{1,2}[./]\d{1,2}[./](?:\d{2}|\d{4})$/,
  /^\d{1,2}-\d{1,2}-\d{4}$/,
  /^\d{1,2}:\d{2}(?::\d{2})?(?: ?[ap]m)?$/i,
];
const CELL_ERROR = /^#(?:REF!|VALUE!|NAME\?|DIV\/0!|NUM!|NULL!|SPILL!)$/i;

function refuseSpreadsheet(text: string, where: Extent): void {
  const fix = 'restore the original cell as text';
  if (/^#+$/.test(text)) throw new Refusal('Q017', `${text} is what a spreadsheet shows when the column is too narrow`, { ...where, fix });
  if (CELL_ERROR.test(text)) throw new Refusal('Q017', `${text} is a spreadsheet error value`, { ...where, fix });
  if (!DATES.some((date) => date.test(text))) return;
  throw new Refusal('Q017', `${text} looks like a date or time a spreadsheet made${sources(text)}`, { ...where, fix });
}

const MONTH_LETTERS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

function sources(text: string): string {
  const [, day = '', month = ''] = /^(\d{1,2})\W+([a-z]{3})[a-z]*$/i.exec(text) ?? [];
  const index = MONTH_LETTERS.indexOf(month.toLowerCase()) + 1;
  return index === 0 ? '' : ` out of ${index}/${day} or ${day}/${index}`;
}

/** `3x10-9`: the superscript was lost on the way. */
function refuseLostSuperscript(reading: Reading, start: number): void {
  const match = /^([+-]? ?[\d.,]+) *[x*] *10 ?-(\d+) *(.*)$/.exec(reading.text.trim());
  if (match === null) return;
  const [whole, number = '', power = '', unit = ''] = match;
  const plain = `${number}e-${power}${unit === '' ? '' : ` ${unit}`}`;
  const short = shortForm(number, -Number(power), { unit, reading });
  const message = `was the -${power} a superscript? ${whole} reads as a subtraction`;
  throw new Refusal('Q013', message, { start, end: start + whole.length, fix: short === null ? plain : `${plain} or ${short}` });
}

function shortForm(number: string, power: number, written: { unit: string; reading: Reading }): string | null {
  const unit = readUnit(written.unit, written.reading.kind);
  if (unit?.dimension == null || !/^\d*\.?\d+$/.test(number)) return null;
  const { mantissa } = readNumber(number, { start: 0, decimal: undefined });
  const value = toNumber(mantissa, power + unit.exponent);
  return Number.isFinite(value) && value !== 0 ? formatQuantity(value, unit.dimension, { digits: 12 }) : null;
}
