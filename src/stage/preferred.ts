/** Values of a preferred series from one value to another, both included, ascending. */
export function ladder(series: readonly number[], from: number, to: number): readonly number[] {
  const [first, last] = [Math.floor(Math.log10(from)), Math.floor(Math.log10(to))];
  const decades = Array.from({ length: last - first + 1 }, (_, at) => first + at);
  const all = decades.flatMap((power) => series.map((mantissa) => Number(`${mantissa}e${power}`)));
  return all.filter((value) => value >= from * (1 - SAME) && value <= to * (1 + SAME));
}

/** The values of a ladder just below and just above a wanted one: no other is nearer from its side. */
export function neighbours(values: readonly number[], wanted: number): readonly number[] {
  const above = firstAtLeast(values, wanted);
  return [values[above - 1], values[above]].filter((value) => value !== undefined);
}

/** Place of the first value that is not below the wanted one; the length of the ladder when there is none. */
export function firstAtLeast(values: readonly number[], wanted: number): number {
  let [low, high] = [0, values.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((values[middle] ?? Number.POSITIVE_INFINITY) >= wanted * (1 - SAME)) high = middle;
    else low = middle + 1;
  }
  return low;
}

/** A choice of components, with how far it is from what is wanted. */
export interface Choice<Parts> {
  readonly parts: Parts;
  /** Largest relative error of all that is wanted. */
  readonly error: number;
  /** Its resistors, Ω. */
  readonly resistors: readonly number[];
}

/**
 * The choice with the least error, then resistors nearest the aim in ratio, then the one found first. Errors up to 0.1 % count as
 * one: the tolerances of the components are ten and more times larger.
 */
export function bestChoice<Parts>(choices: Iterable<Choice<Parts>>, aim: number): Parts | null {
  let best: { parts: Parts; rank: number; distance: number } | null = null;
  for (const { parts, error, resistors } of choices) {
    const distance = resistors.reduce((total, ohms) => total + Math.abs(Math.log(ohms / aim)), 0);
    const next = { parts, rank: Math.max(error, SMALL), distance };
    if (best === null || next.rank < best.rank || (next.rank === best.rank && next.distance < best.distance - SAME)) best = next;
  }
  return best === null ? null : best.parts;
}

/** Two values closer than this are one in different rounding. */
const SAME = 1e-9;
const SMALL = 1e-3;

/** Answers asked for most often are asked again at once: a search for a way out tries many stages with the same components. */
const KEPT = 200;

/** The same function, which keeps its last answers. What it answers depends on the numbers it is asked with alone. */
export function remembered<Wish extends object, Answer>(choose: (wish: Wish) => Answer): (wish: Wish) => Answer {
  const kept = new Map<string, Answer>();
  return (wish) => {
    const key = JSON.stringify(wish);
    const known = kept.get(key);
    if (known !== undefined) return known;
    if (kept.size >= KEPT) kept.clear();
    const answer = choose(wish);
    kept.set(key, answer);
    return answer;
  };
}
