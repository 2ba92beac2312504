import { divide, type Complex } from '../formulas/complex.js';
import { cell } from '../formulas/cells.js';

export type Vector = readonly number[];
/** Row by row. */
export type Matrix = readonly Vector[];

export const zeros = (size: number): number[] => new Array<number>(size).fill(0);
export const unitVector = (size: number, at: number): number[] => zeros(size).map((_, k) => (k === at ? 1 : 0));
export const dot = (one: Vector, other: Vector): number => one.reduce((sum, value, at) => sum + value * (other[at] ?? 0), 0);
export const times = (matrix: Matrix, vector: Vector): number[] => matrix.map((row) => dot(row, vector));
/** Every row of the one against every row of the other: one · otherᵀ. */
export const against = (one: Matrix, other: Matrix): number[][] => one.map((row) => times(other, row));
export const transposed = (matrix: Matrix, width: number): number[][] => zeros(width).map((_, column) => matrix.map((row) => row[column] ?? 0));

/** The columns of a linear function, by what it makes of each unit vector; as rows of a matrix. */
export function matrixOf(size: number, linear: (vector: Vector) => Vector): number[][] {
  const columns = zeros(size).map((_, at) => linear(unitVector(size, at)));
  return transposed(columns, columns[0]?.length ?? 0);
}

/**
 * x of (jω·1 − matrix)·x = right, by elimination with the largest pivot of each column (any text on numerical analysis).
 * @param omega rad/s
 * @returns null when there is no one answer: a pole stands exactly there
 */
export function steadyState(matrix: Matrix, right: readonly Complex[], omega: number): Complex[] | null {
  const system = emptySystem(matrix.length);
  const { size, width, re, im } = system;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) re[row * width + column] = -(matrix[row]?.[column] ?? 0);
    im[row * width + row] = omega;
    re[row * width + size] = right[row]?.re ?? 0;
    im[row * width + size] = right[row]?.im ?? 0;
  }
  return solve(system);
}

/** x of matrix·x = right, real; null when singular. */
export function solveReal(matrix: Matrix, right: Vector): number[] | null {
  const system = emptySystem(matrix.length);
  const { size, width, re } = system;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) re[row * width + column] = matrix[row]?.[column] ?? 0;
    re[row * width + size] = right[row] ?? 0;
  }
  return solve(system)?.map((value) => value.re) ?? null;
}

/** Equations row by row, the right side as their last column. Two arrays of numbers: thousands of these are solved for one band. */
interface System {
  readonly size: number;
  readonly width: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

function emptySystem(size: number): System {
  const width = size + 1;
  return { size, width, re: new Float64Array(size * width), im: new Float64Array(size * width) };
}

/** Smaller than this share of its row a pivot is rounding. */
const NOTHING = 1e-13;

const complexAt = ({ re, im }: System, at: number): Complex => ({ re: cell(re, at), im: cell(im, at) });

function solve(system: System): Complex[] | null {
  const { size, width, re, im } = system;
  /** Where each row starts, in the order of elimination. */
  const starts = Array.from({ length: size }, (_, row) => row * width);
  const sizes = starts.map((start) => largestIn(system, start));
  const weight = (at: number, column: number): number => Math.hypot(cell(re, startOf(starts, at) + column), cell(im, startOf(starts, at) + column)) / (sizes[startOf(starts, at) / width] ?? 1);
  for (let column = 0; column < size; column += 1) {
    let best = column;
    let most = weight(column, column);
    for (let at = column + 1; at < size; at += 1) {
      const next = weight(at, column);
      if (next > most) [best, most] = [at, next];
    }
    if (!(most > NOTHING)) return null;
    [starts[column], starts[best]] = [startOf(starts, best), startOf(starts, column)];
    for (let at = column + 1; at < size; at += 1) eliminate(system, { row: startOf(starts, at), pivot: startOf(starts, column), column });
  }
  return backwards(system, starts);
}

const startOf = (starts: readonly number[], at: number): number => starts[at] ?? 0;

/** Largest magnitude among the coefficients of a row. */
function largestIn({ size, re, im }: System, start: number): number {
  let largest = -Infinity;
  for (let at = start; at < start + size; at += 1) largest = Math.max(largest, Math.hypot(cell(re, at), cell(im, at)));
  return largest;
}

function eliminate(system: System, { row, pivot, column }: { readonly row: number; readonly pivot: number; readonly column: number }): void {
  const { width, re, im } = system;
  const factor = divide(complexAt(system, row + column), complexAt(system, pivot + column));
  if (factor.re === 0 && factor.im === 0) return;
  for (let at = column; at < width; at += 1) {
    const [a, b] = [cell(re, pivot + at), cell(im, pivot + at)];
    re[row + at] = cell(re, row + at) - (factor.re * a - factor.im * b);
    im[row + at] = cell(im, row + at) - (factor.re * b + factor.im * a);
  }
}

function backwards(system: System, starts: readonly number[]): Complex[] {
  const { size, re, im } = system;
  const found: Complex[] = [];
  for (let at = size - 1; at >= 0; at -= 1) {
    const start = startOf(starts, at);
    const known = { re: 0, im: 0 };
    for (let k = at + 1; k < size; k += 1) {
      const [a, b, value] = [cell(re, start + k), cell(im, start + k), found[k] ?? ZERO];
      known.re += a * value.re - b * value.im;
      known.im += a * value.im + b * value.re;
    }
    const right = complexAt(system, start + size);
    found[at] = divide({ re: right.re - known.re, im: right.im - known.im }, complexAt(system, start + at));
  }
  return found;
}

const ZERO: Complex = { re: 0, im: 0 };
