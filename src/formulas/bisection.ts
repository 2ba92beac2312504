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

/**
 * From where on a condition holds for good: looked for downwards from a value where it does, in steps of a tenth, then bisected.
 * For conditions that may hold again further down. Unit of the start.
 * @example lowestHolding((x) => x >= 3, 1000) is 3
 * Source: as turningPoint().
 * @throws RangeError when the condition does not hold at the start.
 */
export function lowestHolding(holds: (x: number) => boolean, start: number): number {
  if (!holds(start)) throw new RangeError(`lowestHolding: the condition must be true at ${start}, but is false there`);
  let high = start;
  // 400 steps are 16 decades: below that a demand is nothing.
  for (let step = 0; step < 400; step += 1) {
    if (!holds(high / STRIDE)) return turningPoint(holds, { low: high / STRIDE, high });
    high /= STRIDE;
  }
  return 0;
}

const STRIDE = 1.1;
