import { cell } from '../formulas/cells.js';
import type { LinearStage, Row } from './equations.js';
import type { Source } from './march.js';

/** Weights of all that moves: states, s, c and 1. */
export interface FreeRows {
  /** Slope its input stage gives the integrator, V/s, and with what its finite gain leaks. */
  readonly given: Float64Array;
  readonly wanted: Float64Array;
  /** V. */
  readonly output: Float64Array;
}

/** The same while the output is held at one of its ends: then the amplifier drives whatever it takes, and its own states wait. */
export interface HeldRows extends FreeRows {
  /** A row with what the amplifier drives put in place of its states. */
  inPlace(row: Float64Array): Float64Array;
  /** The states as the amplifier lets go: its own as if it had driven just that. */
  released(state: Float64Array): Float64Array;
}

/** Weights of states, and those of the signal spread over its own equations. */
export function wholeRow({ states, signal }: Row, { weights }: Pick<Source, 'weights'>, constant: number): Float64Array {
  const [s, c, one] = weights;
  return Float64Array.of(...states, signal * s, signal * c, signal * one + constant);
}

export function freeRows(stage: LinearStage, source: Source): FreeRows {
  const given = wholeRow(stage.given, source, source.offset);
  return { given, wanted: given.map((value, at) => value + cell(leakRow(stage, source), at)), output: wholeRow(stage.output, source, 0) };
}

/** V/s that the finite gain takes back, about where it rests. */
export function leakRow({ order, integrator, leak }: LinearStage, { leaking }: Pick<Source, 'leaking'>): Float64Array {
  return Float64Array.from({ length: order + 3 }, (_, at) => (at === integrator ? -leak : at === order + 2 ? leaking : 0));
}

/** Smaller than this, V/V, the output does not follow the drive at once: a capacitance stands there. */
const AT_ONCE = 1e-9;

/**
 * With a resistance alone at the output the drive follows from the output itself; with a capacitance there from its slope, which is 0.
 * @param level V of the end, in the states' own zero; ±Infinity: never held
 */
export function heldRows(stage: LinearStage, source: Source, level: number): HeldRows {
  const { order, integrator } = stage;
  const free = freeRows(stage, source);
  const drive = driveRow(stage, source, Number.isFinite(level) ? level : 0);
  const inPlace = (row: Float64Array): Float64Array => {
    const weight = row.subarray(integrator, order).reduce((sum, value) => sum + value, 0);
    return row.map((value, at) => (at >= integrator && at < order ? 0 : value) + weight * cell(drive, at));
  };
  const released = (state: Float64Array): Float64Array => {
    const volts = drive.reduce((sum, weight, at) => sum + weight * cell(state, at), 0);
    return state.map((value, at) => (at >= integrator && at < order ? volts : value));
  };
  return { given: inPlace(free.given), wanted: inPlace(free.wanted), output: inPlace(free.output), inPlace, released };
}

/** What the amplifier drives for the output to stand still, as a row over everything but its own states. */
function driveRow(stage: LinearStage, source: Source, level: number): Float64Array {
  const { order, integrator, output } = stage;
  const own = output.states[order - 1] ?? 0;
  const isDirect = Math.abs(own) > AT_ONCE;
  const row = isDirect ? wholeRow(output, source, -level) : slopeRow(stage, source);
  const weight = isDirect ? own : cell(row, order - 1);
  return row.map((value, at) => (at >= integrator && at < order ? 0 : -value / weight));
}

/** Slope of an output that follows the network alone. */
function slopeRow({ order, integrator, output, rates, signal }: LinearStage, source: Source): Float64Array {
  const of = (pick: (at: number) => number): number => output.states.reduce((sum, weight, at) => (at < integrator ? sum + weight * pick(at) : sum), 0);
  const states = Array.from({ length: order }, (_, column) => of((at) => rates[at]?.[column] ?? 0));
  return wholeRow({ states, signal: of((at) => signal[at] ?? 0) }, source, 0);
}
