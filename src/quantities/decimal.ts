/** Decimal text `mantissa` times 10^exponent, converted once (rule Q-4): `2.2` and -9 give exactly 2.2e-9. */
export function toNumber(mantissa: string, exponent: number): number {
  const value = Number(`${mantissa}e${exponent}`);
  return value === 0 ? 0 : value;
}

/** Significant decimal digits and the power of ten of the first one: 4700 is `47` and 3. Zero is `0` and 0. */
export interface Digits {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
}

export type Rounding = 'nearest' | 'up' | 'down';

/** Up to this many digits the last bits of binary arithmetic (0.1 + 0.2) are not taken for digits. */
const NOISE_FREE = 14;

/**
 * The value rounded to `count` significant digits, trailing zeros dropped. `up` is toward plus infinity, `down` toward
 * minus infinity. Throws RangeError when the value is not finite: there is nothing to print.
 */
export function roundToDigits(value: number, count: number, rounding: Rounding): Digits {
  if (!Number.isFinite(value)) throw new RangeError(`a finite number can be printed, ${value} cannot`);
  const negative = value < 0;
  const size = Math.abs(value);
  const exact = split(count < NOISE_FREE ? Number(size.toPrecision(NOISE_FREE)) : size);
  if (exact.digits.length <= count) return { negative, ...exact };
  const kept = exact.digits.slice(0, count);
  const away = rounding === 'nearest' ? (exact.digits[count] ?? '0') >= '5' : (rounding === 'up') !== negative;
  return { negative, ...(away ? increment(kept, exact.exponent) : trim(kept, exact.exponent)) };
}

/** The digits as plain decimal text after multiplying by 10^shift: `47`, 3 and -3 give `4.7`. */
export function plainText(digits: Digits, shift: number): string {
  const point = digits.exponent + shift + 1;
  const text = digits.digits;
  const sign = digits.negative && text !== '0' ? '-' : '';
  if (text === '0') return '0';
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${text}`;
  if (point >= text.length) return sign + text + '0'.repeat(point - text.length);
  return `${sign}${text.slice(0, point)}.${text.slice(point)}`;
}

function split(size: number): { digits: string; exponent: number } {
  if (size === 0) return { digits: '0', exponent: 0 };
  const [mantissa = '0', exponent = '0'] = size.toExponential().split('e');
  return { digits: mantissa.replace('.', ''), exponent: Number(exponent) };
}

function increment(digits: string, exponent: number): { digits: string; exponent: number } {
  const kept = digits.replace(/9+$/, '');
  if (kept === '') return { digits: '1', exponent: exponent + 1 };
  return { digits: kept.slice(0, -1) + String(Number(kept.at(-1)) + 1), exponent };
}

function trim(digits: string, exponent: number): { digits: string; exponent: number } {
  return { digits: digits.replace(/0+$/, '') || '0', exponent };
}
