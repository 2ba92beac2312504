/** Longest and shortest step of the search, in ln f; it ends this far below the gain bandwidth. */
const [LONG, SHORT, REACH] = [0.25, 0.02, 40];
/** From how far below 1 on a step is the longest, in ln|T|. */
const FAR = 4 * LONG;

/**
 * The highest frequency (Hz) where ln|T| is 0, whatever the shape below it: a downward search, then regula falsi. |T| of resistors
 * and capacitors has no peak so narrow that these steps miss it. Null when there is none.
 */
export function crossoverOf(gain: (frequency: number) => number, gainBandwidth: number): number | null {
  const at = (position: number): number => gain(Math.exp(position));
  const top = Math.log(gainBandwidth) + 1;
  let position = top;
  let left = at(top);
  while (left >= 0) {
    position += 1;
    left = at(position);
  }
  return downwards(at, { position, left }, top - REACH);
}

/**
 * The same of a loop whose |T| is nowhere above `most`/f (Hz; of resistors alone the gain bandwidth over the noise gain at DC). So much is known without
 * looking: the places passed over are those where the search would take its longest step.
 */
export function boundedCrossover(gain: (frequency: number) => number, gainBandwidth: number, most: number): number | null {
  const at = (position: number): number => gain(Math.exp(position));
  const top = Math.log(gainBandwidth) + 1;
  const far = Math.max(Math.log(most) + FAR + SLACK, top - REACH);
  let position = top;
  while (position - LONG > far) position -= LONG;
  const left = at(position);
  return left < 0 ? downwards(at, { position, left }, top - REACH) : crossoverOf(gain, gainBandwidth);
}

/**
 * The same of a loop whose |T| falls by a decade or more in every decade and stands at 1 or below at `most` (Hz): the crossover lies no further below a
 * place than |T| is below 1 there.
 */
export function laggingCrossover(gain: (frequency: number) => number, most: number): number {
  const at = (position: number): number => gain(Math.exp(position));
  const high = Math.log(most) + SLACK;
  const left = at(high);
  const low = high + left - SLACK;
  return Math.exp(falsePosition(at, { position: low, left: at(low) }, { position: high, left }));
}

/** More than rounding of a logarithm. */
const SLACK = 1e-9;

function downwards(at: (position: number) => number, from: Place, end: number): number | null {
  let { position, left } = from;
  while (position > end) {
    const next = position - Math.min(LONG, Math.max(SHORT, -left / 4));
    const there = at(next);
    if (there >= 0) return Math.exp(falsePosition(at, { position: next, left: there }, { position, left }));
    position = next;
    left = there;
  }
  return null;
}

/** A place on an axis and what is left there: 0 is sought. */
export interface Place {
  readonly position: number;
  readonly left: number;
}

/** Where a function is 0 between two places of opposite sign: regula falsi with the stale end halved (Dowell & Jarratt, A modified regula falsi method, BIT 11, 1971, from memory). */
export function falsePosition(at: (position: number) => number, low: Place, high: Place): number {
  let { position: one, left: oneLeft } = low;
  let { position: other, left: otherLeft } = high;
  for (let step = 0; step < 40 && Math.abs(other - one) > 1e-13 * Math.abs(one) + 1e-14; step += 1) {
    const position = other - (otherLeft * (other - one)) / (otherLeft - oneLeft);
    const left = at(position);
    if (left === 0) return position;
    if (left * otherLeft < 0) [one, oneLeft] = [other, otherLeft];
    else oneLeft /= 2;
    [other, otherLeft] = [position, left];
    if (Math.abs(left) < 1e-13) return position;
  }
  return other;
}
