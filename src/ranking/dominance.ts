import { isAhead } from '../formulas/dominance.js';
import type { JudgedPart } from '../screening/index.js';
import { comfortOf } from './comfort.js';
import { priceInEuro } from './merit.js';

/**
 * For each part of the list the first one that is at least as good in every clamped margin, in price, current, tier and proof,
 * and better in one: on clamped margins an over-specified part can be dominated, on raw ones never (M10, RNK-10, -11).
 */
export function dominatorsOf<P extends JudgedPart>(all: readonly P[]): (P | null)[] {
  const scored = all.map((one) => ({ one, scores: scoresOf(one) }));
  return scored.map(({ scores: mine }) => scored.find(({ scores: theirs }) => dominates(theirs, mine))?.one ?? null);
}

/** Larger is better throughout; null when price or current is not known: then nothing can be said. */
function scoresOf(judged: JudgedPart): readonly number[] | null {
  const price = priceInEuro(judged);
  if (price === null || judged.current === null) return null;
  const tier = judged.part.tier === 'approved' ? 1 : 0;
  const proof = judged.proof === 'limits' ? 1 : 0;
  return [tier, proof, -price, -judged.current, ...judged.verdicts.map((verdict) => comfortOf(verdict) ?? 1)];
}

const dominates = (theirs: readonly number[] | null, mine: readonly number[] | null): boolean =>
  theirs !== null && mine?.length === theirs.length && isAhead(theirs, mine);
