import { describe, expect, it } from 'vitest';
import { slewingEquations } from '../../src/formulas/slewing-equations.js';

const polynomial = (a: number, b = 0, c = 0) => ({ gain: 1, a, b, c });

describe('a slewing stage as first-order equations', () => {
  it('of one pole is v\' = −v/τ within the limit, and −SR at it', () => {
    const { matrix, wanted, start, error } = slewingEquations({ actual: polynomial(2), ideal: polynomial(0), slewRate: 0.1 });
    expect([[...wanted], [...start], error]).toEqual([[0.5, 0], [1, 1], 0]);
    expect([[...matrix(0)], [...matrix(1)], [...matrix(-1)]]).toEqual([[-0.5, -0, 0, 0], [0, -0.1, 0, 0], [0, 0.1, 0, 0]]);
  });

  it('within the limit has the characteristic polynomial of the stage', () => {
    // Trace and determinant of the part without the constant: −(sum) and product of the poles of 1 + a·s + b·s² + c·s³.
    const [a, b, c] = [1.5, 0.8, 0.1];
    const m = slewingEquations({ actual: polynomial(a, b, c), ideal: polynomial(1.4, 0.7), slewRate: 1 }).matrix(0);
    const at = (row: number, column: number): number => m[row * 4 + column]!;
    const minor = (i: number, j: number): number => at(i, i) * at(j, j) - at(i, j) * at(j, i);
    expect(at(0, 0) + at(1, 1) + at(2, 2)).toBeCloseTo(-b / c, 9);
    expect(minor(0, 1) + minor(0, 2) + minor(1, 2)).toBeCloseTo(a / c, 9);
    const determinant = at(0, 0) * minor(1, 2) - at(0, 1) * (at(1, 0) * at(2, 2) - at(1, 2) * at(2, 0)) + at(0, 2) * (at(1, 0) * at(2, 1) - at(1, 1) * at(2, 0));
    expect(determinant).toBeCloseTo(-1 / c, 9);
  });

  it('starts at rest: an amplifier behind a network wants no slope at first', () => {
    const { wanted, start } = slewingEquations({ actual: polynomial(1.1, 0.2), ideal: polynomial(1), slewRate: 1 });
    expect(wanted.reduce((sum, weight, k) => sum + weight * start[k]!, 0)).toBeCloseTo(0, 12);
  });

  it('refuses an endless amplifier', () => {
    expect(() => slewingEquations({ actual: polynomial(1), ideal: polynomial(1), slewRate: 1 })).toThrow(/lag of the amplifier/u);
  });
});
