import { dominates } from '../formulas/dominance.js';
import type { JudgedPart } from '../screening/index.js';
import { comfortOf } from './comfort.js';
import { priceInEuro } from './merit.js';

/**
 * The first part of the list that is at least as good in every clamped margin, in price, current, tier and proof, and better
 * in one: on clamped margins an over-specified part can be dominated, on raw ones never (method.md 10, RNK-10 and -11).
 */
export function dominatorOf<P extends JudgedPart>(one: P, all: readonly P[]): P | null {
  const mine = scores(one);
  if (mine === null) return null;
  return all.find((other) => other !== one && isAhead(scores(other), mine)) ?? null;
}

/** Larger is better throughout; null when price or current is not known: then nothing can be said. */
function scores(judged: JudgedPart): number[] | null {
  const price = priceInEuro(judged);
  if (price === null || judged.current === null) return null;
  const tier = judged.part.tier === 'approved' ? 1 : 0;
  const proof = judged.proof === 'limits' ? 1 : 0;
  return [tier, proof, -price, -judged.current, ...judged.verdicts.map((verdict) => comfortOf(verdict) ?? 1)];
}

const isAhead = (theirs: number[] | null, mine: readonly number[]): boolean => theirs?.length === mine.length && dominates(theirs, mine);
