import { turningPoint } from '../formulas/bisection.js';
import type { JudgedPart } from '../screening/index.js';
import { EQUAL, SHARES, type Share } from './merit.js';
import { decisionBetween, type Order } from './rank.js';

/** How far a price would have to move for the order of two parts to turn. EUR. */
export interface PriceTurn {
  /** Which of the two: 0 is ahead, 1 behind. */
  readonly of: 0 | 1;
  readonly now: number | null;
  /** The part that is ahead stays there up to this price; the one behind leads below it. */
  readonly at: number;
  /** What a wish of the stage allows, where that comes first: beyond it the part does not fit any more. */
  readonly allowed: number | null;
}

/** The weight of a share, 1 as it stands, at which the order turns. */
export interface WeightTurn {
  readonly share: Share;
  readonly at: number;
}

/** How firmly one part stands before another. */
export interface Stability {
  /** The step that decides as things stand. */
  readonly decidedBy: string;
  /** Empty: no price turns it. */
  readonly prices: readonly PriceTurn[];
  /** Empty: no weight of a share turns it. */
  readonly weights: readonly WeightTurn[];
}

/** No part is bought at more, EUR. */
export const DEAREST = 1e4;
/** A share that counts a thousand times as much as the others is alone. */
const HEAVIEST = 1e3;

/** How far the price of either part, or the weight of a share, would have to move for the order to turn: bisection on the order itself. `ahead` must be ahead. */
export function stabilityOf(order: Order, pair: readonly [ahead: JudgedPart, behind: JudgedPart]): Stability {
  const { by } = decisionBetween(order, pair);
  return { decidedBy: by, prices: ([0, 1] as const).flatMap((of) => priceTurn(order, pair, of)), weights: SHARES.flatMap((share) => weightTurn(order, pair, share)) };
}

/** The one ahead becomes dearer, the one behind cheaper. An unknown price counts as the floor already, which a known one only betters. */
function priceTurn(order: Order, pair: readonly [JudgedPart, JudgedPart], of: 0 | 1): PriceTurn[] {
  const now = priceNow(pair[of]);
  if (now === undefined) return [];
  const turned = (price: number): boolean => decisionBetween(order, priced(pair, of, price)).sign > 0;
  const [start, end] = of === 0 ? [now, DEAREST] : [now ?? DEAREST, 0];
  // Against an unknown price any known one may lead.
  if (of === 1 && now === null && turned(DEAREST)) return [{ of, now, at: DEAREST, allowed: null }];
  if (start === null || turned(start) || !turned(end)) return [];
  const at = turningPoint(turned, { low: start, high: end });
  const allowed = of === 0 ? allowedPrice(pair[of]) : null;
  return [{ of, now, at, allowed: allowed !== null && allowed < at ? allowed : null }];
}

/** Undefined where the price is in another currency, which is not converted. */
const priceNow = ({ part }: JudgedPart): number | null | undefined => (part.price === null ? null : part.price.currency === 'EUR' ? part.price.amount : undefined);

function priced([ahead, behind]: readonly [JudgedPart, JudgedPart], of: 0 | 1, amount: number): readonly [JudgedPart, JudgedPart] {
  const at = (one: JudgedPart): JudgedPart => ({ ...one, part: { ...one.part, price: { amount, currency: 'EUR', quantity: one.part.price?.quantity ?? null } } });
  return of === 0 ? [at(ahead), behind] : [ahead, at(behind)];
}

function allowedPrice({ verdicts }: JudgedPart): number | null {
  const required = verdicts.find(({ check, unit }) => check === 'price' && unit === 'EUR')?.required;
  return typeof required === 'number' ? required : null;
}

/** More weight, or less, whichever turns it: the logarithm of the merits is linear in a weight, so only one of the two can. */
function weightTurn(order: Order, pair: readonly [JudgedPart, JudgedPart], share: Share): WeightTurn[] {
  const turned = (weight: number): boolean => decisionBetween(order, pair, { ...EQUAL, [share]: weight }).sign > 0;
  if (turned(1)) return [];
  const end = [0, HEAVIEST].find(turned);
  return end === undefined ? [] : [{ share, at: turningPoint(turned, { low: 1, high: end }) }];
}
