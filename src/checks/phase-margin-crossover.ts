/** Longest and shortest step of the search, in ln f; it ends this far below the gain bandwidth. */
const [LONG, SHORT, REACH] = [0.25, 0.02, 40];

/**
 * The highest frequency (Hz) where ln|T| is 0, whatever the shape below it: a downward search, then regula falsi. |T| of resistors
 * and capacitors has no peak so narrow that these steps miss it. Null when there is none.
 */
export function crossoverOf(gain: (frequency: number) => number, gainBandwidth: number): number | null {
  const at = (position: number): number => gain(Math.exp(position));
  const top = Math.log(gainBandwidth) + 1;
  let high = { position: top, left: at(top) };
  while (high.left >= 0) high = { position: high.position + 1, left: at(high.position + 1) };
  while (high.position > top - REACH) {
    const position = high.position - Math.min(LONG, Math.max(SHORT, -high.left / 4));
    const low = { position, left: at(position) };
    if (low.left >= 0) return Math.exp(falsePosition(at, low, high));
    high = low;
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
  let [one, other] = [low, high];
  for (let step = 0; step < 40 && Math.abs(other.position - one.position) > 1e-13 * Math.abs(one.position) + 1e-14; step += 1) {
    const position = other.position - (other.left * (other.position - one.position)) / (other.left - one.left);
    const next = { position, left: at(position) };
    if (next.left === 0) return position;
    if (next.left * other.left < 0) one = other;
    else one = { ...one, left: one.left / 2 };
    other = next;
    if (Math.abs(next.left) < 1e-13) return position;
  }
  return other.position;
}
