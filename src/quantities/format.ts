import { asciiText } from './ascii.js';
import { plainText, roundToDigits, type Digits, type Rounding } from './decimal.js';

export interface FormatOptions {
  /** Significant digits, 3 by default. Trailing zeros are never shown. */
  readonly digits?: number;
  /** `up` is toward plus infinity, `down` toward minus infinity: the unsafe side is the caller's to name. */
  readonly round?: Rounding;
  /** uV, ohm, nV/rtHz. */
  readonly ascii?: boolean;
}

/**
 * A value in SI units as a person reads it (rule Q-20): number, blank, unit with an engineering prefix. The minus is the
 * ASCII hyphen; U+2212 belongs to HTML and to `Quantity.echo`. `1/K` is shown as ppm/°C, `V/K` as V/°C; `%` takes percent;
 * the unit `1` or an empty one shows the number alone. Throws RangeError when the value is not finite.
 */
export function formatQuantity(value: number, unit: string, options: FormatOptions = {}): string {
  const digits = roundToDigits(value, options.digits ?? 3, options.round ?? 'nearest');
  const { shift, text } = scaledUnit(digits, unit);
  const number = plainText(digits, shift);
  // The SI writes a blank before every unit but the degree of angle.
  const whole = text === '' || text === '°' ? number + text : `${number} ${text}`;
  return options.ascii ? asciiText(whole) : whole;
}

/** Both ends with their own prefix: `900 mV..1.2 V`. */
export function formatRange(min: number, max: number, unit: string): string {
  return `${formatQuantity(min, unit)}..${formatQuantity(max, unit)}`;
}

/** A voltage ratio in decibels, 20·log10 of its magnitude. Throws RangeError for a ratio of zero. */
export function formatDecibels(ratio: number, options: FormatOptions = {}): string {
  return formatQuantity(20 * Math.log10(Math.abs(ratio)), 'dB', options);
}

/** A fraction (0.05) in percent: `5 %`. */
export function formatPercent(fraction: number, options: FormatOptions = {}): string {
  const digits = roundToDigits(fraction, options.digits ?? 3, options.round ?? 'nearest');
  return `${plainText(digits, 2)} %`;
}

const PREFIXED = new Set(['V', 'A', 'Ω', 'F', 'Hz', 's', 'W', 'H', 'S', 'J', 'C', 'Ah', 'V/√Hz', 'A/√Hz', 'V/Hz', 'A/Hz', 'V/K', 'V/A', 'Vpk', 'Vpp', 'Vrms']);
const SYMBOLS = new Map([[-15, 'f'], [-12, 'p'], [-9, 'n'], [-6, 'µ'], [-3, 'm'], [0, ''], [3, 'k'], [6, 'M'], [9, 'G'], [12, 'T']]);

interface ScaledUnit {
  /** Power of ten the digits are multiplied with. */
  readonly shift: number;
  readonly text: string;
}

function scaledUnit(digits: Digits, unit: string): ScaledUnit {
  if (unit === '1') return { shift: 0, text: '' };
  if (unit === '1/K') return { shift: 6, text: 'ppm/°C' };
  if (unit === 'V/s') return slewUnit(digits);
  if (!PREFIXED.has(unit)) return { shift: 0, text: unit };
  const { shift, symbol } = engineering(digits, 0);
  return { shift, text: symbol + (unit === 'V/K' ? 'V/°C' : unit) };
}

/** Slew rates are spoken per microsecond from 10 mV/µs up, per millisecond from 1 V/ms up, per second below. */
function slewUnit(digits: Digits): ScaledUnit {
  const [per, decades]: [string, number] = digits.exponent >= 4 ? ['µs', 6] : digits.exponent >= 3 ? ['ms', 3] : ['s', 0];
  const { shift, symbol } = engineering(digits, -decades);
  return { shift, text: `${symbol}V/${per}` };
}

/** The prefix that leaves one to three digits before the point, after multiplying with 10^offset. */
function engineering(digits: Digits, offset: number): { shift: number; symbol: string } {
  if (digits.digits === '0') return { shift: offset, symbol: '' };
  const power = Math.max(-15, Math.min(12, Math.floor((digits.exponent + offset) / 3) * 3));
  return { shift: offset - power, symbol: SYMBOLS.get(power) ?? '' };
}

/** Two printed numbers whose comparison reads as it is, and what lies between them as printed: offered, required, difference. */
export type PrintedComparison = readonly [offered: string, required: string, difference: string];

/** Digits of a binary64 number that always tell it from its neighbours. */
const ALL_DIGITS = 17;
/** How far the printed difference may be from the true one, as a fraction of it. */
const DIFFERENCE_ERROR = 0.02;

/**
 * Offered against required (rule Q-20): both to nearest with the same digits, three and as many more as it takes that a
 * fail reads as a fail, a pass as a pass, and the difference as what it is. The difference, without its sign, is that of
 * the printed numbers, so that the three add up to three digits. Equal numbers read equal. Throws RangeError when a value is not finite.
 */
// Two numbers, their unit and the sense are what a comparison is; bundling them would only rename the four.
// eslint-disable-next-line max-params
export function formatComparison(offered: number, required: number, unit: string, sense: 'at-least' | 'at-most'): PrintedComparison {
  const digits = offered === required ? 3 : digitsToCompare(offered, required, sense);
  const print = (value: number): string => formatQuantity(value, unit, { digits });
  return [print(offered), print(required), formatQuantity(printedDifference(offered, required, digits), unit)];
}

function digitsToCompare(offered: number, required: number, sense: 'at-least' | 'at-most'): number {
  const distance = Math.abs(offered - required);
  const met = (a: number, b: number): boolean => (sense === 'at-least' ? a >= b : a <= b);
  for (let digits = 3; digits < ALL_DIGITS; digits++) {
    const [shown, limit] = [printed(offered, digits), printed(required, digits)];
    if (shown === limit || met(shown, limit) !== met(offered, required)) continue;
    if (Math.abs(printedDifference(offered, required, digits) - distance) <= DIFFERENCE_ERROR * distance) return digits;
  }
  return ALL_DIGITS;
}

/** Rounded to the last place printed, where binary subtraction leaves noise. */
function printedDifference(offered: number, required: number, digits: number): number {
  const place = Math.min(lastPlace(offered, digits), lastPlace(required, digits));
  const difference = Math.abs(printed(offered, digits) - printed(required, digits));
  return Number(difference.toFixed(Math.min(MOST_PLACES, Math.max(0, -place))));
}

/** What toFixed can do. */
const MOST_PLACES = 100;

/** Power of ten of the last significant digit printed. */
function lastPlace(value: number, count: number): number {
  const { digits, exponent } = roundToDigits(value, count, 'nearest');
  return exponent - digits.length + 1;
}

const printed = (value: number, digits: number): number => Number(plainText(roundToDigits(value, digits, 'nearest'), 0));
