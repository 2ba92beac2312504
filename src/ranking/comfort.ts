import type { Basis } from '../parts/basis.js';
import { largerIsBetter } from '../formulas/desirability.js';
import type { Digest } from '../screening/index.js';

/**
 * Margin at which a check is comfortable: beyond it more is worth nothing (M10). Ranges, words, temperatures and
 * budgets have none: met is met.
 */
const COMFORTABLE: Readonly<Record<string, { readonly limits: number; readonly typical: number }>> = {
  'output-low': { limits: 1.25, typical: 1.25 },
  'output-high': { limits: 1.25, typical: 1.25 },
  'output-current': { limits: 1.25, typical: 1.25 },
  'slew-rate': { limits: 1.2, typical: 1.5 },
  'gain-bandwidth': { limits: 1.2, typical: 1.5 },
  'dc-error': { limits: 1.25, typical: 1.25 },
  noise: { limits: 1.25, typical: 1.25 },
  'phase-margin': { limits: 1.25, typical: 1.25 },
  settling: { limits: 1.25, typical: 1.25 },
};

/** Margin worth nothing. Below 1, so that a part that passes exactly is not worth nothing (M10, pitfall). */
const WORTHLESS = 0.8;
/** No desirability falls below this. */
export const FLOOR = 0.2;
/** Head-room has no ratio: this much spare, V, counts as a margin of 1.25. */
const COMFORTABLE_SPARE = 0.05;

/** What the order needs of a verdict. */
type Comparable = Pick<Digest, 'check' | 'margin' | 'spare' | 'standsOn'>;

/** Margin of a verdict for the order: the ratio, or for head-rooms 1 at the limit and 1.25 with 50 mV to spare. Null: none. */
export function marginForOrder(verdict: Comparable): number | null {
  if (!(verdict.check in COMFORTABLE)) return null;
  if (verdict.check === 'output-low' || verdict.check === 'output-high') {
    return verdict.spare === null ? null : 1 + (0.25 * verdict.spare) / COMFORTABLE_SPARE;
  }
  return verdict.margin;
}

/** Desirability of a margin, FLOOR..1; null for checks that have none. Derringer & Suich, J. Quality Technology 12(4), 1980. */
export function comfortOf(verdict: Comparable): number | null {
  const margin = marginForOrder(verdict);
  const scale = COMFORTABLE[verdict.check];
  if (margin === null || scale === undefined) return null;
  const target = isLimit(verdict.standsOn) ? scale.limits : scale.typical;
  return Math.max(FLOOR, largerIsBetter({ value: margin, worst: WORTHLESS, target }));
}

const isLimit = (basis: Basis | null): boolean => basis === 'guaranteed';
