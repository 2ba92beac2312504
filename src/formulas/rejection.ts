import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Worst common-mode rejection that four resistors of ±t leave a difference stage with an ideal amplifier: (1+G)/(4t).
 * @param gain G, above 0
 * @param tolerance fraction, above 0 and below 1; exact to second order in t
 * @returns V/V
 * @example resistorLimitedRejection(1, 0.001) is 500 (54 dB)
 * Source: Pallàs-Areny & Webster, Common mode rejection ratio in differential amplifiers, IEEE Trans. Instrum. Meas. 40(4), 1991 (from memory).
 */
export function resistorLimitedRejection(gain: number, tolerance: number): number {
  requirePositive('resistorLimitedRejection', { gain });
  requireWithin('resistorLimitedRejection', { tolerance }, { above: 0, below: 1 });
  return (1 + gain) / (4 * tolerance);
}

/**
 * Common-mode rejection of a difference stage with given resistors: (R1·R4 + R2·R3 + 2·R2·R4)/(2·|R1·R4 − R2·R3|).
 * Infinity when the ratios are equal.
 * @param resistors r1 and r2 input and feedback of the − side, r3 and r4 input and reference of the + side; Ω, above 0
 * @returns V/V
 * @example rejectionOfResistors({r1: 1, r2: 1, r3: 1, r4: 1.02}) is 101.5
 * Source: Pallàs-Areny & Webster (1991) (from memory).
 */
export function rejectionOfResistors(resistors: {
  readonly r1: number;
  readonly r2: number;
  readonly r3: number;
  readonly r4: number;
}): number {
  const { r1, r2, r3, r4 } = resistors;
  requirePositive('rejectionOfResistors', { r1, r2, r3, r4 });
  return (r1 * r4 + r2 * r3 + 2 * r2 * r4) / (2 * Math.abs(r1 * r4 - r2 * r3));
}

/**
 * Worst case of several rejections at once: the reciprocals add.
 * @param rejections V/V, each above 0
 * @returns V/V
 * @example combinedRejection([500, 10e3]) is 476.2
 * Source: Pallàs-Areny & Webster (1991) (from memory).
 */
export function combinedRejection(rejections: readonly number[]): number {
  const leaks = rejections.map((rejection) => {
    requirePositive('combinedRejection', { rejection });
    return 1 / rejection;
  });
  return 1 / leaks.reduce((sum, leak) => sum + leak, 0);
}

/**
 * What a common mode leaves at the input: |ΔV|/CMRR; the same for supplies with PSRR and for the output with A0.
 * @param change V, magnitude, at least 0
 * @param rejection V/V, above 0
 * @returns V
 * @example leakThrough(12, 476.19) is 25.2 mV
 * Source: definition of the rejection ratio.
 */
export function leakThrough(change: number, rejection: number): number {
  requireNotNegative('leakThrough', { change });
  requirePositive('leakThrough', { rejection });
  return change / rejection;
}

/**
 * Rejection of a supply (or common mode) that moves at a frequency: R/√(1 + (f/fc)²), flat below its corner and −20 dB per decade above.
 * @param rejection R at DC, V/V, above 0
 * @param at frequency Hz, at least 0; corner fc Hz, above 0; Infinity: it does not fall
 * @returns V/V
 * @example rejectionAbove(10e3, {frequency: 10e3, corner: 100}) is 99.995 (40 dB)
 * Source: one pole, as the open-loop gain; Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 5 (from memory).
 */
export function rejectionAbove(rejection: number, { frequency, corner }: { readonly frequency: number; readonly corner: number }): number {
  requirePositive('rejectionAbove', { rejection });
  requireNotNegative('rejectionAbove', { frequency });
  if (corner === Infinity) return rejection;
  requirePositive('rejectionAbove', { corner });
  return rejection / Math.hypot(1, frequency / corner);
}
