import { ideal, imperfect } from '../support/amplifiers.js';
import { at, netlist, outputCurrent, type Circuit } from '../support/netlists.js';
import { spice } from '../support/spice.js';
import { signalCircuit, still, type Corner } from './corners.js';
import type { DrawnStage, Point } from './stage-drawn.js';

/** What stands at the amplifier at one corner with the signal held at one point. */
export interface StaticPoint {
  readonly corner: Corner;
  readonly point: Point;
  readonly output: number;
  readonly plus: number;
  /** Out of the output, A. */
  readonly current: number;
}

const AT_ONCE = 150;

/** Operating points of all corners with the signal at all its extremes; the amplifier is ideal but for an offset, V. */
export async function staticPoints(stage: DrawnStage, corners: readonly Corner[], offset = 0): Promise<StaticPoint[]> {
  const amplifier = offset === 0 ? ideal : imperfect({ offset }, 0);
  const places = corners.flatMap((corner) => stage.points.map((point) => ({ corner, point })));
  const circuits = places.map(({ corner, point }, k) => signalCircuit({ stage, corner, name: `s${k}`, amplifier }, still(point)));
  const found: StaticPoint[] = [];
  for (let from = 0; from < circuits.length; from += AT_ONCE) found.push(...(await solve(places.slice(from, from + AT_ONCE), circuits.slice(from, from + AT_ONCE))));
  return found;
}

async function solve(places: readonly { readonly corner: Corner; readonly point: Point }[], circuits: readonly Circuit[]): Promise<StaticPoint[]> {
  const saved = circuits.flatMap(({ name }) => [at('out', name), at('plus', name), outputCurrent(name)]);
  const run = await spice(netlist(circuits, '.op', ...saved));
  return places.map(({ corner, point }, k) => {
    const { name } = circuits[k]!;
    return { corner, point, output: run.value(at('out', name)), plus: run.value(at('plus', name)), current: run.value(outputCurrent(name)) };
  });
}
