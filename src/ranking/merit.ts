import { smallerIsBetter, weightedGeometricMean } from '../formulas/desirability.js';
import { comfortOf, FLOOR } from './comfort.js';
import type { Weighed } from './placed.js';

/** Fixed scales, so that adding or removing a part never reorders the rest: EUR, and A. */
const PRICE = { target: 0.05, worst: 20 };
const CURRENT = { target: 0.1e-6, worst: 20e-3 };

/** The three equal shares of the merit, each FLOOR..1. */
export interface Merit {
  readonly total: number;
  readonly margins: number;
  readonly price: number;
  readonly current: number;
}

/** How much each share counts, against the others. */
export type ShareWeights = Readonly<Record<Share, number>>;
export const SHARES = ['margins', 'price', 'current'] as const;
export type Share = (typeof SHARES)[number];
/** Equal shares: the order of the shortlist. */
export const EQUAL: ShareWeights = { margins: 1, price: 1, current: 1 };

/** Desirability of a part that fits: margins, price and current as a weighted geometric mean of three equal shares (M10). */
export function meritOf(judged: Weighed, weights: ShareWeights = EQUAL): Merit {
  return meritFrom({ margins: marginShare(judged), price: priceInEuro(judged), current: judged.current }, weights);
}

/** What a merit is made of: the share of the margins, the price in EUR and the current in A. */
interface Ingredients {
  readonly margins: number;
  readonly price: number | null;
  readonly current: number | null;
}

/** Merit of a part whose margins were weighed before. */
export function meritFrom({ margins, ...known }: Ingredients, weights: ShareWeights = EQUAL): Merit {
  const price = onLogScale(known.price, PRICE);
  const current = onLogScale(known.current, CURRENT);
  const shares = { margins, price, current };
  const total = weightedGeometricMean(SHARES.map((share) => ({ score: shares[share], weight: weights[share] })));
  return { total, margins, price, current };
}

/** Price for the order, EUR; another currency is not converted and counts as not known. */
export function priceInEuro({ part }: Pick<Weighed, 'part'>): number | null {
  return part.price?.currency === 'EUR' ? part.price.amount : null;
}

/** Of verdicts that were weighed before: prices and weights are tried by the dozen, and the verdicts stay. */
const MARGINS = new WeakMap<Weighed['verdicts'], number>();

function marginShare({ verdicts }: Weighed): number {
  const known = MARGINS.get(verdicts);
  if (known !== undefined) return known;
  const share = marginsFrom(verdicts.map(comfortOf));
  MARGINS.set(verdicts, share);
  return share;
}

/** Share of the margins, FLOOR..1, from how comfortable each is, in the order of the checks; null where a check has none. */
export function marginsFrom(comforts: readonly (number | null)[]): number {
  const scores = comforts.filter((score) => score !== null);
  return scores.length === 0 ? 1 : weightedGeometricMean(scores.map((score) => ({ score, weight: 1 })));
}

/** Unknown counts as the floor. */
function onLogScale(value: number | null, scale: { target: number; worst: number }): number {
  if (value === null) return FLOOR;
  if (value <= scale.target) return 1;
  const logs = { value: Math.log(value), worst: Math.log(scale.worst), target: Math.log(scale.target) };
  return Math.max(FLOOR, smallerIsBetter(logs));
}
