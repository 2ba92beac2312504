import { describe, expect, it } from 'vitest';
import { GAUSS_WEIGHTS, halvedPanel, KRONROD_NODES, KRONROD_WEIGHTS, PANEL_POINTS, panelIntegral } from '../../src/formulas/gauss-kronrod.js';

describe('Gauss–Kronrod panel', () => {
  it('integrates the example', () => {
    const { integral, difference } = panelIntegral(KRONROD_NODES.map((x) => x ** 4), 2);
    expect(integral).toBeCloseTo(0.4, 15);
    expect(difference).toBeLessThan(1e-15);
  });
  it('is exact up to degree 23, the rule inside it up to 13, and neither beyond', () => {
    const rule = (weights: readonly number[], degree: number): number => weights.reduce((sum, weight, i) => sum + weight * KRONROD_NODES[i]! ** degree, 0);
    for (let degree = 0; degree <= 22; degree += 2) expect(rule(KRONROD_WEIGHTS, degree)).toBeCloseTo(2 / (degree + 1), 14);
    for (let degree = 0; degree <= 12; degree += 2) expect(rule(GAUSS_WEIGHTS, degree)).toBeCloseTo(2 / (degree + 1), 14);
    for (let degree = 1; degree <= 23; degree += 2) expect(rule(KRONROD_WEIGHTS, degree)).toBeCloseTo(0, 14);
    expect(Math.abs(rule(KRONROD_WEIGHTS, 24) - 2 / 25)).toBeGreaterThan(1e-9);
    expect(Math.abs(rule(GAUSS_WEIGHTS, 14) - 2 / 15)).toBeGreaterThan(1e-5);
    expect(KRONROD_NODES).toEqual([...KRONROD_NODES].sort((one, other) => one - other));
  });
  it('tells the error of the rule inside it', () => {
    const { integral, difference } = panelIntegral(KRONROD_NODES.map((x) => 1 / (1 + 25 * x * x)), 2);
    expect(Math.abs(integral - (2 / 5) * Math.atan(5))).toBeLessThan(difference);
  });
  it('halves a panel with the polynomial through its points', () => {
    expect(halvedPanel(Float64Array.from(KRONROD_NODES), 0)[7]).toBeCloseTo(-0.5, 14);
    const other = Float64Array.from([...KRONROD_NODES, ...KRONROD_NODES], (x, i) => (i < PANEL_POINTS ? 0 : x ** 14));
    const halves = halvedPanel(other, PANEL_POINTS);
    KRONROD_NODES.forEach((x, i) => {
      expect(halves[i]).toBeCloseTo(((x - 1) / 2) ** 14, 12);
      expect(halves[i + PANEL_POINTS]).toBeCloseTo(((x + 1) / 2) ** 14, 12);
    });
  });
});
