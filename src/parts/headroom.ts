import { weakest, type Basis } from './basis.js';
import { derateHeadroom, HEADROOM_PER_KELVIN } from './derating.js';
import { figureSlot, type Figure, type LoadCondition } from './figures.js';
import type { Outlook, PartUnderTest } from './reading.js';
import { basisOf, distanceFrom, howRead, isAway, limitsFirst, temperatureRank, usable } from './select.js';

export type Side = 'low' | 'high';

/** One head-room point of a part. Current is found at the vertex, since a point without a supply counts as rated there. */
export interface HeadroomPoint {
  readonly load: LoadCondition;
  /** Volts; null: not stated. */
  readonly supply: number | null;
  readonly printed: number;
  /** As it counts in the outlook, before any scaling. */
  readonly value: number;
  readonly basis: Basis;
  readonly slot: string;
  readonly how: string | null;
  /** Measured with the load helping towards the rail. */
  readonly assisted: boolean;
  /** Assumed for this run without a load: it holds at whatever current flows. */
  readonly anywhere: boolean;
}

/** A point that states no load is taken as 10 kΩ to mid-supply (assumed; the best possible is no loss at all). */
const UNSTATED_LOAD: LoadCondition = { kind: 'resistance', ohms: 10e3, to: 'mid-supply' };

/** The head-room points of one side, one per load and supply: the limit, else the typical figure. */
export function headroomPoints(test: PartUnderTest, side: Side): HeadroomPoint[] {
  const figures = usable(test, side === 'low' ? 'outputLowHeadroom' : 'outputHighHeadroom');
  const groups = new Map<string, Figure[]>();
  for (const figure of figures) {
    const key = JSON.stringify([figure.condition.load ?? null, figure.condition.supply ?? null]);
    groups.set(key, [...(groups.get(key) ?? []), figure]);
  }
  return [...groups.values()].map((group) => pointOf(test, side, pickTemperature(test, group)));
}

/** One load and supply rated at several temperatures: limits first, then the one that needs no estimate, then the nearest, then the larger. */
function pickTemperature(test: PartUnderTest, group: readonly Figure[]): Figure {
  const rank = (figure: Figure): number => (isAway(figure, test.operating) ? 1e9 : 0) + temperatureRank(figure, test.operating);
  const [first, ...rest] = limitsFirst(group);
  if (first === undefined) throw new RangeError('a group of head-room figures is empty');
  const isBetter = (next: Figure, best: Figure): boolean => rank(next) < rank(best) || (rank(next) === rank(best) && next.value > best.value);
  return rest.reduce((best, next) => (isBetter(next, best) ? next : best), first);
}

function pointOf(test: PartUnderTest, side: Side, figure: Figure): HeadroomPoint {
  const { load, supply } = figure.condition;
  const away = isAway(figure, test.operating);
  const factor = away ? 1 + HEADROOM_PER_KELVIN * distanceFrom(25, test.operating) : 1;
  const bases: Basis[] = [basisOf(figure, test.operating)];
  if (away) bases.push('estimated');
  const anywhere = isAnywhere(figure);
  if (load === undefined || supply === undefined) bases.push('assumed');
  const pessimistic = (figure.kind === 'typ' ? derateHeadroom(figure.value) : figure.value) * factor;
  const best = load === undefined || figure.assumed === true ? 0 : figure.value;
  return {
    load: load ?? UNSTATED_LOAD,
    supply: supply ?? null,
    printed: figure.value,
    value: test.outlook === 'optimistic' ? best : pessimistic,
    basis: weakest(bases),
    slot: figureSlot(figure),
    how: test.brief === true ? null : howOf(test.outlook, figure, factor),
    assisted: load?.kind === 'resistance' && load.to === (side === 'low' ? 'ground' : 'supply'),
    anywhere,
  };
}

const isAnywhere = (figure: Figure): boolean => figure.assumed === true && figure.condition.load === undefined;

function howOf(outlook: Outlook, figure: Figure, factor: number): string | null {
  const derated = [
    ...(figure.kind === 'typ' ? ['typical + half its magnitude'] : []),
    ...(factor === 1 ? [] : [`25 °C figure × ${Number(factor.toPrecision(4))}`]),
  ];
  const read = howRead(outlook, figure, derated.length === 0 ? null : derated.join(', '));
  if (isAnywhere(figure)) return 'at whatever current flows';
  const steps = [
    ...(read === null ? [] : [read]),
    ...(figure.condition.load === undefined ? ['load not stated: 10 kΩ to mid-supply'] : []),
    ...(figure.condition.supply === undefined ? ['supply not stated: as at the stage'] : []),
  ];
  return steps.length === 0 ? null : steps.join(', ');
}

/** Current towards the side's rail at which a point was measured, A: its own load, connection and supply, as printed. */
export function pointCurrent(point: HeadroomPoint, side: Side, supply: number): number {
  if (point.load.kind === 'current') return point.load.amperes;
  const end = { ground: 0, supply, 'mid-supply': supply / 2 }[point.load.to];
  const output = side === 'high' ? supply - point.printed : point.printed;
  const flowing = side === 'high' ? output - end : end - output;
  return Math.max(0, flowing / point.load.ohms);
}
