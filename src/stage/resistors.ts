import { E96 } from '../quantities/e-series.js';
import { firstAtLeast } from './preferred.js';

/** What a chosen pair must give: the ratio of feedback to input resistor, and what counts as the feedback path. */
export interface PairWish {
  readonly ratio: number;
  /** Ohm of the feedback path for a pair: Rf + Rg (non-inverting) or Rf alone (inverting, difference). */
  readonly path: (feedback: number, input: number) => number;
}

export interface Pair {
  readonly feedback: number;
  readonly input: number;
}

const LEAST_PATH = 50e3;
const MOST_PATH = 200e3;
const AIM = 100e3;
const DECADES = [1, 10, 100, 1e3, 1e4, 1e5, 1e6, 1e7];
/** E96 steps are at most 2.6 %: where the values bracket a ratio, the nearest pair is closer than this. */
const REACHED = 0.02;
/** Errors closer than this are one error in different rounding. */
const SAME = 1e-9;

/** The E96 values (IEC 60063:2015) from 1 Ω to 97.6 MΩ. */
const VALUES: readonly number[] = DECADES.flatMap((decade) => E96.map((mantissa) => Math.round(mantissa * 100) * (decade / 100)));

/**
 * The E96 pair with the least ratio error, then the feedback path nearest 100 kΩ in ratio within 50..200 kΩ,
 * then the smaller feedback resistor. Null when no pair reaches the ratio.
 */
export function choosePair(wish: PairWish): Pair | null {
  let best: (Pair & { error: number; distance: number }) | null = null;
  for (const pair of candidates(wish)) {
    const path = wish.path(pair.feedback, pair.input);
    if (path < LEAST_PATH || path > MOST_PATH) continue;
    const error = Math.abs(pair.feedback / pair.input / wish.ratio - 1);
    if (error > REACHED) continue;
    const next = { ...pair, error, distance: Math.abs(Math.log(path / AIM)) };
    if (best === null || isBetter(next, best)) best = next;
  }
  return best === null ? null : { feedback: best.feedback, input: best.input };
}

/** For every feedback value the input values on both sides of the exact one: no other can be nearer. Paths that no near value brings inside are left out. */
function* candidates(wish: PairWish): Generator<Pair> {
  for (const feedback of VALUES) {
    const exact = feedback / wish.ratio;
    if (wish.path(feedback, exact * (1 + 2 * REACHED)) < LEAST_PATH || wish.path(feedback, exact * (1 - 2 * REACHED)) > MOST_PATH) continue;
    const above = firstAtLeast(VALUES, exact);
    for (const at of [above - 1, above]) {
      const input = VALUES[at];
      if (input !== undefined) yield { feedback, input };
    }
  }
}

function isBetter(a: Pair & { error: number; distance: number }, b: Pair & { error: number; distance: number }): boolean {
  if (Math.abs(a.error - b.error) > SAME) return a.error < b.error;
  if (Math.abs(a.distance - b.distance) > SAME) return a.distance < b.distance;
  return a.feedback < b.feedback;
}
