/** An amplifier at unity gain and the pole its load makes with its output resistance. Hz and degrees. */
export interface LoadedLoop {
  readonly bandwidth: number;
  readonly margin: number;
  readonly crossover: number;
  readonly loadPole: number;
}

const toDegrees = (angle: number): number => (angle * 180) / Math.PI;

/**
 * Phase margin with the load, degrees: the part's own second pole is the one that gives its stated margin at its stated
 * crossover; the new crossover is found by halving (Franco, 3rd ed. 2002, ch. 8, from memory).
 */
export function loadedMargin({ bandwidth, margin, crossover, loadPole }: LoadedLoop): number {
  const ownPole = crossover * Math.tan((margin * Math.PI) / 180);
  const gain = (f: number): number => bandwidth / f / Math.hypot(1, f / ownPole) / Math.hypot(1, f / loadPole);
  let [low, high] = [0, bandwidth];
  for (let step = 0; step < 60; step += 1) {
    const middle = (low + high) / 2;
    if (gain(middle) > 1) low = middle;
    else high = middle;
  }
  return 90 - toDegrees(Math.atan(high / ownPole)) - toDegrees(Math.atan(high / loadPole));
}
