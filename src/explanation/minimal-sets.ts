/** Something that brings some checks round. */
export interface Reaching {
  /** Two that move the same thing exclude each other. */
  readonly path: string;
  readonly reach: ReadonlySet<string>;
}

/**
 * Sets of up to `most` movers that together reach every check, of which no part does: singles, then pairs, then triples. A set with
 * a smaller one inside that suffices is left out.
 */
export function minimalSets<One extends Reaching>(movers: readonly One[], checks: readonly string[], most: number): One[][] {
  const useful = movers.filter(({ reach }) => checks.some((check) => reach.has(check)));
  const found: One[][] = [];
  let smaller: One[][] = [[]];
  for (let size = 1; size <= most; size++) {
    const next = smaller.flatMap((set) => useful.slice(useful.findLastIndex((one) => set.includes(one)) + 1).map((one) => [...set, one]));
    const open = next.filter((set) => samePathOnce(set) && !found.some((known) => known.every((one) => set.includes(one))));
    found.push(...open.filter((set) => covers(set, checks)));
    smaller = open.filter((set) => !covers(set, checks));
  }
  return found.filter((set) => set.every((one) => !covers(set.filter((other) => other !== one), checks)));
}

const covers = (set: readonly Reaching[], checks: readonly string[]): boolean => checks.every((check) => set.some(({ reach }) => reach.has(check)));

function samePathOnce(set: readonly Reaching[]): boolean {
  return new Set(set.map(({ path }) => path)).size === set.length;
}
