import { at, netlist, type Circuit } from './netlists.js';
import { period, spice } from './spice.js';

/** What is driven: Hz, and how finely a period is stepped and sampled. */
export interface Sampling {
  readonly frequency: number;
  readonly points: number;
}

/** A source text: a sine about a middle, volts, from the middle upwards. */
export function sine(middle: number, half: number, { frequency }: Sampling): string {
  return `sin(${middle} ${half} ${frequency})`;
}

/**
 * The settled (third) period at the output of each circuit, on an even grid, by one transient analysis. Every capacitor starts
 * empty: two periods are ample for all loops here, and no operating point has to be searched across a hard limit.
 */
export async function settledPeriods(circuits: readonly Circuit[], { frequency, points }: Sampling): Promise<number[][]> {
  const length = 1 / frequency;
  const analysis = `.tran ${length / points} ${3.01 * length} ${1.99 * length} ${length / points} uic`;
  const run = await spice(netlist(circuits, analysis, ...circuits.map(({ name }) => at('out', name))));
  return circuits.map(({ name }) => period(run.real('time'), run.real(at('out', name)), [2 * length, length, points]));
}
