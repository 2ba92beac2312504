import { cell } from '../formulas/cells.js';
import { exponentials, stepped, type Ladder } from '../formulas/matrix-exponential.js';
import type { Vector } from './dense.js';
import type { LinearStage } from './equations.js';
import { freeRows, heldRows, leakRow, wholeRow, type FreeRows, type HeldRows } from './rows.js';

/** Where the amplifier stands: within its limits, slewing up or down, or its output at one of its ends. */
export type Mode = 'linear' | 'up' | 'down' | 'high' | 'low';

/** V/s of the integrator upwards and downwards (Infinity: none), and the ends of the output in the states' own zero, V (±Infinity: none). */
export interface Limits {
  readonly up: number;
  readonly down: number;
  readonly high: number;
  readonly low: number;
}

interface Rows {
  readonly free: FreeRows;
  readonly high: HeldRows;
  readonly low: HeldRows;
}

/** A signal that obeys equations of its own, beside the 1 that every constant hangs on: u = weights·(s, c, 1). */
export interface Source {
  /** rad/s; 0: s and c stand still. */
  readonly omega: number;
  readonly weights: readonly [number, number, number];
  /** s and c at the beginning. */
  readonly start: readonly [number, number];
  /** V/s: what its offset gives the integrator, and what its finite gain leaks where the states are 0. */
  readonly offset: number;
  readonly leaking: number;
}

export interface Place {
  readonly time: number;
  readonly state: Float64Array;
  readonly mode: Mode;
  /** Limits that took hold or let go right after each other, before this place. */
  readonly chatter: number;
}

/** The stage with its limits: between the moments where one takes hold or lets go it is linear, so that it is carried on exactly. */
export interface Walk {
  readonly start: Place;
  /** A step further, or to just beyond where a limit takes hold or lets go. */
  next(from: Place): Place;
  output(at: Place): number;
}

/** Halvings of a step that an event is found to: 2^−20 of it. */
const RUNGS = 20;
/** Events within this share of a step follow right after each other. */
const CLOSE = 2 ** -10;
/** At a limit that takes hold and lets go again and again each event is found less finely, down to this many halvings: else time would stand still. */
const LEAST_RUNGS = 2;

/** s, so fine that no two events hide in one: between the events the steps are exact. */
export interface Steps {
  readonly linear: number;
  readonly slewing: number;
  readonly held: number;
}

/** The stage from given states on. */
export function walk(stage: LinearStage, given: { readonly source: Source; readonly limits: Limits; readonly states: Vector; readonly steps: Steps }): Walk {
  const { source, limits, steps } = given;
  const rows: Rows = { free: freeRows(stage, source), high: heldRows(stage, source, limits.high), low: heldRows(stage, source, limits.low) };
  const ladders = new Map<Mode, Ladder>();
  const stepOf = (mode: Mode): number => (mode === 'linear' ? steps.linear : mode === 'high' || mode === 'low' ? steps.held : steps.slewing);
  const ladderOf = (mode: Mode): Ladder => {
    const ladder = ladders.get(mode) ?? exponentials(matrixFor(stage, { source, limits, mode, rows }), stepOf(mode)).slice(0, RUNGS + 1);
    ladders.set(mode, ladder);
    return ladder;
  };
  const modeAfter = modesOf(rows, limits);
  const next = (from: Place): Place => {
    const ladder = ladderOf(from.mode);
    const state = stepped(ladder[0] ?? EMPTY, from.state);
    if (modeAfter(state, from.mode) === from.mode) return { state, time: from.time + stepOf(from.mode), mode: from.mode, chatter: 0 };
    return across(from, { ladder: ladder.slice(0, Math.max(LEAST_RUNGS, RUNGS - from.chatter) + 1), step: stepOf(from.mode), modeAfter, rows });
  };
  const state = Float64Array.of(...given.states, ...source.start, 1);
  if (state.length !== stage.order + 3) throw new RangeError('walk: as many states as the stage has');
  // What its lag would carry the output beyond its end is cut off: no pin goes there.
  const output = ({ state: at, mode }: Place): number => Math.min(limits.high, Math.max(limits.low, product(mode === 'high' ? rows.high.output : mode === 'low' ? rows.low.output : rows.free.output, at)));
  return { start: { time: 0, state, mode: modeAfter(state, 'linear'), chatter: 0 }, next, output };
}

const EMPTY = new Float64Array();

type ModeAfter = (state: Float64Array, from: Mode) => Mode;

/** A held output lets go when the amplifier wants away from its end; a free one is caught when it is pushed beyond. */
function modesOf({ free, high, low }: Rows, limits: Limits): ModeAfter {
  return (state, from) => {
    if (from === 'high' && product(high.wanted, state) > 0) return 'high';
    if (from === 'low' && product(low.wanted, state) < 0) return 'low';
    const slope = product(free.wanted, state);
    const isFree = from !== 'high' && from !== 'low';
    if (isFree && slope > 0 && product(free.output, state) >= limits.high) return 'high';
    if (isFree && slope < 0 && product(free.output, state) <= limits.low) return 'low';
    const given = product(free.given, state);
    if (given > limits.up) return 'up';
    return given < -limits.down ? 'down' : 'linear';
  };
}

/** Down the rungs as long as the mode holds, then one smallest rung beyond. A held output that lets go starts from where it was held. */
function across(from: Place, { ladder, step, modeAfter, rows }: { readonly ladder: Ladder; readonly step: number; readonly modeAfter: ModeAfter; readonly rows: Rows }): Place {
  let { state, time } = from;
  ladder.forEach((increment, rung) => {
    const next = stepped(increment, state);
    if (modeAfter(next, from.mode) !== from.mode) return;
    state = next;
    time += step / 2 ** rung;
  });
  state = stepped(ladder.at(-1) ?? EMPTY, state);
  time += step / 2 ** (ladder.length - 1);
  const mode = modeAfter(state, from.mode);
  const isHeld = from.mode === 'high' || from.mode === 'low';
  const chatter = time - from.time < step * CLOSE || from.chatter > RUNGS - LEAST_RUNGS ? from.chatter + 1 : 0;
  return { state: isHeld ? rows[from.mode].released(state) : state, time, mode, chatter };
}

function matrixFor(stage: LinearStage, { source, limits, mode, rows }: { readonly source: Source; readonly limits: Limits; readonly mode: Mode; readonly rows: Rows }): Float64Array {
  const { order, integrator } = stage;
  const size = order + 3;
  const matrix = new Float64Array(size * size);
  const held = mode === 'high' || mode === 'low' ? rows[mode] : null;
  stage.rates.forEach((row, at) => {
    const whole = wholeRow({ states: row, signal: stage.signal[at] ?? 0 }, source, 0);
    if (held === null) matrix.set(whole, at * size);
    else if (at < integrator) matrix.set(held.inPlace(whole), at * size);
  });
  const slewing = (slope: number): Float64Array => leakRow(stage, source).map((value, at) => (at === size - 1 ? value + slope : value));
  if (mode === 'up' || mode === 'down') matrix.set(slewing(mode === 'up' ? limits.up : -limits.down), integrator * size);
  if (mode === 'linear') matrix.set(rows.free.wanted, integrator * size);
  matrix[order * size + order + 1] = source.omega;
  matrix[(order + 1) * size + order] = -source.omega;
  return matrix;
}

function product(row: Float64Array, state: Float64Array): number {
  let sum = 0;
  for (let at = 0; at < row.length; at += 1) sum += cell(row, at) * cell(state, at);
  return sum;
}
