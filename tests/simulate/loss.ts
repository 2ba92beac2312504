import { countedHeadroom, type Print, type Reading } from './reading.js';
import type { Loss } from './part-drawn.js';
import type { DrawnStage } from './stage-drawn.js';

export type Side = 'low' | 'high';

/** One head-room point as printed: at a current, or at a resistance and where it goes. Null supply: not said. */
export interface PrintedPoint {
  readonly volts: number;
  readonly supply: number | null;
  readonly load: { readonly amperes: number } | { readonly ohms: number; readonly to: 'rail' | 'mid-supply' };
}

export interface PrintedCurve {
  readonly side: Side;
  readonly print: Print;
  readonly points: readonly PrintedPoint[];
}

/** A point on the bench: the current that flowed when it was measured. `rail`: the load goes to the other rail. */
export function measuredCurrent(point: PrintedPoint, supply: number): number {
  if ('amperes' in point.load) return point.load.amperes;
  const across = supply - point.volts - (point.load.to === 'mid-supply' ? supply / 2 : 0);
  return Math.max(0, across / point.load.ohms);
}

type Knot = readonly [amperes: number, volts: number];

/**
 * What the output loses on a supply, by the written rules: the set rated nearest at or below as it is, the nearest above as at
 * that supply with (VS1 − 0.7)/(VS2 − 0.7), the smaller of both; straight lines between points; beyond the heaviest a line on.
 */
export function lossOf(curve: PrintedCurve, at: { stage: DrawnStage; supply: number }, reading: Reading): Loss {
  const ratings = [...new Set(curve.points.map((point) => point.supply ?? at.supply))].sort((a, b) => a - b);
  const below = ratings.filter((rated) => rated <= at.supply + 1e-9).at(-1);
  const above = ratings.find((rated) => rated > at.supply + 1e-9);
  const sets = [
    ...(below === undefined ? [] : [knotsOf(curve, { ...at, rated: below, factor: 1 }, reading)]),
    ...(above === undefined ? [] : [knotsOf(curve, { ...at, rated: above, factor: reading === 'pessimistic' ? (above - 0.7) / (at.supply - 0.7) : 1 }, reading)]),
  ].map((knots) => (reading === 'pessimistic' ? drawnOn(knots) : knots));
  return {
    text: (current) => {
      const texts = sets.map((knots) => `pwl(${current},${lines(knots)})`);
      return texts.length === 1 ? texts[0]! : `min(${texts.join(',')})`;
    },
    at: (amperes) => Math.min(...sets.map((knots) => onLines(knots, amperes))),
  };
}

interface Set {
  readonly stage: DrawnStage;
  readonly supply: number;
  readonly rated: number;
  readonly factor: number;
}

function knotsOf(curve: PrintedCurve, { stage, supply, rated, factor }: Set, reading: Reading): Knot[] {
  return curve.points
    .filter((point) => (point.supply ?? supply) === rated)
    .map((point): Knot => [measuredCurrent(point, rated), factor * countedHeadroom({ print: curve.print, value: point.volts, stage }, reading, true)])
    .sort((a, b) => a[0] - b[0]);
}

const FAR = 1000;

/** A straight line on from the last two points; through the origin when there is one. */
function drawnOn(knots: readonly Knot[]): Knot[] {
  const [amperes, volts] = knots.at(-1)!;
  if (amperes === 0) return [...knots];
  const [before, less] = knots.at(-2) ?? [0, 0];
  const slope = Math.max(0, (volts - less) / (amperes - before));
  return [...knots, [FAR * amperes, volts + slope * (FAR - 1) * amperes]];
}

/** Held at the first value before, and at the last behind. */
function lines(knots: readonly Knot[]): string {
  const all: Knot[] = [[-10, knots[0]![1]], ...(knots[0]![0] > 0 ? knots : knots.slice(1)), ...(knots[0]![0] > 0 ? [] : [[0, knots[0]![1]] as Knot])]
    .sort((a, b) => a[0] - b[0]) as Knot[];
  return [...all, [all.at(-1)![0] + 10, all.at(-1)![1]] as Knot].flat().join(',');
}

function onLines(knots: readonly Knot[], amperes: number): number {
  const at = knots.findIndex(([current]) => current >= amperes);
  if (at < 0) return knots.at(-1)![1];
  const [upper, volts] = knots[at]!;
  const [lower, less] = knots[at - 1] ?? [upper, volts];
  return upper === lower ? volts : less + ((amperes - lower) / (upper - lower)) * (volts - less);
}
