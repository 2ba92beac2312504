import type { Loop, SettlingDemand } from '../demands/index.js';
import { settlingTime } from '../formulas/settling.js';
import { slewedSettling } from '../formulas/slewed-step.js';
import { stepPeakSlope, stepSettling } from '../formulas/step-response.js';

/** V/s (Infinity: no limit known) and the loop (null: bandwidth not known). */
export interface Speed {
  readonly slewRate: number;
  readonly loop: Loop | null;
}

export interface SettlingParts {
  /** Time the amplifier spends at its limit, and the rest, s. */
  readonly slewing: number;
  readonly linear: number;
}

/** Time spent slewing and settling, s. */
export function settlingParts(asked: SettlingDemand, { slewRate, loop }: Speed): SettlingParts {
  return loop === null ? NEVER : settlingWith(asked, loop)(slewRate);
}

const NEVER: SettlingParts = { slewing: Number.POSITIVE_INFINITY, linear: 0 };

/**
 * The same as a function of the slew rate (V/s). In closed form with one pole; with more the stage is carried through its slewing,
 * exactly too.
 */
export function settlingWith(asked: SettlingDemand, loop: Loop): (slewRate: number) => SettlingParts {
  const { step, tolerance, closedLoop } = asked;
  const response = closedLoop.at(loop);
  if (closedLoop.form === 'one-pole') return (slewRate) => (slewRate === 0 ? NEVER : onePole(asked, slewRate, response.a));
  const linear = stepSettling(response, tolerance);
  const steepest = Number.isFinite(linear) ? step * stepPeakSlope(response) : 0;
  const known = Number.isFinite(loop.gainBandwidth) ? loop : { ...loop, gainBandwidth: ENDLESS };
  const walk = slewedSettling({ actual: closedLoop.at(known), ideal: closedLoop.idealAt(known) }, tolerance);
  return (slewRate) => {
    if (slewRate === 0) return NEVER;
    if (slewRate >= steepest) return { slewing: 0, linear };
    const { time, slewing } = walk(slewRate / step);
    return { slewing, linear: time - slewing };
  };
}

/** In place of a bandwidth that is not to count, Hz. */
const ENDLESS = 1e12;

function onePole({ step, tolerance }: SettlingDemand, slewRate: number, timeConstant: number): SettlingParts {
  if (timeConstant === 0) return { slewing: (step * (1 - tolerance)) / slewRate, linear: 0 };
  if (slewRate === Number.POSITIVE_INFINITY) return { slewing: 0, linear: -timeConstant * Math.log(tolerance) };
  const whole = settlingTime({ step, slewRate, timeConstant, tolerance });
  const slewing = Math.min(whole, Math.max(0, step / slewRate - timeConstant));
  return { slewing, linear: whole - slewing };
}

/** What is certain with a figure missing: the slewing alone, or the loop alone, s. */
export function leastTime(asked: SettlingDemand, { slewRate, loop }: Speed): number {
  const slewing = Number.isFinite(slewRate) && slewRate > 0 ? (asked.step * (1 - asked.tolerance)) / slewRate : 0;
  const linear = loop === null || !Number.isFinite(loop.gainBandwidth) ? 0 : stepSettling(asked.closedLoop.at(loop), asked.tolerance);
  return Math.max(slewing, linear);
}
