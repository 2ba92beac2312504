import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { averageSineDissipation, averageSourced, restingDissipation, worstRestingDissipation, worstSineDissipation } from '../../src/formulas/dissipation.js';
import { sineDissipation } from '../../src/formulas/power.js';
import { example, refuses } from '../support/examples.js';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('dissipation of an output', () => {
  example('worstRestingDissipation(…), 1 kΩ to ground', () => worstRestingDissipation(5, { volts: 0, amperes: 0 }, { volts: 5, amperes: 5e-3 }), 6.25e-3);
  example('worstRestingDissipation(…), 1 kΩ to mid-supply', () => worstRestingDissipation(5, { volts: 0, amperes: -2.5e-3 }, { volts: 5, amperes: 2.5e-3 }), 1.5625e-3);
  example('restingDissipation(5, {volts: 1, amperes: -2e-3})', () => restingDissipation(5, { volts: 1, amperes: -2e-3 }), 2e-3);
  example('averageSourced(0, 1e-3)', () => averageSourced(0, 1e-3), 318.31e-6);
  example('averageSineDissipation(…) about 2.5 V into 1 kΩ to ground', () => averageSineDissipation({ supply: 5, level: 2.5, current: 2.5e-3, conductance: 1e-3 }, 1), 5.75e-3);
  example('worstSineDissipation(…), VS²/(2π²RL),', () => worstSineDissipation({ supply: 5, level: 2.5, current: 0, conductance: 1e-3 }, 2.5), 25 / (2 * Math.PI ** 2 * 1e3));

  it('is the largest of a fine search between the two points', () => {
    fc.assert(
      fc.property(number(0, 5), number(-0.01, 0.01), number(0, 5), number(-0.01, 0.01), (v0, i0, v1, i1) => {
        const searched = Math.max(
          ...Array.from({ length: 2001 }, (_none, k) => restingDissipation(5, { volts: v0 + ((v1 - v0) * k) / 2000, amperes: i0 + ((i1 - i0) * k) / 2000 })),
        );
        const worst = worstRestingDissipation(5, { volts: v0, amperes: i0 }, { volts: v1, amperes: i1 });
        expect(worst).toBeGreaterThanOrEqual(searched - 1e-12);
        expect(worst).toBeLessThanOrEqual(searched + 1e-6);
      }),
    );
  });

  it('averages as a numeric integral does, whatever the load rests at', () => {
    fc.assert(
      fc.property(number(-0.005, 0.005), number(0, 2.4), (current, peak) => {
        const load = { supply: 5, level: 2.5, current, conductance: 1e-3 };
        const points = 4000;
        let [watts, sourced] = [0, 0];
        for (let k = 0; k < points; k += 1) {
          const wave = peak * Math.sin((2 * Math.PI * (k + 0.5)) / points);
          const amperes = current + 1e-3 * wave;
          watts += (amperes >= 0 ? (5 - 2.5 - wave) * amperes : (2.5 + wave) * -amperes) / points;
          sourced += Math.max(0, amperes) / points;
        }
        expect(averageSineDissipation(load, peak)).toBeCloseTo(watts, 7);
        expect(averageSourced(current, 1e-3 * peak)).toBeCloseTo(sourced, 8);
      }),
    );
    expect(averageSineDissipation({ supply: 5, level: 2, current: 2e-3, conductance: 1e-3 }, 1.5)).toBeCloseTo(sineDissipation({ supply: 5, level: 2, peak: 1.5, load: 1e3 }), 12);
  });

  it('is worst at the amplitude a fine search finds', () => {
    fc.assert(
      fc.property(number(-0.002, 0.002), number(0, 2.5), (current, peak) => {
        const load = { supply: 5, level: 2.5, current, conductance: 1e-3 };
        const searched = Math.max(...Array.from({ length: 1001 }, (_none, k) => averageSineDissipation(load, (peak * k) / 1000)));
        expect(worstSineDissipation(load, peak)).toBeGreaterThanOrEqual(searched - 1e-12);
        expect(worstSineDissipation(load, peak)).toBeLessThanOrEqual(searched + 1e-7);
      }),
    );
  });

  refuses(() => averageSourced(0, -1), 'averageSourced: swing must be finite, at least 0, but is -1');
  refuses(() => worstRestingDissipation(0, { volts: 0, amperes: 0 }, { volts: 1, amperes: 0 }), 'worstRestingDissipation: supply must be finite, above 0, but is 0');
});
