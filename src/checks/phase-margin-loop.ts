import type { OpenTransimpedance } from '../demands/index.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { highestCrossover, lagsOf, lowestCrossover, marginThere } from './phase-margin-lags.js';
import { opened, type Opened } from './phase-margin-opened.js';

/** What hangs behind the amplifier's open-loop output resistance: Ω and F; resistance null: a capacitance alone. */
export interface LoadedOutput {
  readonly outputResistance: number;
  readonly capacitance: number;
  readonly resistance: number | null;
  readonly isolation: number;
}

/** The opened loop of one stage with one part, but for its gain bandwidth. */
export interface Loop {
  readonly network: { readonly plus: PinNetwork; readonly minus: PinNetwork };
  /** The capacitor that makes this stage maximally flat belongs to the loop. */
  readonly open: OpenTransimpedance | null;
  /** F at the − input: the part's own, and what the feedback capacitor is not chosen for. */
  readonly inputCapacitance: number;
  readonly stray?: number;
  /** Second pole of the part itself, Hz; Infinity: none. */
  readonly ownPole: number;
  readonly load: LoadedOutput | null;
}

export interface Ends {
  readonly least: number;
  readonly most: number;
}

/** Phase margin (degrees) at the gain bandwidth (Hz) it stands at. */
export interface Margin {
  readonly margin: number;
  readonly gainBandwidth: number;
}

/** Margin of the loop at one gain bandwidth, degrees; 180 where the loop gain never reaches 1. */
export function marginAt(loop: Loop, gainBandwidth: number): number {
  return marginIn(opened(loop), gainBandwidth);
}

function marginIn(loop: Opened, gainBandwidth: number): number {
  const parts = loop.partsAt(gainBandwidth);
  return parts === null ? 180 : marginOf(parts);
}

function marginOf({ feedback, load, own }: PhaseParts): number {
  const margin = 90 + feedback + load + own;
  // Only upwards is it wrapped: lag beyond a full turn must not look like margin.
  return Math.max(-180, margin > 180 ? margin - 360 : margin);
}

/** Whether the smaller margin of the two ends is at least this, degrees. */
export function isMarginLeft(loop: Loop, ends: Ends, least: number): boolean {
  const bound = marginBound(loop, ends, least);
  return bound === null ? atEitherEnd(loop, ends) >= least : bound >= least;
}

/**
 * The least margin over all gain bandwidths, or any other on the same side of `required` where that can be told without the crossover:
 * a loop that only lags has less margin than where |T| is certainly above 1, and more than where it is certainly below.
 */
export function sideOfMargin(loop: Loop, ends: Ends, required: number): number {
  return marginBound(loop, ends, required) ?? worstMargin(loop, ends).margin;
}

/** What the least margin is certainly not below, degrees; -180 where nothing is certain. */
export function leastMargin(loop: Loop, { most }: Ends): number {
  const lags = lagsOf(loop);
  const highest = lags === null ? Infinity : highestCrossover(lags, most);
  return lags !== null && highest > 0 && highest < Infinity ? marginThere(lags, highest) - SURELY : -180;
}

/** Degrees, without a search and without opening the loop; null: only the crossover tells. The margin is least at the most gain bandwidth. */
function marginBound(loop: Loop, { most }: Ends, required: number): number | null {
  const lags = lagsOf(loop);
  if (lags === null) return null;
  const highest = highestCrossover(lags, most);
  if (!(highest > 0 && highest < Infinity)) return null;
  const low = marginThere(lags, highest);
  if (low >= required + SURELY) return low;
  const high = marginThere(lags, lowestCrossover(lags, most));
  return high < required - SURELY ? high : null;
}

/** Degrees: far above rounding and the tolerance of a verdict. */
const SURELY = 1e-5;

/** The smaller margin of the two ends alone, degrees: enough to search with. */
export function atEitherEnd(loop: Loop, { least, most }: Ends): number {
  const open = opened(loop);
  const last = marginIn(open, most);
  return isLeast(open, last, { least, most }) ? last : Math.min(marginIn(open, least), last);
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;
const REFINEMENTS = 20;

/**
 * Least margin over all gain bandwidths of a part: a lag is worst at the most, a lead at the least, a lead-lag has its dip in
 * between. Over this octave a parabola through three points tells whether there is one.
 */
export function worstMargin(loop: Loop, { least, most }: Ends): Margin {
  const open = opened(loop);
  const at = (gainBandwidth: number): Margin => ({ margin: marginIn(open, gainBandwidth), gainBandwidth });
  const last = at(most);
  if (most <= least || isLeast(open, last.margin, { least, most })) return last;
  const [first, middle] = [at(least), at(Math.sqrt(least * most))];
  const worst = lesser(lesser(last, first), middle);
  const curve = first.margin - 2 * middle.margin + last.margin;
  const hasDip = curve > FLAT && Math.abs(first.margin - last.margin) < 2 * curve;
  return hasDip ? lesser(worst, dip(at, { least, most })) : worst;
}

/** Degrees: less than rounding of a margin. */
const FLAT = 1e-7;
/** Degrees, and a ratio of gain bandwidths: a lag that grows between its ends by far more than rounding. */
const [SOME_LAG, APART] = [1e-7, 1.001];

/** The margin at the most is the least there is, and the other end need not be asked. */
const isLeast = ({ onlyLags }: Opened, last: number, { least, most }: Ends): boolean => onlyLags && last < 90 - SOME_LAG && most > least * APART;

const lesser = (one: Margin, other: Margin): Margin => (other.margin < one.margin ? other : one);

/** Golden-section search for the one minimum in between (Kiefer, Proc. Amer. Math. Soc. 4, 1953, from memory). */
function dip(at: (gainBandwidth: number) => Margin, { least, most }: Ends): Margin {
  let [low, high] = [Math.log(least), Math.log(most)];
  let left = at(Math.exp(high - GOLDEN * (high - low)));
  let right = at(Math.exp(low + GOLDEN * (high - low)));
  for (let step = 0; step < REFINEMENTS; step += 1) {
    if (left.margin < right.margin) {
      high = Math.log(right.gainBandwidth);
      right = left;
      left = at(Math.exp(high - GOLDEN * (high - low)));
    } else {
      low = Math.log(left.gainBandwidth);
      left = right;
      right = at(Math.exp(low + GOLDEN * (high - low)));
    }
  }
  return lesser(left, right);
}

/** Degrees at the true crossover (Hz), part by part; with 90° of the integrating amplifier they add up to the margin. */
export interface PhaseParts {
  readonly crossover: number;
  readonly feedback: number;
  readonly load: number;
  readonly own: number;
}

/** Where the phase goes at one gain bandwidth (Hz). Null without a crossover: a part far too slow for its network has nothing that could oscillate. */
export function phaseParts(loop: Loop, gainBandwidth: number): PhaseParts | null {
  return opened(loop).partsAt(gainBandwidth);
}

/** |β·load| of the loop as a function of the frequency in Hz, V/V: its inverse is the noise gain that the open-loop gain meets at the crossover. */
export function loopFactor(loop: Loop, gainBandwidth: number): (frequency: number) => number {
  return opened(loop).factorsAt(gainBandwidth).size;
}
