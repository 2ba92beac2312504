import type { PriceTurn, Stability, WeightTurn } from '../ranking/index.js';
import { formatQuantity } from '../quantities/format.js';
import { amount } from './amounts.js';

/** How the two parts are called: `1` and `2`, or by their ids; the one ahead first. */
export type Names = readonly [ahead: string, behind: string];

/** The same in one sentence: what the price of either would have to be, else what decides. */
export function priceStability(stability: Stability, names: Names): string {
  return stability.prices.length === 0 && stability.weights.length === 0 ? stabilityText(stability, names) : priceText(stability.prices, stability.decidedBy, names);
}

/** How firmly one part stands before another, in one or two short sentences. Prices are rounded to the side on which the order still stands. */
export function stabilityText({ decidedBy, prices, weights }: Stability, names: Names): string {
  if (prices.length === 0 && weights.length === 0) return `No price and no weight of a share turns it: ${DECIDERS[decidedBy] ?? decidedBy} decides.`;
  return [priceText(prices, decidedBy, names), weightText(weights)].filter((text) => text !== '').join(' ');
}

const DECIDERS: Readonly<Record<string, string>> = { tier: 'the approved list', current: 'the supply current', margin: 'the least margin', id: 'the part number', estimates: 'the number of estimates' };

function priceText(prices: readonly PriceTurn[], decidedBy: string, names: Names): string {
  if (prices.length === 0) return decidedBy === 'merit' ? 'No price of either turns it.' : `No price turns it: ${DECIDERS[decidedBy] ?? decidedBy} decides.`;
  return `${prices.map((turn) => (turn.of === 0 ? staysText(turn, names[0]) : leadsText(turn, names[1]))).join('; ')}.`;
}

function staysText({ at, now, allowed }: PriceTurn, name: string): string {
  const wish = allowed === null ? '' : `; beyond ${amount(allowed, 'EUR')} it does not fit`;
  return `${name} stays ahead up to ${amount(at, 'EUR', { round: 'down' })}${nowText(now)}${wish}`;
}

/** No part is bought at this, EUR: then any price will do. */
const ANY = 1e4;

const leadsText = ({ at, now }: PriceTurn, name: string): string => (at >= ANY ? `${name} would lead at any price that were known` : `${name} would lead below ${amount(at, 'EUR', { round: 'down' })}${nowText(now)}`);

const nowText = (now: number | null): string => (now === null ? ' (no price in EUR now)' : ` (now ${amount(now, 'EUR')})`);

/** Each share counts 1 as it stands. */
function weightText(weights: readonly WeightTurn[]): string {
  if (weights.length === 0) return '';
  const turns = weights.map(({ share, at }) => `${share} counted ${formatQuantity(at, '1', { round: at > 1 ? 'up' : 'down' })} times`);
  return `It would turn with ${turns.join(', or with ')}, the other shares once each.`;
}
