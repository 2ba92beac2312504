import { requireFinite } from './domain.js';

/**
 * Whether one option dominates another: nowhere worse and somewhere better.
 * @param one scores, more is better in every place
 * @param other scores in the same order
 * @example dominates([2, 1], [1, 1]) is true, dominates([2, 0], [1, 1]) is false
 * Source: Pareto dominance; Pareto, Manuale di economia politica (1906) (from memory).
 * @throws RangeError when a score is not finite or the lengths differ.
 */
export function dominates(one: readonly number[], other: readonly number[]): boolean {
  for (const score of [...one, ...other]) requireFinite('dominates', { score });
  if (one.length !== other.length) {
    throw new RangeError(`dominates: both must have equally many scores, but have ${one.length} and ${other.length}`);
  }
  return isAhead(one, other);
}

/**
 * The comparison of dominates() alone, for scores known to be finite and of one length: it runs once per pair of a long list.
 * @param one scores, more is better in every place
 * @param other scores in the same order
 * @example isAhead([2, 1], [1, 1]) is true, isAhead([1, 1], [1, 1]) is false
 * Source: as dominates().
 */
export function isAhead(one: readonly number[], other: readonly number[]): boolean {
  let better = false;
  for (const [at, score] of one.entries()) {
    const rival = other[at] ?? score;
    if (score < rival) return false;
    if (score > rival) better = true;
  }
  return better;
}

/**
 * Positions of the options that no other dominates, in their order.
 * @param options scores, more is better in every place
 * @example undominated([[2, 1], [1, 1], [1, 2]]) is [0, 2]
 * Source: as dominates().
 */
export function undominated(options: readonly (readonly number[])[]): readonly number[] {
  return options.flatMap((option, index) => (options.some((rival) => dominates(rival, option)) ? [] : [index]));
}
