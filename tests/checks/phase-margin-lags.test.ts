import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { highestCrossover, lagsOf, lowestCrossover, marginThere } from '../../src/checks/phase-margin-lags.js';
import { marginAt, type Loop } from '../../src/checks/phase-margin-loop.js';
import { opened } from '../../src/checks/phase-margin-opened.js';
import { divider, GROUNDED } from '../formulas/networks.js';
import { gainBandwidths, laggingLoops } from '../support/arbitrary-loop.js';

const BARE: Loop = { network: { plus: GROUNDED, minus: divider(70e3, 10e3) }, open: null, inputCapacitance: 0, ownPole: Infinity, load: null };

describe('the lags of a loop', () => {
  it('are the share of the divider, its resistors in parallel at the capacitance, the load at the output resistance, and the pole of the part', () => {
    const loop: Loop = { ...BARE, inputCapacitance: 3e-12, stray: 2e-12, ownPole: 4e6, load: { outputResistance: 200, capacitance: 1e-9, resistance: 200, isolation: 0 } };
    const { share, input, load, own } = lagsOf(loop)!;
    expect(share).toBeCloseTo(1 / 8, 15);
    expect(input / (2 * Math.PI * 8.75e3 * 5e-12)).toBeCloseTo(1, 12);
    expect(load / (2 * Math.PI * 100 * 1e-9)).toBeCloseTo(1, 12);
    expect(own).toBe(1 / 4e6);
    expect(lagsOf(BARE)).toEqual({ share, input: 0, load: 0, own: 0 });
  });

  it('are the loop: at its crossover they leave the margin it has, which lies between its bounds and leaves no more and no less there', () => {
    fc.assert(
      fc.property(laggingLoops, gainBandwidths, (loop, { most }) => {
        const lags = lagsOf(loop);
        const parts = opened(loop).partsAt(most);
        if (parts === null || lags === null) throw new Error('a loop that only lags has both');
        expect(marginThere(lags, parts.crossover)).toBeCloseTo(marginAt(loop, most), 6);
        const [high, low] = [highestCrossover(lags, most), lowestCrossover(lags, most)];
        expect(high).toBeGreaterThanOrEqual(parts.crossover);
        expect(low).toBeLessThanOrEqual(parts.crossover * (1 + 1e-9));
        expect(marginThere(lags, high)).toBeLessThanOrEqual(marginAt(loop, most) + 1e-6);
        expect(marginThere(lags, low)).toBeGreaterThanOrEqual(marginAt(loop, most) - 1e-6);
      }),
      { numRuns: 1000 },
    );
  });
});
