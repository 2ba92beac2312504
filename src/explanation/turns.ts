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
