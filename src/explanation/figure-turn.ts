import { turningPoint } from '../formulas/bisection.js';
import { PARAMETERS, type LimitKind, type Parameter } from '../parts/figures.js';
import { isMoreBetter } from './span.js';

/** Where a verdict turns on one figure, SI. */
export interface Turn {
  readonly value: number;
  /** The side of the value that passes. */
  readonly side: 'less' | 'more';
  /** The other end, where only a window of values passes; else null. */
  readonly until: number | null;
}

/** What is known before the search. */
export interface TurnSearch {
  readonly parameter: Parameter;
  readonly kind: LimitKind | null;
  /** Whether the part passes with this value. */
  readonly passes: (value: number) => boolean;
  /** A value that passes. */
  readonly good: number;
  /** Where a closed form says that it turns; tried first. */
  readonly guess: number | null;
}

/** How near to a closed form both sides are tried. */
const TIGHT = 1e-7;

/**
 * The value at which the judge changes its mind: the closed form of the check where it holds on both sides, else bisection between
 * a value that passes and the nearest of a grid that does not. Null when every value of the grid passes: that it is known is enough.
 */
export function turnOf(search: TurnSearch): Turn | null {
  return fromGuess(search) ?? fromGrid(search);
}

function fromGuess({ guess, passes, parameter, kind }: TurnSearch): Turn | null {
  if (guess === null || guess === 0 || !Number.isFinite(guess)) return null;
  const step = Math.abs(guess) * TIGHT;
  const [below, above] = [passes(guess - step), passes(guess + step)];
  if (below === above || above !== isMoreBetter(parameter, kind)) return null;
  return { value: guess, side: above ? 'more' : 'less', until: null };
}

function fromGrid({ parameter, kind, passes, good, guess }: TurnSearch): Turn | null {
  const extra = guess === null || !Number.isFinite(guess) ? [] : [guess];
  const near = gridOf(parameter).filter((value) => SIGNED.has(parameter) || isNear(value, good));
  const grid = [...new Set([...near, ...extra, good])].sort((a, b) => a - b);
  const at = grid.indexOf(good);
  const low = boundary(grid.slice(0, at).reverse(), good, passes);
  const high = boundary(grid.slice(at + 1), good, passes);
  if (low === null && high === null) return null;
  const upwards = low !== null && (high === null || isMoreBetter(parameter, kind));
  return upwards ? { value: low, side: 'more', until: high } : { value: high ?? good, side: 'less', until: low };
}

/** Nothing real lies more decades away, and checks were not made for it. */
const DECADES = 5;
const isNear = (value: number, good: number): boolean => value <= 0 || good <= 0 || Math.abs(Math.log10(value / good)) <= DECADES;

/** Outwards from a good value to the first that does not pass, then halved in between. */
function boundary(outwards: readonly number[], good: number, passes: (value: number) => boolean): number | null {
  let inside = good;
  for (const value of outwards) {
    if (!passes(value)) return turningPoint(passes, { low: value, high: inside });
    inside = value;
  }
  return null;
}

/** Decades that any such figure lies in, and for what may be negative a ladder on both sides of zero. */
function gridOf(parameter: Parameter): readonly number[] {
  const ladder = LADDERS[PARAMETERS[parameter].unit] ?? [];
  return SIGNED.has(parameter) ? VOLTS : ladder;
}

const SIGNED: ReadonlySet<Parameter> = new Set(['inputLowHeadroom', 'inputHighHeadroom', 'inputCrossover']);
const VOLTS: readonly number[] = [-40, -10, -5, -2, -1, -0.5, -0.2, -0.1, 0, 0.1, 0.2, 0.5, 1, 2, 5, 10, 40];

const decades = (from: number, to: number): number[] => Array.from({ length: to - from + 1 }, (_, at) => 10 ** (from + at));

const LADDERS: Readonly<Record<string, readonly number[]>> = {
  V: decades(-8, 2),
  'V/s': decades(2, 10),
  Hz: decades(-2, 10),
  'V/V': decades(0, 9),
  'V/K': decades(-10, -2),
  A: decades(-17, 1),
  'V/√Hz': decades(-11, -4),
  'A/√Hz': decades(-18, -8),
  '°': Array.from({ length: 18 }, (_, at) => 5 + 10 * at),
  'Ω': decades(-2, 7),
  F: decades(-16, -4),
  '°C': Array.from({ length: 27 }, (_, at) => -80 + 10 * at),
  'K/W': decades(0, 4),
};
