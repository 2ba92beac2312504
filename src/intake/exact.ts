/**
 * The shortest decimal text that is exactly this number when read in units of 10^exponent: `exactDecimal(8.5e-5, -6)` is `85`.
 * Never an exponent, because a cell with an exponent under a prefixed header unit would carry two scale factors.
 */
export function exactDecimal(value: number, exponent: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`only finite numbers can be written, not ${value}`);
  if (value === 0) return '0';
  const [mantissa = '', power = '0'] = Math.abs(value).toExponential().split('e');
  const digits = mantissa.replace('.', '');
  const point = Number(power) + 1 - exponent;
  return (value < 0 ? '-' : '') + placePoint(digits, point);
}

/** The same with the engineering prefix that leaves one to three digits before the point: `2.2 kΩ`, `1 mA`. */
export function exactQuantity(value: number, unit: string): string {
  const power = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)) / 3) * 3;
  const exponent = Math.min(9, Math.max(-15, power));
  return `${exactDecimal(value, exponent)} ${PREFIXES[exponent / 3 + 5] ?? ''}${unit}`;
}

const PREFIXES = ['f', 'p', 'n', 'µ', 'm', '', 'k', 'M', 'G'] as const;

function placePoint(digits: string, point: number): string {
  if (point <= 0) return `0.${'0'.repeat(-point)}${digits}`;
  if (point >= digits.length) return digits + '0'.repeat(point - digits.length);
  return `${digits.slice(0, point)}.${digits.slice(point)}`;
}
