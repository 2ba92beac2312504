import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { settlingTime } from '../../src/formulas/settling.js';
import { slewedSettling as settlingOf } from '../../src/formulas/slewed-step.js';
import type { SlewingLoop } from '../../src/formulas/slewing-equations.js';
import { stepSettling } from '../../src/formulas/step-response.js';

const slewedSettling = ({ slewRate, ...stage }: SlewingLoop, tolerance: number) => settlingOf(stage, tolerance)(slewRate);
const polynomial = (a: number, b = 0, c = 0) => ({ gain: 1, a, b, c });

/**
 * A transimpedance stage by small steps of its own two equations, nothing of the product: the node follows the feedback current, the
 * amplifier integrates the node's voltage, its slope limited.
 */
function bySmallSteps({ rf, cf, cin, bandwidth, slewRate }: Record<'rf' | 'cf' | 'cin' | 'bandwidth' | 'slewRate', number>, tolerance: number): number {
  const angular = 2 * Math.PI * bandwidth;
  // y = vo/ΔV; the photocurrent ΔV/Rf is pulled out of the node: (Cin + Cf)·vn' = (y − vn − 1)/Rf + Cf·y', y' = −ωt·vn.
  const slope = (node: number): number => Math.max(-slewRate, Math.min(slewRate, -angular * node));
  const dt = 1e-10;
  let [node, y, time, last] = [0, 0, 0, 0];
  for (; time < 40e-6; time += dt) {
    const turn = (n: number, out: number): number => ((out - n - 1) / rf + cf * slope(n)) / (cin + cf);
    const middle = node + (dt / 2) * turn(node, y);
    const half = y + (dt / 2) * slope(node);
    node += dt * turn(middle, half);
    y += dt * slope(middle);
    if (Math.abs(1 - y) > tolerance) last = time + dt;
  }
  return last;
}

describe('a step through several poles with a slew limit', () => {
  it('is what small steps of the circuit give, ringing or not', () => {
    const stage = { rf: 1e5, cin: 50e-12, bandwidth: 5e6 };
    for (const cf of [2e-12, 5e-12, 12e-12]) {
      for (const slewRate of [0.1e6, 0.3e6, 1e6]) {
        const lag = 1 / (2 * Math.PI * stage.bandwidth);
        const loop = { actual: polynomial(stage.rf * cf + lag, stage.rf * (stage.cin + cf) * lag), ideal: polynomial(stage.rf * cf), slewRate };
        expect(slewedSettling(loop, 1e-3).time / bySmallSteps({ ...stage, cf, slewRate }, 1e-3)).toBeCloseTo(1, 3);
      }
    }
  });

  it('of one pole is the closed form, and its slewing lasts until the error is SR·τ', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 0.95, noNaN: true }), fc.double({ min: 1e-5, max: 0.1, noNaN: true }), (share, tolerance) => {
        const found = slewedSettling({ actual: polynomial(1e-6), ideal: polynomial(0), slewRate: share * 1e6 }, tolerance);
        const exact = settlingTime({ step: 1, slewRate: share * 1e6, timeConstant: 1e-6, tolerance });
        expect(found.time / exact).toBeCloseTo(1, 8);
        expect(found.slewing).toBeCloseTo(Math.min(exact, 1e-6 / share - 1e-6), 11);
      }),
      { seed: 4, numRuns: 60 },
    );
  });

  it('is that of the poles alone without a limit to speak of', () => {
    const actual = polynomial(0.8e-6, 0.5e-12, 0.01e-18);
    const found = slewedSettling({ actual, ideal: polynomial(0.7e-6, 0.4e-12), slewRate: 1e9 }, 1e-3);
    expect(found.slewing).toBe(0);
    expect(found.time / stepSettling(actual, 1e-3)).toBeCloseTo(1, 9);
  });

  it('has no end in an unstable loop', () => {
    expect(slewedSettling({ actual: polynomial(1e-6, 1e-12, 3e-18), ideal: polynomial(0.5e-6, 0.5e-12), slewRate: 1e5 }, 0.01).time).toBe(Infinity);
  });

  it('takes the same whatever the unit of time', () => {
    const at = (unit: number) => slewedSettling({ actual: polynomial(0.6 * unit, 0.3 * unit ** 2), ideal: polynomial(0.5 * unit), slewRate: 0.4 / unit }, 1e-3).time / unit;
    expect(at(1e-9)).toBeCloseTo(at(1), 8);
  });
});
