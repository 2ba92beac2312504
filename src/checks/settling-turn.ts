import type { Loop, SettlingDemand } from '../demands/index.js';
import { lowestHolding } from '../formulas/bisection.js';
import { slewRateForSettling } from '../formulas/settling.js';
import { stepPeakSlope, stepSettling } from '../formulas/step-response.js';
import { weaknessOf } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { TurningPoint } from '../verdicts/finding.js';
import type { SettlingFigures } from './settling.js';
import { settlingParts, settlingWith, type Speed } from './settling-time.js';

/** Far beyond any amplifier, Hz. */
const FASTEST = 1e13;

/**
 * The figure that decides, and the value at which the time is just met with all others as they are: what is missing first, then the
 * weaker of slew rate and bandwidth. Null where no single figure does it.
 */
export function settlingTurn(asked: SettlingDemand, figures: SettlingFigures): TurningPoint | null {
  const { rate, bandwidth, charging } = figures;
  if (bandwidth === null) return rate === null ? null : bandwidthTurn(asked, figures, rate);
  if (charging !== null && charging.current === null) return rate === null ? null : currentTurn(asked, figures, charging.load);
  const ofRate = rateTurn(asked, figures);
  if (rate === null || asked.closedLoop.form !== 'one-pole') return ofRate;
  const isWeaker = weaknessOf(bandwidth.basis) > weaknessOf(rate.basis);
  return isWeaker ? (bandwidthTurn(asked, figures, rate) ?? ofRate) : (ofRate ?? bandwidthTurn(asked, figures, rate));
}

function rateTurn(asked: SettlingDemand, figures: SettlingFigures): TurningPoint | null {
  const value = slewRateTurn(asked, figures);
  return value === null ? null : { figure: 'slewRate', kind: 'min', value, unit: 'V/s' };
}

/** V/s that just does, with the bandwidth at hand; null when the loop alone takes longer. */
function slewRateTurn(asked: SettlingDemand, { bandwidth, inputCapacitance }: SettlingFigures): number | null {
  const { step, tolerance, required: time, closedLoop } = asked;
  if (bandwidth === null || !Number.isFinite(bandwidth.value)) return null;
  const loop = { gainBandwidth: bandwidth.value, inputCapacitance: inputCapacitance?.value ?? 0 };
  const response = closedLoop.at(loop);
  const linear = stepSettling(response, tolerance);
  if (linear > time) return null;
  if (closedLoop.form === 'one-pole') return slewRateForSettling({ step, timeConstant: response.a, tolerance, time: Math.max(time, -response.a * Math.log(tolerance)) });
  return slowestThatSettles(asked, loop, step * stepPeakSlope(response));
}

/** Relative width at which the search ends, and its most steps: each is a walk through the whole step. */
const CLOSE = 1e-4;
const STEPS = 8;

/** V/s between the mean slope, which is never enough, and the steepest, which is: found on the side where it does (Dowell & Jarratt, 1971, from memory). */
function slowestThatSettles(asked: SettlingDemand, loop: Loop, most: number): number {
  const { step, tolerance, required: time } = asked;
  const timeAt = settlingWith(asked, loop);
  const late = (slowness: number): number => {
    const { slewing, linear } = timeAt(1 / slowness);
    return slewing + linear - time;
  };
  let good = { at: 1 / most, late: late(1 / most) };
  let bad = { at: time / (step * (1 - tolerance)), late: time };
  for (let count = 0; count < STEPS && bad.at - good.at > CLOSE * good.at; count += 1) {
    // Halving keeps the side that stays from holding on for ever.
    const share = count % 3 === 2 ? 0.5 : good.late / (good.late - bad.late);
    const at = good.at + (bad.at - good.at) * Math.min(0.95, Math.max(0.05, share));
    const next = { at, late: late(at) };
    if (next.late <= 0) good = next;
    else bad = next;
  }
  return 1 / good.at;
}

function bandwidthTurn(asked: SettlingDemand, { inputCapacitance }: SettlingFigures, rate: Reading): TurningPoint | null {
  const at = (gainBandwidth: number): Speed => ({ slewRate: rate.value, loop: { gainBandwidth, inputCapacitance: inputCapacitance?.value ?? 0 } });
  const value = lowest(FASTEST, (gainBandwidth) => within(asked, at(gainBandwidth)));
  return value === null ? null : { figure: 'gainBandwidth', kind: 'min', value, unit: 'Hz' };
}

/** Current that charges the load fast enough beside the resistive one; null when the slew rate alone is too small. */
function currentTurn(asked: SettlingDemand, figures: SettlingFigures, load: { readonly capacitance: number; readonly resistiveCurrent: number }): TurningPoint | null {
  const slewRate = slewRateTurn(asked, figures);
  if (slewRate === null || slewRate > (figures.rate?.value ?? 0)) return null;
  return { figure: 'outputCurrent', kind: 'min', value: slewRate * load.capacitance + load.resistiveCurrent, unit: 'A' };
}

function within(asked: SettlingDemand, speed: Speed): boolean {
  const { slewing, linear } = settlingParts(asked, speed);
  return slewing + linear <= asked.required * (1 + 1e-12);
}

function lowest(from: number, holds: (x: number) => boolean): number | null {
  return holds(from) ? lowestHolding(holds, from) : null;
}
