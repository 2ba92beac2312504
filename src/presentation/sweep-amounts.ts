import { formatQuantity } from '../quantities/format.js';
import type { SweepOver, SweepReport } from '../report.js';
import { amount } from './amounts.js';
import { held } from './spelling.js';

export interface Printing {
  readonly digits: number;
  readonly round?: 'up' | 'down';
}

/** A value of the swept field as it is spoken. */
export function sweptAmount({ unit, isShare }: Pick<SweepOver, 'unit' | 'isShare'>, value: number, printing: Printing): string {
  return isShare ? held(`${formatQuantity(100 * value, '1', printing)} %`) : amount(value, unit, printing);
}

/** All values with as many digits as tell each from the next, three at least. */
export function sweptTexts({ over, points }: Pick<SweepReport, 'over' | 'points'>): string[] {
  for (let digits = 3; digits < MOST_DIGITS; digits += 1) {
    const texts = points.map(({ value }) => sweptAmount(over, value, { digits }));
    if (new Set(texts).size === texts.length) return texts;
  }
  return points.map(({ value }) => sweptAmount(over, value, { digits: MOST_DIGITS }));
}

const MOST_DIGITS = 12;

/** A turn in full: it was rounded upwards to few digits where it was found, and judged there. */
export const turnAmount = (over: SweepOver, at: number): string => sweptAmount(over, at, { digits: 15 });
