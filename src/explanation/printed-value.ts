import { formatDecibels, formatPercent, formatQuantity, type FormatOptions } from '../quantities/format.js';

/** Digits of a binary64 number that tell it from its neighbours. */
export const EXACT = 17;

/** A value in SI units as the stage file has it: fractions in percent where the unit is `%`, ratios in decibels where it is `dB`. */
export function writtenValue(value: number, unit: string, options: FormatOptions): string {
  if (unit === '%') return formatPercent(value, options);
  return unit === 'dB' ? formatDecibels(value, options) : formatQuantity(value, unit, options);
}

/** How far from the boundary a printed value may lie, as a share of it. */
const NEAR = 0.01;
const FEWEST = 2;

/** Digits with which a value, rounded away from where it stood, stays within a hundredth of itself; more than two only where it takes them. */
export function fewDigits(value: number, unit: string, round: 'up' | 'down'): number {
  for (let digits = FEWEST; digits < EXACT; digits++) {
    const printed = printedAs(value, unit, { digits, round });
    if (Math.abs(printed - value) <= NEAR * Math.abs(value)) return digits;
  }
  return EXACT;
}

/** The value that is read back, SI. */
export function printedAs(value: number, unit: string, options: FormatOptions): number {
  const plain = Number.parseFloat(formatQuantity(unit === 'dB' ? 20 * Math.log10(value) : unit === '%' ? 100 * value : value, '1', options));
  if (unit === 'dB') return 10 ** (plain / 20);
  return unit === '%' ? plain / 100 : plain;
}
