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
  return (mine) => {
    const isOver = (theirs: P): boolean => isCheaper(theirs, mine) && dominates(scores(theirs), scores(mine));
    for (const { members, firsts } of groups) {
      const found = members.some(isOver) ? firsts().find(isOver) : undefined;
      if (found !== undefined) return found;
    }
    return null;
  };
}

/** The first of the scores alone: they settle most pairs. */
function isCheaper(theirs: Rival, mine: Rival): boolean {
  if (theirs.current === null || mine.current === null || theirs.current > mine.current) return false;
  const [price, asked] = [priceInEuro(theirs), priceInEuro(mine)];
  return price !== null && asked !== null && price <= asked;
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
