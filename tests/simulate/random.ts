/** Draws of one verdict: the same seed and number always give the same ones, so that any of them can be run again alone. */
export interface Dice {
  /** Between two ends, evenly. */
  even(from: number, to: number): number;
  /** Between two positive ends, evenly in the logarithm. */
  ratio(from: number, to: number): number;
  pick<T>(of: readonly T[]): T;
  chance(share: number): boolean;
}

/** Linear congruential steps with an output mix on 32 bits (common practice; quality enough to spread cases). */
export function dice(seed: number, number: number): Dice {
  let state = (Math.imul(seed, 0x9e3779b1) ^ Math.imul(number + 1, 0x85ebca6b)) >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const even = (from: number, to: number): number => from + (to - from) * next();
  return {
    even,
    ratio: (from, to) => Math.exp(even(Math.log(from), Math.log(to))),
    pick: (of) => of[Math.floor(next() * of.length)]!,
    chance: (share) => next() < share,
  };
}

/** A number a stage file can carry without loss: a few digits, no exponent. */
export function written(value: number, digits = 3): number {
  return Number(Number(value.toPrecision(digits)).toFixed(9));
}
