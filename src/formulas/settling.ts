import { turningPoint } from './bisection.js';
import { requirePositive, requireWithin } from './domain.js';

/** step V, above 0; timeConstant s, closed loop, above 0; tolerance as a fraction of the step, above 0 and below 1. */
export interface Step {
  readonly step: number;
  readonly timeConstant: number;
  readonly tolerance: number;
}

/**
 * Settling time of a one-pole loop with a hard slew limit, exact: it slews until the error is SR·τ, then decays.
 * ΔV ≤ SR·τ: τ·ln(1/ε). ε·ΔV ≥ SR·τ: ΔV(1−ε)/SR. Between: ΔV/SR − τ + τ·ln(SR·τ/(ε·ΔV)).
 * @param step with slewRate V/s, above 0
 * @returns s
 * @example settlingTime({step: 2, slewRate: 633e3, timeConstant: 795.8e-9, tolerance: 1e-3}) is 6.76 µs
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ex. 6.7 (onset); own algebra.
 */
export function settlingTime(step: Step & { readonly slewRate: number }): number {
  const { slewRate, timeConstant } = step;
  requireStep('settlingTime', step);
  requirePositive('settlingTime', { slewRate });
  const onset = slewRate * timeConstant;
  const rest = step.tolerance * step.step;
  if (step.step <= onset) return linearSettlingTime(step);
  if (rest >= onset) return (step.step - rest) / slewRate;
  return step.step / slewRate - timeConstant + timeConstant * Math.log(onset / rest);
}

/**
 * Smallest slew rate that settles within a time, by bisection of settlingTime().
 * @param step with time s
 * @returns V/s
 * @example slewRateForSettling({step: 4, time: 3e-6, timeConstant: 159.155e-9, tolerance: 2 ** -13}) is 1.870 V/µs
 * Source: settlingTime(), which falls steadily as the slew rate rises.
 * @throws RangeError when even the linear settling takes longer than `time`: then the loop is too slow, whatever the slew rate.
 */
export function slewRateForSettling(step: Step & { readonly time: number }): number {
  requireStep('slewRateForSettling', step);
  requireWithin('slewRateForSettling', { time: step.time }, { from: linearSettlingTime(step) });
  const settles = (slewRate: number): boolean => settlingTime({ ...step, slewRate }) <= step.time;
  const low = (step.step * (1 - step.tolerance)) / step.time;
  return settles(low) ? low : turningPoint(settles, { low, high: (step.step / step.timeConstant) * (1 + 1e-12) });
}

/**
 * Rise time from 10 % to 90 % with a hard slew limit, exact: the difference of two settling times.
 * @param edge step V, slewRate V/s, timeConstant s, all above 0
 * @returns s
 * @example riseTime({step: 0.1, slewRate: 1e6, timeConstant: 1e-6}) is 2.197 µs, wholly linear
 * Source: settlingTime().
 */
export function riseTime(edge: { readonly step: number; readonly slewRate: number; readonly timeConstant: number }): number {
  return settlingTime({ ...edge, tolerance: 0.1 }) - settlingTime({ ...edge, tolerance: 0.9 });
}

/**
 * Smallest slew rate that makes an edge within a time from 10 % to 90 %, by bisection of riseTime(): from 0.8·ΔV/t of a loop much
 * faster than the edge up to 0.9·ln 9·ΔV/t = 1.98·ΔV/t of one that is just fast enough.
 * @param edge step V, time s (10 % to 90 %), timeConstant s of the closed loop, all above 0
 * @returns V/s
 * @example slewRateForEdge({step: 4, time: 1e-6, timeConstant: 1e-12}) is 3.2 V/µs
 * Source: riseTime(), which falls steadily as the slew rate rises.
 * @throws RangeError when the loop alone takes longer, τ·ln 9: then no slew rate makes that edge.
 */
export function slewRateForEdge(edge: { readonly step: number; readonly time: number; readonly timeConstant: number }): number {
  const { step, time, timeConstant } = edge;
  requirePositive('slewRateForEdge', { step, timeConstant });
  requireWithin('slewRateForEdge', { time }, { from: timeConstant * Math.log(9) });
  const makes = (slewRate: number): boolean => riseTime({ step, slewRate, timeConstant }) <= time * (1 + 1e-12);
  const least = (0.8 * step) / time;
  return Math.max(least, turningPoint(makes, { low: least * (1 - 1e-9), high: (0.9 * step * (1 + 1e-9)) / timeConstant }));
}

/**
 * Closed-loop bandwidth for linear settling within a time: f_cl = ln(1/ε)/(2π·T).
 * @param time s, above 0
 * @param tolerance fraction of the step, above 0 and below 1 (half a bit of n: 2^−(n+1))
 * @returns Hz
 * @example bandwidthForSettling(1e-6, 2 ** -13) is 1.434 MHz
 * Source: decay of one pole.
 */
export function bandwidthForSettling(time: number, tolerance: number): number {
  requirePositive('bandwidthForSettling', { time });
  requireWithin('bandwidthForSettling', { tolerance }, { above: 0, below: 1 });
  return -Math.log(tolerance) / (2 * Math.PI * time);
}

function linearSettlingTime({ timeConstant, tolerance }: Step): number {
  return -timeConstant * Math.log(tolerance);
}

function requireStep(where: string, { step, timeConstant, tolerance }: Step): void {
  requirePositive(where, { step, timeConstant });
  requireWithin(where, { tolerance }, { above: 0, below: 1 });
}
