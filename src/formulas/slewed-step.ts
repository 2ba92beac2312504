import { cell } from './cells.js';
import { requirePositive, requireWithin } from './domain.js';
import type { LowPass } from './low-pass-response.js';
import { exponentials, stepped, type Ladder } from './matrix-exponential.js';
import { polesOf } from './poles.js';
import { slewingEquations, type Limit, type SlewingLoop, type SlewingStage } from './slewing-equations.js';
import { stepSettling } from './step-response.js';

/** s: until it stays within, and how much of that the amplifier spent at its limit. */
export interface SlewedSettling {
  readonly time: number;
  readonly slewing: number;
}

/**
 * Settling of a step through a stage of several poles whose integrating amplifier has a hard limit of its slope: between the moments
 * where the limit takes hold or lets go the stage is linear, so that its state is carried on by matrix exponentials, exactly.
 * @param stage at most three poles, constant numerator
 * @param tolerance fraction of the step, above 0 and below 1
 * @returns s, as a function of the slew rate as a share of the step in 1/s, above 0; Infinity when it does not come to rest
 * @example one pole of 1 µs, slew rate a third of the step per µs, to 1 %: 5.51 µs, 2 µs of them slewing
 * Source: own algebra; any text on linear systems.
 */
export function slewedSettling({ actual, ideal }: SlewingStage, tolerance: number): (slewRate: number) => SlewedSettling {
  requireWithin('slewedSettling', { tolerance }, { above: 0, below: 1 });
  // In units of the first time constant all numbers are of one size.
  const unit = actual.a;
  const stage = { actual: inUnits(actual, unit), ideal: inUnits(ideal, unit) };
  const linear = stepSettling(stage.actual, tolerance);
  const period = Number.isFinite(linear) ? Math.min(...polesOf(stage.actual).map(({ im }) => (2 * Math.PI) / Math.abs(im))) : Infinity;
  return (slewRate) => {
    requirePositive('slewedSettling', { slewRate });
    if (!Number.isFinite(linear)) return { time: Infinity, slewing: 0 };
    const { time, slewing } = march({ ...stage, slewRate: slewRate * unit }, tolerance, { linear, period });
    return { time: time * unit, slewing: slewing * unit };
  };
}

const inUnits = ({ gain, a, b, c }: LowPass, unit: number): LowPass => ({ gain, a: a / unit, b: b / unit ** 2, c: c / unit ** 3 });

/** Only so that no change of the limit, and no crossing, lies hidden in a step: the steps themselves are exact. */
const PER_TIME = 60;
const PER_PERIOD = 24;
const MOST_STEPS = 20_000;
/** After this many ends that were not far enough it is taken never to settle. */
const PATIENCE = 12;

interface Place {
  readonly time: number;
  readonly slewing: number;
  readonly state: Float64Array;
  readonly limit: Limit;
}

/** Time without a limit, and the shortest period it rings with (Infinity: none). */
interface Pace {
  readonly linear: number;
  readonly period: number;
}

function march(loop: SlewingLoop, tolerance: number, { linear, period }: Pace): SlewedSettling {
  const all = linear + 1 / loop.slewRate;
  const step = Math.max(all / MOST_STEPS, Math.min(linear / PER_TIME, 1 / loop.slewRate / PER_TIME, period / PER_PERIOD));
  const system = systemOf(loop, step);
  const isOutside = (state: Float64Array): boolean => Math.abs(cell(state, system.error)) > tolerance;
  let place: Place = { time: 0, slewing: 0, state: system.start, limit: system.first };
  let last = place;
  let end = 1.5 * all;
  for (let patience = 0; patience < PATIENCE; patience += 1) {
    while (place.time < end) {
      place = system.next(place);
      if (isOutside(place.state)) last = place;
    }
    if (last.time < 0.8 * end) return system.whileHolding(last, isOutside);
    end *= 1.5;
  }
  return { time: Infinity, slewing: last.slewing };
}

interface System {
  readonly start: Float64Array;
  /** Where in the state the error is. */
  readonly error: number;
  readonly first: Limit;
  /** A step further, or to just beyond where the limit takes hold or lets go. */
  readonly next: (from: Place) => Place;
  /** The last place within a step for which a condition still holds. */
  readonly whileHolding: (from: Place, holds: (state: Float64Array) => boolean) => Place;
}

function systemOf(loop: SlewingLoop, step: number): System {
  const { matrix, wanted, start, error } = slewingEquations(loop);
  const { slewRate } = loop;
  const limitOf = (state: Float64Array): Limit => {
    let slope = 0;
    for (let at = 0; at <= error; at += 1) slope += cell(wanted, at) * cell(state, at);
    return slope > slewRate ? 1 : slope < -slewRate ? -1 : 0;
  };
  const ladders = new Map<Limit, Ladder>();
  const ladderOf = (limit: Limit): Ladder => {
    const ladder = ladders.get(limit) ?? exponentials(matrix(limit), step);
    ladders.set(limit, ladder);
    return ladder;
  };
  const whileHolding = (from: Place, holds: (state: Float64Array) => boolean): Place => {
    let { state, time } = from;
    ladderOf(from.limit).forEach((increment, rung) => {
      const next = stepped(increment, state);
      if (!holds(next)) return;
      state = next;
      time += step / 2 ** rung;
    });
    return { ...from, state, time, slewing: from.slewing + (from.limit === 0 ? 0 : time - from.time) };
  };
  const next = (from: Place): Place => {
    const ladder = ladderOf(from.limit);
    const state = stepped(ladder[0] ?? EMPTY, from.state);
    if (limitOf(state) === from.limit) return { state, time: from.time + step, slewing: from.slewing + (from.limit === 0 ? 0 : step), limit: from.limit };
    const before = whileHolding(from, (other) => limitOf(other) === from.limit);
    const beyond = stepped(ladder.at(-1) ?? EMPTY, before.state);
    return { ...before, state: beyond, limit: limitOf(beyond) };
  };
  return { start, error, first: limitOf(start), next, whileHolding };
}

const EMPTY = new Float64Array();
