/** A complex number re + j·im, any unit. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/**
 * Sum of two complex numbers.
 * @param one any unit, finite
 * @param other same unit
 * @returns same unit
 * @example add({re: 1, im: 2}, {re: 3, im: -5}) is 4 − 3j
 * Source: definition.
 */
export function add(one: Complex, other: Complex): Complex {
  return { re: one.re + other.re, im: one.im + other.im };
}

/**
 * Difference of two complex numbers.
 * @param one any unit, finite
 * @param other same unit
 * @returns same unit
 * @example subtract({re: 1, im: 2}, {re: 3, im: -5}) is −2 + 7j
 * Source: definition.
 */
export function subtract(one: Complex, other: Complex): Complex {
  return { re: one.re - other.re, im: one.im - other.im };
}

/**
 * Product of two complex numbers.
 * @param one any unit, finite
 * @param other any unit, finite
 * @returns product of the units
 * @example multiply({re: 1, im: 2}, {re: 3, im: -5}) is 13 + 1j
 * Source: definition.
 */
export function multiply(one: Complex, other: Complex): Complex {
  return { re: one.re * other.re - one.im * other.im, im: one.re * other.im + one.im * other.re };
}

/**
 * Quotient of two complex numbers, without overflow in between.
 * @param one any unit, finite
 * @param other any unit, finite, not 0
 * @returns quotient of the units
 * @example divide({re: 13, im: 1}, {re: 3, im: -5}) is 1 + 2j
 * Source: Smith, Algorithm 116: Complex division, Communications of the ACM 5(8), 1962 (from memory).
 * @throws RangeError when dividing by 0.
 */
export function divide(one: Complex, other: Complex): Complex {
  if (other.re === 0 && other.im === 0) throw new RangeError('divide: other must not be 0');
  if (Math.abs(other.re) >= Math.abs(other.im)) {
    const ratio = other.im / other.re;
    const scale = other.re + other.im * ratio;
    return { re: (one.re + one.im * ratio) / scale, im: (one.im - one.re * ratio) / scale };
  }
  const ratio = other.re / other.im;
  const scale = other.re * ratio + other.im;
  return { re: (one.re * ratio + one.im) / scale, im: (one.im * ratio - one.re) / scale };
}

/**
 * Absolute value of a complex number.
 * @param value any unit
 * @returns same unit, at least 0
 * @example magnitude({re: 3, im: -4}) is 5
 * Source: definition.
 */
export function magnitude(value: Complex): number {
  return Math.hypot(value.re, value.im);
}

/**
 * Angle of a complex number, above −180 and up to 180; 0 for the number 0.
 * @param value any unit
 * @returns degrees
 * @example phase({re: 0, im: -2}) is −90
 * Source: definition.
 */
export function phase(value: Complex): number {
  return (Math.atan2(value.im, value.re) * 180) / Math.PI;
}
