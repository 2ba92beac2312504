import { isAhead } from '../formulas/dominance.js';
import { comfortOf } from './comfort.js';
import { priceInEuro } from './merit.js';
import type { Placed } from './placed.js';

/** What dominance looks at. */
type Rival = Pick<Placed, 'current' | 'verdicts' | 'proof'> & { readonly part: Pick<Placed['part'], 'tier' | 'price'> };

/**
 * For each part of the list the first one that is at least as good in every clamped margin, in price, current, tier and proof,
 * and better in one: on clamped margins an over-specified part can be dominated, on raw ones never (M10, RNK-10, -11).
 */
export function dominatorsOf<P extends Rival>(all: readonly P[]): (P | null)[] {
  return all.map(dominatorFinder(all.map((one) => ({ members: [one], firsts: () => [one] }))));
}

/** Some of a list that stand together: who is among them, and in which order those of them come that are in the list. */
interface Together<P> {
  readonly members: readonly P[];
  readonly firsts: () => readonly P[];
}

/** Finds the dominator of one part at a time; scores are made when they are first compared, and the order where it is between dominators. */
export function dominatorFinder<P extends Rival>(groups: readonly Together<P>[]): (one: P) => P | null {
  const known = new Map<P, readonly number[] | null>();
  const scores = (one: P): readonly number[] | null => {
    const found = known.get(one);
    if (found !== undefined) return found;
    const made = scoresOf(one);
    known.set(one, made);
    return made;
  };
  let costs: Costs<P> | null = null;
  return (mine) => {
    const { all, groupOf, prices, currents } = (costs ??= costsOf(groups));
    const isOver = (theirs: P): boolean => dominates(scores(theirs), scores(mine));
    const [price, current] = [priceInEuro(mine) ?? NaN, mine.current ?? NaN];
    // Settled to have no dominator in it that leads a line.
    let passed = -1;
    for (let at = 0; at < all.length; at += 1) {
      // The first of the scores alone settle most pairs; what is not known is below nothing.
      if (!((prices[at] ?? NaN) <= price && (currents[at] ?? NaN) <= current)) continue;
      const [theirs, group] = [all[at], groupOf[at] ?? 0];
      if (theirs === undefined || group === passed || !isOver(theirs)) continue;
      const found = groups[group]?.firsts().find(isOver);
      if (found !== undefined) return found;
      passed = group;
    }
    return null;
  };
}

/** Members of all groups one after the other, with what they cost: EUR and A, not a number where it is not known. */
interface Costs<P> {
  readonly all: readonly P[];
  readonly groupOf: Int32Array;
  readonly prices: Float64Array;
  readonly currents: Float64Array;
}

/** Numbers side by side: every line of a list is held against all that fits. */
function costsOf<P extends Rival>(groups: readonly Together<P>[]): Costs<P> {
  const all = groups.flatMap(({ members }) => members);
  const groupOf = new Int32Array(all.length);
  let filled = 0;
  groups.forEach(({ members }, group) => {
    groupOf.fill(group, filled, filled + members.length);
    filled += members.length;
  });
  return { all, groupOf, prices: Float64Array.from(all, (one) => priceInEuro(one) ?? NaN), currents: Float64Array.from(all, ({ current }) => current ?? NaN) };
}

/** Larger is better throughout; null when price or current is not known: then nothing can be said. */
function scoresOf(judged: Rival): readonly number[] | null {
  const price = priceInEuro(judged);
  if (price === null || judged.current === null) return null;
  const tier = judged.part.tier === 'approved' ? 1 : 0;
  const proof = judged.proof === 'limits' ? 1 : 0;
  return [tier, proof, -price, -judged.current, ...judged.verdicts.map((verdict) => comfortOf(verdict) ?? 1)];
}

const dominates = (theirs: readonly number[] | null, mine: readonly number[] | null): boolean =>
  theirs !== null && mine?.length === theirs.length && isAhead(theirs, mine);
