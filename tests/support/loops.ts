import { magnitude, solve, type Complex, type Element } from './nodal.js';

/** Phase margin in degrees of an opened loop: `in` is driven with 1 V, the returned signal stands at a node. */
export function measuredPhaseMargin(opened: readonly Element[], returned: string): number {
  const elements: Element[] = [...opened, { volts: 1, at: 'in' }];
  const loop = (frequency: number): Complex => solve(elements, frequency)(returned);
  let [low, high] = [1, 1e12];
  while (high / low > 1 + 1e-12) {
    const middle = Math.sqrt(low * high);
    if (magnitude(loop(middle)) > 1) low = middle;
    else high = middle;
  }
  const [re, im] = loop(high);
  return 180 - (Math.abs(Math.atan2(im, re)) * 180) / Math.PI;
}

/** The value at which a measured, steadily falling (or rising) quantity passes a level; the bracket holds positive values. */
export function solveFor(measure: (value: number) => number, level: number, [from, to, within = 1e-12]: readonly [number, number, number?]): number {
  const risesUp = measure(to) > measure(from);
  let [low, high] = [from, to];
  while (high / low > 1 + within) {
    const middle = Math.sqrt(low * high);
    if (measure(middle) > level === risesUp) high = middle;
    else low = middle;
  }
  return Math.sqrt(low * high);
}
