import { amount } from '../../amounts.js';
import { safeLine } from '../../safe-text.js';

export const HELD = '\u00a0';

/** As a page spells numbers: U+2212 for the minus, number and unit held together. */
export const paged = (words: string): string => words.replaceAll(' ', HELD).replace(/(?<![\w.])-(?=\d)/gu, '−');

/** A value in SI units as a page shows it: `−20 °C`. */
export function said(value: number, unit: string, digits = 3): string {
  return paged(amount(value, unit, { digits }));
}

export const saidOr = (value: number | null, unit: string, digits = 3): string => (value === null ? 'not known' : said(value, unit, digits));

/** A share as a percentage of two digits; what is next to nothing says so. */
export function saidShare(share: number): string {
  return share > 0 && share < LEAST_SHARE ? `<${HELD}${said(100 * LEAST_SHARE, '%')}` : said(100 * share, '%', 2);
}

const LEAST_SHARE = 1e-4;

/** Both ends: `3 V..4.2 V`; once when they are equal. */
export const saidRange = (min: number, max: number, unit: string): string => (min === max ? said(min, unit) : `${said(min, unit)}..${said(max, unit)}`);

/** Letters that are written from the right; a name with one is kept to itself, so that it turns nothing round it. */
const RIGHT_TO_LEFT = /[\u0590-\u08ff\ufb1d-\ufdff\ufe70-\ufeff\u{10800}-\u{10fff}\u{1e800}-\u{1efff}]/u;

/** An id or a description inside a sentence. */
export function named(text: string): string {
  const safe = safeLine(text);
  return RIGHT_TO_LEFT.test(safe) ? `\u2068${safe}\u2069` : safe;
}
