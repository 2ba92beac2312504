import { describe, expect, it } from 'vitest';
import { largerIsBetter, smallerIsBetter, twoSided, weightedGeometricMean } from '../../src/formulas/desirability.js';
import { example, refuses } from '../support/examples.js';

describe('desirability', () => {
  example('largerIsBetter', () => largerIsBetter({ value: 1.3, worst: 1, target: 1.5 }), 0.6);
  example('smallerIsBetter', () => smallerIsBetter({ value: 0.4, worst: 1, target: 0 }), 0.6);
  const plateau = { low: 2, target: 4, high: 8, rise: 2 };
  example('twoSided, rising', () => twoSided({ ...plateau, value: 3 }), 0.25);
  example('twoSided, falling', () => twoSided({ ...plateau, value: 5 }), 0.75);
  const equal = [0.6, 1, 0.4].map((score) => ({ score, weight: 1 }));
  example('weightedGeometricMean', () => weightedGeometricMean(equal), 0.621447);
  it('gives nothing for excess and nothing below the worst', () => {
    const scale = { worst: 1, target: 1.5 };
    expect([0, 1, 1.5, 20].map((value) => largerIsBetter({ ...scale, value }))).toEqual([0, 0, 1, 1]);
    expect([1, 2, 8, 9].map((value) => twoSided({ ...plateau, value }))).toEqual([0, 0, 0, 0]);
  });
  it('lets a zero decide, unless it has no weight', () => {
    expect(weightedGeometricMean([{ score: 0, weight: 1 }, { score: 1, weight: 9 }])).toBe(0);
    expect(weightedGeometricMean([{ score: 0, weight: 0 }, { score: 1, weight: 9 }])).toBe(1);
  });
  refuses(
    () => largerIsBetter({ value: 1, worst: 2, target: 2 }),
    'largerIsBetter: distance from worst to target must be finite, above 0, but is 0',
  );
  refuses(
    () => smallerIsBetter({ value: 1, worst: 1, target: 2 }),
    'smallerIsBetter: distance from worst to target must be finite, above 0, but is -1',
  );
  refuses(() => twoSided({ ...plateau, value: NaN }), 'smallerIsBetter: value must be finite, but is NaN');
  refuses(
    () => weightedGeometricMean([{ score: 1.2, weight: 1 }]),
    'weightedGeometricMean: score must be finite, at least 0, at most 1, but is 1.2',
  );
  refuses(() => weightedGeometricMean([]), 'weightedGeometricMean: sum of weights must be finite, above 0, but is 0');
});
