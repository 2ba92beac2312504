import { plainText, roundToDigits } from '../quantities/decimal.js';

/** Where what holds changes on the way from one value to a larger one. */
export interface Turn<State> {
  /** The first value at which `to` holds, found by halving. */
  readonly at: number;
  readonly from: State;
  readonly to: State;
}

/** A value with what holds there. */
export interface Sample<State> {
  readonly value: number;
  readonly state: State;
}

/** What is looked at, and when two states count as one. */
export interface Looking<State> {
  stateAt(value: number): State;
  isSame(one: State, other: State): boolean;
}

/** A turn is told with so many digits; with more only where it takes them. */
const TOLD_DIGITS = 6;
const MOST_DIGITS = 15;

/**
 * The turn at a value of few digits, rounded upwards, at which `to` was seen to hold: so that what is printed, typed again, gives what is
 * said of it. Where another turn comes before the rounded value, more digits are kept; the value itself in the end.
 */
export function toldTurn<State>(turn: Turn<State>, looking: Looking<State>): Turn<State> {
  for (let digits = TOLD_DIGITS; digits < MOST_DIGITS; digits += 1) {
    const at = Number(plainText(roundToDigits(turn.at, digits, 'up'), 0));
    if (at < turn.at) continue;
    const state = looking.stateAt(at);
    if (looking.isSame(state, turn.to)) return { ...turn, at, to: state };
  }
  return turn;
}

/** How near a turn is found, as a fraction of its value. */
const NEAR = 1e-7;

/**
 * Every turn between two values whose states differ: the interval is halved, and each half in which the ends still differ again, so
 * that several turns between two neighbours are told apart. A state that comes and goes within an interval of equal ends is not seen.
 * Source: bisection, any text on numerical methods.
 */
export function turnsBetween<State>(low: Sample<State>, high: Sample<State>, looking: Looking<State>): Turn<State>[] {
  if (looking.isSame(low.state, high.state)) return [];
  const value = middle(low.value, high.value);
  if (high.value - low.value <= nearness(low.value, high.value) || value <= low.value || value >= high.value) return [{ at: high.value, from: low.state, to: high.state }];
  const between = { value, state: looking.stateAt(value) };
  return [...turnsBetween(low, between, looking), ...turnsBetween(between, high, looking)];
}

const middle = (low: number, high: number): number => low + (high - low) / 2;

/** About zero the width of the start would never be reached as a fraction: there a millionth of a millionth of a unit ends it. */
const nearness = (low: number, high: number): number => Math.max(NEAR * Math.max(Math.abs(low), Math.abs(high)), 1e-15);
