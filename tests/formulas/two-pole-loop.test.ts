import { describe, expect, it } from 'vitest';
import {
  qOfPhaseMargin,
  secondPoleForPhaseMargin,
  twoPoleCrossover,
  twoPolePhaseMargin,
  twoPoleQ,
} from '../../src/formulas/two-pole-loop.js';
import { example, refuses } from '../support/examples.js';

describe('loop with a second pole', () => {
  example('twoPoleCrossover(1e6, 2e6)', () => twoPoleCrossover(1e6, 2e6), 910_180);
  example('twoPolePhaseMargin(1e6, 2e6)', () => twoPolePhaseMargin(1e6, 2e6), 65.5302);
  example('secondPoleForPhaseMargin(1e6, 45)', () => secondPoleForPhaseMargin(1e6, 45), 707_107);
  example('twoPoleQ(1e6, 1e6)', () => twoPoleQ(1e6, 1e6), 1);
  example('qOfPhaseMargin(45)', () => qOfPhaseMargin(45), 1.18921);
  it('holds together: pole → margin → pole, and both ways to Q', () => {
    for (const margin of [5, 30, 60, 89]) {
      const pole = secondPoleForPhaseMargin(1, margin);
      expect(twoPolePhaseMargin(1, pole)).toBeCloseTo(margin, 9);
      expect(twoPoleQ(1, pole)).toBeCloseTo(qOfPhaseMargin(margin), 9);
    }
  });
  it('leaves the crossover at fc when the second pole is far away', () => {
    expect(twoPoleCrossover(1, 1e9)).toBeCloseTo(1, 12);
  });
  refuses(() => twoPoleCrossover(0, 1), 'twoPoleCrossover: asymptote must be finite, above 0, but is 0');
  refuses(() => twoPolePhaseMargin(1, 0), 'twoPoleCrossover: secondPole must be finite, above 0, but is 0');
  refuses(
    () => secondPoleForPhaseMargin(1, 90),
    'secondPoleForPhaseMargin: phaseMargin must be finite, above 0, below 90, but is 90',
  );
  refuses(() => twoPoleQ(1, -1), 'twoPoleQ: secondPole must be finite, above 0, but is -1');
  refuses(() => qOfPhaseMargin(0), 'qOfPhaseMargin: phaseMargin must be finite, above 0, below 90, but is 0');
});
