import { cell } from './cells.js';

/**
 * Increments e^(A·h/2^k) − 1 for k = 0, 1, …: of a whole step, of half of it, and so on. Kept without the 1, so that small steps keep
 * their digits. Row by row.
 */
export type Ladder = readonly Float64Array[];

/** Finer than this share of a step nothing is asked: 2^−30. */
const RUNGS = 30;
/** Largest norm the series is summed at, and its terms: the next one is below 1e-16. */
const SMALL = 1 / 16;
const TERMS = 10;

/**
 * Matrix exponentials of a step and all its halves, by scaling and squaring: (1 + X)² − 1 = 2X + X².
 * @param matrix square, row by row, 1/s
 * @param step s
 * @returns dimensionless, at least down to 2^−30 of the step
 * @example exponentials(Float64Array.of(-1), 1)[0] is e^−1 − 1
 * Source: Moler & Van Loan, Nineteen dubious ways to compute the exponential of a matrix, SIAM Review 20(4), 1978 (from memory).
 */
export function exponentials(matrix: Float64Array, step: number): Ladder {
  const size = Math.sqrt(matrix.length);
  const halvings = Math.max(RUNGS, Math.ceil(Math.log2((norm(matrix, size) * step) / SMALL)));
  let increment = series(matrix.map((value) => (value * step) / 2 ** halvings), size);
  const ladder = [increment];
  for (let k = 0; k < halvings; k += 1) {
    const square = product(increment, increment, size);
    increment = increment.map((value, at) => 2 * value + cell(square, at));
    ladder.push(increment);
  }
  return ladder.reverse();
}

/**
 * A state after one step: x + increment·x.
 * @param increment of exponentials()
 * @param state as long as a row of it
 * @returns state, in its units
 * @example stepped(Float64Array.of(-0.5), Float64Array.of(2)) is 1
 * Source: definition.
 */
export function stepped(increment: Float64Array, state: Float64Array): Float64Array {
  const size = state.length;
  const next = new Float64Array(size);
  for (let row = 0; row < size; row += 1) {
    let sum = 0;
    for (let at = 0; at < size; at += 1) sum += cell(increment, row * size + at) * cell(state, at);
    next[row] = cell(state, row) + sum;
  }
  return next;
}

/** X + X²/2 + X³/6 + …, summed from the last term (Horner). */
function series(x: Float64Array, size: number): Float64Array {
  let sum = new Float64Array(x.length);
  for (let term = TERMS; term >= 1; term -= 1) {
    const inner = product(x, sum, size);
    sum = x.map((value, at) => (value + cell(inner, at)) / term);
  }
  return sum;
}

function product(one: Float64Array, other: Float64Array, size: number): Float64Array {
  const result = new Float64Array(size * size);
  for (let i = 0; i < size; i += 1) {
    for (let k = 0; k < size; k += 1) {
      const value = cell(one, i * size + k);
      for (let j = 0; j < size; j += 1) result[i * size + j] = cell(result, i * size + j) + value * cell(other, k * size + j);
    }
  }
  return result;
}

/** Largest sum of a row's magnitudes. */
function norm(matrix: Float64Array, size: number): number {
  let most = 0;
  for (let row = 0; row < size; row += 1) most = Math.max(most, matrix.subarray(row * size, (row + 1) * size).reduce((sum, value) => sum + Math.abs(value), 0));
  return most;
}
