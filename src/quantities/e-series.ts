/** Preferred values of IEC 60063:2015, one decade. */
export const E12: readonly number[] = [1.0, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 3.9, 4.7, 5.6, 6.8, 8.2];

/** 2.7 3.0 3.3 3.6 3.9 4.3 4.7 and 8.2 are the standard's own; the rounded powers 10^(i/24) would be 2.6 2.9 3.2 3.5 3.8 4.2 4.6 8.3. */
export const E24: readonly number[] = [
  1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2, 9.1,
];

/** 10^(i/96) rounded to two decimals, without exception. */
export const E96: readonly number[] = [
  1.0, 1.02, 1.05, 1.07, 1.1, 1.13, 1.15, 1.18, 1.21, 1.24, 1.27, 1.3, 1.33, 1.37, 1.4, 1.43, 1.47, 1.5, 1.54, 1.58, 1.62, 1.65, 1.69, 1.74,
  1.78, 1.82, 1.87, 1.91, 1.96, 2.0, 2.05, 2.1, 2.15, 2.21, 2.26, 2.32, 2.37, 2.43, 2.49, 2.55, 2.61, 2.67, 2.74, 2.8, 2.87, 2.94, 3.01, 3.09,
  3.16, 3.24, 3.32, 3.4, 3.48, 3.57, 3.65, 3.74, 3.83, 3.92, 4.02, 4.12, 4.22, 4.32, 4.42, 4.53, 4.64, 4.75, 4.87, 4.99, 5.11, 5.23, 5.36, 5.49,
  5.62, 5.76, 5.9, 6.04, 6.19, 6.34, 6.49, 6.65, 6.81, 6.98, 7.15, 7.32, 7.5, 7.68, 7.87, 8.06, 8.25, 8.45, 8.66, 8.87, 9.09, 9.31, 9.53, 9.76,
];

/** Mantissa i of E192: 10^(i/192) rounded to two decimals, with the single exception i = 185, 9.20 where the rounded power is 9.19. */
export function e192Mantissa(index: number): number {
  if (!Number.isInteger(index) || index < 0 || index > 191) throw new RangeError(`E192 has the mantissas 0..191, not ${index}`);
  return index === 185 ? 9.2 : Math.round(10 ** (index / 192) * 100) / 100;
}

/** The E96 value nearest in ratio, in the unit of the argument: 12345 gives 12400. Throws RangeError unless positive and finite. */
export function nearestE96(value: number): number {
  return nearestIn(E96, value);
}

/** The E24 value nearest in ratio, in the unit of the argument. Throws RangeError unless positive and finite. */
export function nearestE24(value: number): number {
  return nearestIn(E24, value);
}

/** The values of one decade of a series (`E24`, `E96`) in the decade of a value and those beside it, in the unit of the value. */
export function seriesAround(series: readonly number[], value: number): number[] {
  const decade = Math.floor(Math.log10(value));
  return [decade - 1, decade, decade + 1].flatMap((power) => series.map((mantissa) => Number(`${mantissa}e${power}`)));
}

/** The value of a series nearest in ratio, in the unit of the argument. Throws RangeError unless positive and finite. */
export function nearestIn(series: readonly number[], value: number): number {
  if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`preferred values are positive; ${value} has none`);
  const distance = (candidate: number): number => Math.abs(Math.log(candidate / value));
  return seriesAround(series, value).reduce((best, candidate) => (distance(candidate) < distance(best) ? candidate : best));
}
