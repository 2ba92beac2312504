export interface Bracket {
  readonly low: number;
  readonly high: number;
}

/**
 * Where a monotone condition turns: the point between `low` (condition false) and `high` (condition true), to the last bit
 * that halving can give. Unit of the bracket; `low` may be above `high`.
 * @example turningPoint((x) => x * x >= 2, { low: 1, high: 2 }) is 1.41421356…
 * Source: bisection, any text on numerical methods.
 * @throws RangeError when the condition already holds at `low`, or does not hold at `high`.
 */
export function turningPoint(condition: (x: number) => boolean, { low, high }: Bracket): number {
  if (condition(low)) throw new RangeError(`turningPoint: the condition must be false at ${low}, but is true there`);
  if (!condition(high)) throw new RangeError(`turningPoint: the condition must be true at ${high}, but is false there`);
  let no = low;
  let yes = high;
  for (let halving = 0; halving < 200; halving += 1) {
    const middle = no + (yes - no) / 2;
    if (middle === no || middle === yes) break;
    if (condition(middle)) yes = middle;
    else no = middle;
  }
  return yes;
}
