import { formatComparison, formatDecibels, formatPercent, formatQuantity, type FormatOptions } from '../quantities/format.js';
import type { Verdict } from '../verdicts/verdict.js';
import type { Price } from '../parts/part.js';
import { GLUE, held } from './spelling.js';
import { spoken } from './spoken.js';
import { DECIBEL_FIGURES } from './words.js';

/** A number with its unit, held together. */
export function amount(value: number, unit: string, options: FormatOptions = {}): string {
  if (!Number.isFinite(value)) return 'no limit';
  return held(inCents(formatQuantity(value, unit, options), unit));
}

/** Money has two decimals or more: 0.10 EUR, not 0.1 EUR. */
function inCents(text: string, unit: string): string {
  if (!/^[A-Z]{3}$/u.test(unit)) return text;
  const [number = '', ...rest] = text.split(' ');
  const [whole = '', decimals = ''] = number.split('.');
  return [`${whole}.${decimals.padEnd(2, '0')}`, ...rest].join(' ');
}

/** A number of a check, in the unit it is spoken in. */
export function checkAmount(of: { readonly check: string; readonly unit: string | null }, value: number): string {
  const said = spoken(of.check, value, of.unit ?? '1');
  return amount(said.value, said.unit);
}

/** Both ends; of a narrow range with the digits that tell them apart: 2.495 V..2.505 V. */
export function range(min: number, max: number, unit: string): string {
  if (min === max) return amount(min, unit);
  const digits = Math.ceil(Math.log10(Math.max(Math.abs(min), Math.abs(max)) / (max - min))) + 1;
  return held(`${formatQuantity(min, unit, { digits: within(digits) })}..${formatQuantity(max, unit, { digits: within(digits) })}`);
}

/** Three digits as everywhere, never more than a voltage is known to. */
const within = (digits: number): number => Math.min(6, Math.max(3, digits));

/** A figure of a part: rejections and gains in decibels. */
export function figureAmount(figure: string, value: { readonly value: number; readonly unit: string }, options: FormatOptions = {}): string {
  if (DECIBEL_FIGURES.has(figure) && value.value !== 0 && Number.isFinite(value.value)) return held(formatDecibels(value.value, options));
  return amount(value.value, value.unit, options);
}

/** Offered and required as they compare; null when one is missing. `known` stands in for an offered bound, and what is met exactly reads equal. */
export function compared(verdict: Verdict): Comparison | null {
  const value = typeof verdict.offered === 'number' ? verdict.offered : verdict.known;
  if (value === null || typeof verdict.required !== 'number' || verdict.unit === null) return null;
  if (verdict.sense !== 'at-least' && verdict.sense !== 'at-most') return null;
  const counts = spoken(verdict.check, verdict.spare === 0 ? verdict.required : value, verdict.unit);
  const asked = spoken(verdict.check, verdict.required, verdict.unit);
  const [offered, required, difference] = formatComparison(counts.value, asked.value, counts.unit, verdict.sense);
  const { unit } = counts;
  const print = (text: string): string => held(inCents(text, unit));
  return { offered: print(offered), required: print(required), difference: print(difference) };
}

/** Two numbers as printed, and what lies between them. */
export interface Comparison {
  readonly offered: string;
  readonly required: string;
  readonly difference: string;
}

/** A fraction in percent, or as a multiple where percent says little. */
export function share(fraction: number, round: 'up' | 'down'): string {
  if (fraction >= 10) return `${formatQuantity(fraction, '1', { digits: 2, round })}${GLUE}times`;
  return held(formatPercent(fraction, { digits: 2, round }));
}

export function priceText(price: Price | null): string {
  return price === null ? '' : amount(price.amount, price.currency);
}
