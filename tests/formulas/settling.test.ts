import { describe, expect, it } from 'vitest';
import { bandwidthForSettling, riseTime, settlingTime, slewRateForEdge, slewRateForSettling } from '../../src/formulas/settling.js';
import { example, refuses } from '../support/examples.js';

describe('settling', () => {
  const step = { step: 2, slewRate: 633e3, timeConstant: 795.7747e-9, tolerance: 1e-3 };
  example('settlingTime of 2 V at 633 kV/s to 0.1 %', () => settlingTime(step), 6.7635e-6);
  example('settlingTime that only slews', () => settlingTime({ ...step, timeConstant: 1e-10, tolerance: 0.1 }), 1.8 / 633e3);
  const slow = { step: 4, timeConstant: 159.15494e-9, tolerance: 2 ** -13 };
  example('slewRateForSettling of 4 V in 3 µs', () => slewRateForSettling({ ...slow, time: 3e-6 }), 1.87047e6);
  example('riseTime without slewing', () => riseTime({ step: 0.1, slewRate: 1e6, timeConstant: 1e-6 }), 2.1972e-6);
  example('riseTime that only slews', () => riseTime({ step: 10, slewRate: 1e6, timeConstant: 1e-9 }), 8e-6);
  example('bandwidthForSettling(1e-6, 2 ** -13)', () => bandwidthForSettling(1e-6, 2 ** -13), 1.43413e6);

  it('meets the time it was asked for, and not with a millionth less', () => {
    for (const time of [1.5e-6, 3e-6, 20e-6]) {
      const slewRate = slewRateForSettling({ ...slow, time });
      expect(settlingTime({ ...slow, slewRate })).toBeLessThanOrEqual(time);
      expect(settlingTime({ ...slow, slewRate: slewRate * (1 - 1e-6) })).toBeGreaterThan(time);
    }
  });
  example('slewRateForEdge of a loop much faster than the edge', () => slewRateForEdge({ step: 4, time: 1e-6, timeConstant: 1e-12 }), 3.2e6);
  example('slewRateForEdge of a loop just fast enough: 0.9·ln 9', () => slewRateForEdge({ step: 4, time: 1e-6, timeConstant: 1e-6 / Math.log(9) }), 4 * 0.9 * Math.log(9) * 1e6);

  it('makes the edge it was asked for, and not with a millionth less', () => {
    for (const share of [1e-3, 0.1, 0.3, 0.44]) {
      const edge = { step: 4, timeConstant: share * 1e-6 };
      const slewRate = slewRateForEdge({ ...edge, time: 1e-6 });
      expect(riseTime({ ...edge, slewRate })).toBeLessThanOrEqual(1e-6 * (1 + 1e-11));
      expect(riseTime({ ...edge, slewRate: slewRate * (1 - 1e-6) })).toBeGreaterThan(1e-6);
    }
  });
  it('is continuous between its three pieces', () => {
    const at = (slewRate: number): number => settlingTime({ ...step, slewRate });
    const edges = [step.step / step.timeConstant, (step.step * step.tolerance) / step.timeConstant];
    for (const edge of edges) expect(at(edge * (1 + 1e-9)) / at(edge * (1 - 1e-9))).toBeCloseTo(1, 7);
  });

  refuses(() => settlingTime({ ...step, tolerance: 1 }), 'settlingTime: tolerance must be finite, above 0, below 1, but is 1');
  refuses(() => settlingTime({ ...step, slewRate: 0 }), 'settlingTime: slewRate must be finite, above 0, but is 0');
  refuses(
    () => slewRateForSettling({ step: 1, timeConstant: 1, tolerance: Math.exp(-4), time: 3 }),
    'slewRateForSettling: time must be finite, at least 4, but is 3',
  );
  refuses(() => riseTime({ step: 0, slewRate: 1, timeConstant: 1 }), 'settlingTime: step must be finite, above 0, but is 0');
  refuses(() => slewRateForEdge({ step: 1, time: 1, timeConstant: 1 }), `slewRateForEdge: time must be finite, at least ${Math.log(9)}, but is 1`);
  refuses(() => bandwidthForSettling(0, 0.1), 'bandwidthForSettling: time must be finite, above 0, but is 0');
});
