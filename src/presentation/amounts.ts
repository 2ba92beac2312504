import { formatComparison, formatDecibels, formatPercent, formatQuantity, formatRange, type FormatOptions } from '../quantities/format.js';
import type { Verdict } from '../verdicts/verdict.js';
import type { Price } from '../parts/part.js';
import { GLUE, held } from './spelling.js';
import { DECIBEL_FIGURES } from './words.js';

/** A number with its unit, held together. */
export function amount(value: number, unit: string, options: FormatOptions = {}): string {
  if (!Number.isFinite(value)) return 'no limit';
  return held(formatQuantity(value, unit, options));
}

export function range(min: number, max: number, unit: string): string {
  return min === max ? amount(min, unit) : held(formatRange(min, max, unit));
}

/** A figure of a part: rejections and gains in decibels. */
export function figureAmount(figure: string, value: { readonly value: number; readonly unit: string }, options: FormatOptions = {}): string {
  if (DECIBEL_FIGURES.has(figure) && value.value !== 0 && Number.isFinite(value.value)) return held(formatDecibels(value.value, options));
  return amount(value.value, value.unit, options);
}

/** Offered and required as they compare; null when one is missing. `known` stands in for an offered bound. */
export function compared(verdict: Verdict): { readonly offered: string; readonly required: string } | null {
  const value = typeof verdict.offered === 'number' ? verdict.offered : verdict.known;
  if (value === null || typeof verdict.required !== 'number' || verdict.unit === null) return null;
  if (verdict.sense !== 'at-least' && verdict.sense !== 'at-most') return null;
  const [offered, required] = formatComparison(value, verdict.required, verdict.unit, verdict.sense).map(held);
  return { offered: offered ?? '', required: required ?? '' };
}

/** A fraction in percent, or as a multiple where percent says little. */
export function share(fraction: number, round: 'up' | 'down'): string {
  if (fraction >= 10) return `${formatQuantity(fraction, '1', { digits: 2, round })}${GLUE}times`;
  return held(formatPercent(fraction, { digits: 2, round }));
}

export function priceText(price: Price | null): string {
  return price === null ? '' : amount(price.amount, price.currency);
}
