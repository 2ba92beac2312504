import type { Report } from '../../../report.js';
import type { JudgedPart } from '../../../screening/index.js';

/** One part where price and current are known. */
export interface PricedPart {
  readonly id: string;
  readonly outcome: JudgedPart['outcome'];
  /** Place among what fits, 1 first; null: does not fit, or a variant of one that does. */
  readonly rank: number | null;
  /** A per amplifier, and money per piece. */
  readonly current: number;
  readonly price: number;
  /** First check it fails; null unless it is out. */
  readonly fails: string | null;
  /** No part that fits has less of both. */
  readonly onFront: boolean;
}

export interface PriceCurrent {
  readonly currency: string;
  readonly parts: readonly PricedPart[];
  /** Without a price in that currency, or without a current. */
  readonly left: number;
  /** Beyond what a drawing can hold of one outcome. */
  readonly beyond: number;
}

/** Parts of one outcome that are drawn at most, in the order of the report: more are a blot, and a list may be long. */
export const MOST_DRAWN = 400;

interface Placed {
  readonly part: JudgedPart;
  readonly rank: number | null;
}

/** Everything judged, priced in the currency most parts have. Null where no part has both figures. */
export function priceCurrentOf({ fit, undecided, rejected }: Report): PriceCurrent | null {
  const ranked = fit.flatMap((line): Placed[] => [{ part: line, rank: line.rank }, ...line.variants.map((part) => ({ part, rank: null }))]);
  const others = [undecided, rejected].flatMap((parts) => parts.slice(0, MOST_DRAWN).map((part): Placed => ({ part, rank: null })));
  const all = [...ranked.slice(0, MOST_DRAWN), ...others];
  const judged = fit.reduce((sum, line) => sum + 1 + line.variants.length, 0) + undecided.length + rejected.length;
  const currency = commonest(all.flatMap(({ part }) => (part.part.price === null ? [] : [part.part.price.currency])));
  if (currency === null) return null;
  const parts = all.flatMap(({ part, rank }) => priced(part, rank, currency));
  if (parts.length === 0) return null;
  return { currency, parts: withFront(parts), left: all.length - parts.length, beyond: judged - all.length };
}

function commonest(words: readonly string[]): string | null {
  const counts = new Map<string, number>();
  for (const word of words) counts.set(word, (counts.get(word) ?? 0) + 1);
  const [first] = [...counts].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1));
  return first?.[0] ?? null;
}

function priced({ part, outcome, current, deciding }: JudgedPart, rank: number | null, currency: string): PricedPart[] {
  const { price } = part;
  if (price?.currency !== currency || current === null || !(current > 0) || !(price.amount > 0)) return [];
  const fails = outcome === 'does-not-fit' ? (deciding[0] ?? null) : null;
  return [{ id: part.id, outcome, rank, current, price: price.amount, fails, onFront: false }];
}

/** Front of least price and least current over what fits (Pareto). */
function withFront(parts: readonly PricedPart[]): PricedPart[] {
  const fits = parts.filter(({ outcome }) => outcome === 'fits');
  const beats = (one: PricedPart, other: PricedPart): boolean => one.price <= other.price && one.current <= other.current && (one.price < other.price || one.current < other.current);
  return parts.map((part) => ({ ...part, onFront: part.outcome === 'fits' && !fits.some((one) => beats(one, part)) }));
}

/** Checks that keep parts out, most frequent first, each with the letter it has in the drawing. */
export function reasonLetters(parts: readonly PricedPart[]): { readonly letter: string; readonly check: string; readonly parts: number }[] {
  const counts = new Map<string, number>();
  for (const { fails } of parts) if (fails !== null) counts.set(fails, (counts.get(fails) ?? 0) + 1);
  const sorted = [...counts].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1));
  return sorted.map(([check, number], at) => ({ letter: String.fromCharCode(65 + (at % 26)), check, parts: number }));
}
