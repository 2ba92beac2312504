import { describe, expect, it } from 'vitest';
import { sallenKey } from '../../src/formulas/filters.js';
import type { LowPass } from '../../src/formulas/low-pass-response.js';
import { secondOrderOvershoot } from '../../src/formulas/second-order.js';
import { settlingTime } from '../../src/formulas/settling.js';
import { stepError, stepPeakSlope, stepRiseTime, stepSettling } from '../../src/formulas/step-response.js';
import { example, refuses } from '../support/examples.js';

const ONE: LowPass = { gain: 1, a: 1e-6, b: 0, c: 0 };
const FILTER = sallenKey({ r1: 1e4, r2: 1e4, c1: 3.1831e-9, c2: 7.9577e-10, gain: 1 }, 300e3);

describe('step response', () => {
  example('stepError(…) of one pole after τ', () => stepError(ONE)(1e-6), Math.exp(-1));
  example('stepSettling(…) of one pole to 0.1 %', () => stepSettling(ONE, 1e-3), 6.9078e-6);
  example('stepRiseTime(…) of one pole', () => stepRiseTime(ONE), 2.19722e-6);
  example('stepPeakSlope(…) of one pole', () => stepPeakSlope(ONE), 1e6);
  example('stepPeakSlope(…) of two equal poles is 1/(e·τ) and', () => stepPeakSlope({ gain: 1, a: 2, b: 1, c: 0 }), Math.exp(-1));

  it('overshoots as a second-order loop does, and settles there', () => {
    const response = { gain: 1, a: 1 / 2, b: 1, c: 0 };
    const peak = Math.PI / Math.sqrt(1 - 1 / 16);
    expect(-stepError(response)(peak)).toBeCloseTo(secondOrderOvershoot(2), 9);
    const time = stepSettling(response, 0.01);
    expect(Math.abs(stepError(response)(time))).toBeCloseTo(0.01, 9);
    for (let after = time; after < 5 * time; after += time / 500) expect(Math.abs(stepError(response)(after))).toBeLessThanOrEqual(0.01 + 1e-9);
  });

  it('agrees with the equation stepped through time, third order', () => {
    const { a, b, c } = FILTER;
    const step = 2e-9;
    let [y, slope, bend] = [0, 0, 0];
    let [steepest, at10, at90, outside, time] = [0, 0, 0, 0, 0];
    const error = stepError(FILTER);
    while (time < 400e-6) {
      const jerk = (1 - y - a * slope - b * bend) / c;
      const middle = bend + (jerk * step) / 2;
      y += slope * step + (middle * step * step) / 2;
      slope += middle * step;
      bend += jerk * step;
      time += step;
      steepest = Math.max(steepest, slope);
      if (y < 0.1) at10 = at10 === 0 || at90 === 0 ? time : at10;
      if (at90 === 0 && y >= 0.9) at90 = time;
      if (Math.abs(1 - y) > 1e-3) outside = time;
      if (Math.round(time / step) % 20_000 === 0) expect(Math.abs(1 - y - error(time))).toBeLessThan(2e-4);
    }
    expect(stepPeakSlope(FILTER) / steepest).toBeCloseTo(1, 3);
    expect(stepRiseTime(FILTER) / (at90 - at10)).toBeCloseTo(1, 3);
    expect(stepSettling(FILTER, 1e-3) / outside).toBeCloseTo(1, 2);
  });

  it('is the exact time of a loop that does not slew, and never of one that is unstable', () => {
    expect(stepSettling(ONE, 2 ** -13)).toBeCloseTo(settlingTime({ step: 1, slewRate: 1e9, timeConstant: 1e-6, tolerance: 2 ** -13 }), 15);
    expect(stepSettling({ gain: 1, a: 1, b: 1, c: 2 }, 0.01)).toBe(Infinity);
  });

  refuses(() => stepSettling(ONE, 1), 'stepSettling: tolerance must be finite, above 0, below 1, but is 1');
});
