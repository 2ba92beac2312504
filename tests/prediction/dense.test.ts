import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dot, solveReal, steadyState } from '../../src/prediction/dense.js';

const number = fc.double({ min: -10, max: 10, noNaN: true });
const equations = fc.integer({ min: 1, max: 6 }).chain((size) => fc.record({ matrix: fc.array(fc.array(number, { minLength: size, maxLength: size }), { minLength: size, maxLength: size }), right: fc.array(number, { minLength: size, maxLength: size }) }));

describe('linear equations', () => {
  it('are met by what is found, in the rows they were given in', () => {
    fc.assert(fc.property(equations, ({ matrix, right }) => {
      // A heavy diagonal, in reverse order: never singular, and every column needs another pivot.
      const rows = matrix.map((row, at) => row.map((value, k) => (k === row.length - 1 - at ? value + 100 : value)));
      const found = solveReal(rows, right);
      if (found === null) throw new Error('no answer');
      for (const [at, row] of rows.entries()) expect(Math.abs(dot(row, found) - (right[at] ?? 0))).toBeLessThan(1e-11);
    }));
  });

  it('of a steady state are met too, real and imaginary part', () => {
    fc.assert(fc.property(equations, fc.double({ min: 100, max: 1e4, noNaN: true }), ({ matrix, right }, omega) => {
      const found = steadyState(matrix, right.map((re) => ({ re, im: -re })), omega);
      if (found === null) throw new Error('no answer');
      for (const [at, row] of matrix.entries()) {
        const own = found[at] ?? { re: NaN, im: NaN };
        const re = -omega * own.im - dot(row, found.map((value) => value.re));
        const im = omega * own.re - dot(row, found.map((value) => value.im));
        expect(Math.hypot(re - (right[at] ?? 0), im + (right[at] ?? 0))).toBeLessThan(1e-9);
      }
    }));
  });

  it('without one answer have none: rows alike, and a pole at the frequency asked', () => {
    expect(solveReal([[1, 2], [2, 4]], [1, 1])).toBeNull();
    expect(steadyState([[0, 3], [-3, 0]], [{ re: 1, im: 0 }, { re: 0, im: 0 }], 3)).toBeNull();
  });
});
