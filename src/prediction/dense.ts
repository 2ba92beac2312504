import { add, divide, magnitude, multiply, subtract, type Complex } from '../formulas/complex.js';

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

const real = (value: number): Complex => ({ re: value, im: 0 });

/**
 * x of (jω·1 − matrix)·x = right, by elimination with the largest pivot of each column (any text on numerical analysis).
 * @param omega rad/s
 * @returns null when there is no one answer: a pole stands exactly there
 */
export function steadyState(matrix: Matrix, right: readonly Complex[], omega: number): Complex[] | null {
  return solve(matrix.map((row, i) => row.map((value, j) => ({ re: -value, im: i === j ? omega : 0 }))), right);
}

/** x of matrix·x = right, real; null when singular. */
export function solveReal(matrix: Matrix, right: Vector): number[] | null {
  return solve(matrix.map((row) => row.map(real)), right.map(real))?.map(({ re }) => re) ?? null;
}

/** Smaller than this share of its row a pivot is rounding. */
const NOTHING = 1e-13;

function solve(matrix: readonly (readonly Complex[])[], right: readonly Complex[]): Complex[] | null {
  const rows = matrix.map((row, at) => [...row, right[at] ?? real(0)]);
  const sizes = matrix.map((row) => Math.max(...row.map(magnitude)));
  const order = rows.map((_, at) => at);
  for (let column = 0; column < rows.length; column += 1) {
    const weight = (at: number): number => magnitude(rows[order[at] ?? 0]?.[column] ?? real(0)) / (sizes[order[at] ?? 0] ?? 1);
    let best = column;
    for (let at = column + 1; at < rows.length; at += 1) if (weight(at) > weight(best)) best = at;
    if (!(weight(best) > NOTHING)) return null;
    [order[column], order[best]] = [order[best] ?? 0, order[column] ?? 0];
    const pivot = rows[order[column] ?? 0] ?? [];
    for (let at = column + 1; at < rows.length; at += 1) eliminate(rows[order[at] ?? 0] ?? [], pivot, column);
  }
  return backwards(order.map((at) => rows[at] ?? []));
}

function eliminate(row: Complex[], pivot: readonly Complex[], column: number): void {
  const factor = divide(row[column] ?? real(0), pivot[column] ?? real(1));
  if (factor.re === 0 && factor.im === 0) return;
  for (let at = column; at < row.length; at += 1) row[at] = subtract(row[at] ?? real(0), multiply(factor, pivot[at] ?? real(0)));
}

function backwards(rows: readonly (readonly Complex[])[]): Complex[] {
  const found = rows.map(() => real(0));
  for (let at = rows.length - 1; at >= 0; at -= 1) {
    const row = rows[at] ?? [];
    const known = found.reduce((sum, value, k) => (k > at ? add(sum, multiply(row[k] ?? real(0), value)) : sum), real(0));
    found[at] = divide(subtract(row.at(-1) ?? real(0), known), row[at] ?? real(1));
  }
  return found;
}
