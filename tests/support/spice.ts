import { Simulation } from 'eecircuit-engine';
import type { Complex } from './nodal.js';

/** What one analysis left behind, by the name the simulator prints: `v(out)`, `i(v1)`, `time`, `frequency`. */
export interface Analysis {
  real(name: string): readonly number[];
  complex(name: string): readonly Complex[];
  /** The only value of an operating point. */
  value(name: string): number;
}

/** Options of a group of simulations: starting the simulator alone takes seconds on a busy machine. */
export const SIMULATED = { timeout: 60_000 };

/** How an operating point was found is no complaint, as long as it was. */
const STEPPING = /^Note: (?:Starting dynamic gmin stepping|Dynamic gmin stepping completed)$/u;

let started: Promise<Simulation> | undefined;

/**
 * Runs one netlist (one analysis) in ngspice 45 as packed in eecircuit-engine; one simulator per process. After a failed run
 * the engine hands out the data of the run before, without an exception, so that any word of complaint is a failure here.
 */
export async function spice(netlist: string): Promise<Analysis> {
  const simulation = await (started ??= start());
  simulation.setNetList(netlist);
  const result = await simulation.runSim();
  const complaints = simulation.getError().filter((line) => line.trim() !== '' && !STEPPING.test(line));
  if (complaints.length > 0) throw new Error(`ngspice: ${complaints.join('\n')}\n${netlist}`);
  return analysis(result.data);
}

async function start(): Promise<Simulation> {
  const simulation = new Simulation();
  await simulation.start();
  return simulation;
}

interface Vector {
  readonly name: string;
  readonly values: readonly (number | { readonly real: number; readonly img: number })[];
}

function analysis(vectors: readonly Vector[]): Analysis {
  const find = (name: string): Vector['values'] => {
    const vector = vectors.find((one) => one.name === name);
    if (vector === undefined) throw new Error(`no vector ${name}; the run has ${vectors.map((one) => one.name).join(', ')}`);
    return vector.values;
  };
  const real = (name: string): number[] => find(name).map((value) => (typeof value === 'number' ? value : value.real));
  return {
    real,
    complex: (name) => find(name).map((value): Complex => (typeof value === 'number' ? [value, 0] : [value.real, value.img])),
    value: (name) => {
      const [only, ...more] = real(name);
      if (only === undefined || more.length > 0) throw new Error(`${name} is not one value`);
      return only;
    },
  };
}

/** Value at x on straight lines between the points of a curve (x rising). */
export function interpolated(xs: readonly number[], ys: readonly number[], x: number): number {
  const above = xs.findIndex((candidate) => candidate >= x);
  const [x1, y1] = [xs[above], ys[above]];
  if (x1 === undefined || y1 === undefined) throw new RangeError(`${x} is outside the curve`);
  const [x0, y0] = [xs[above - 1], ys[above - 1]];
  if (x0 === undefined || y0 === undefined || x1 === x) return y1;
  return y0 + ((x - x0) / (x1 - x0)) * (y1 - y0);
}

/** A curve on an even grid: `points` values from `from` on, the end (one period later) left out. */
export function period(xs: readonly number[], ys: readonly number[], [from, length, points]: readonly [number, number, number]): number[] {
  let above = 1;
  return Array.from({ length: points }, (_, k) => {
    const x = from + (k * length) / points;
    while (above < xs.length - 1 && xs[above]! < x) above += 1;
    const [x0, x1] = [xs[above - 1]!, xs[above]!];
    return ys[above - 1]! + ((x - x0) / (x1 - x0)) * (ys[above]! - ys[above - 1]!);
  });
}
