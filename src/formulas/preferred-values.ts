import { requireWithin } from './domain.js';

/** E192 departs from rounding once: position 185 is 9.20, not 9.19. Source: IEC 60063:2015 (from memory). */
const EXCEPTION = { series: 192, index: 185, value: 9.2 } as const;

/**
 * Mantissa of the fine E series by their rule, 10^(index/series) rounded to two places.
 * @param series 48, 96 or 192; the coarse series up to E24 do not follow the rule
 * @param index whole number, 0 .. series − 1
 * @returns 1.00 .. 9.88
 * @example preferredValue(96, 9) is 1.24
 * Source: IEC 60063:2015.
 */
export function preferredValue(series: 48 | 96 | 192, index: number): number {
  requireWithin('preferredValue', { index }, { from: 0, below: series });
  if (series === EXCEPTION.series && index === EXCEPTION.index) return EXCEPTION.value;
  return Math.round(100 * 10 ** (index / series)) / 100;
}
