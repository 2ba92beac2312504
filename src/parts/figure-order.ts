import type { Condition, Figure, LimitKind } from './figures.js';
import { PARAMETERS } from './figures.js';

type Placed = Pick<Figure, 'parameter' | 'kind' | 'condition'>;

/** Canonical order: parameter as in `PARAMETERS`, then min-typ-max, then condition. Zero means the same slot. */
export function compareFigures(a: Placed, b: Placed): number {
  return (
    rank(a.parameter) - rank(b.parameter) || KIND_RANK[a.kind] - KIND_RANK[b.kind] || compareConditions(a.condition, b.condition)
  );
}

/** Lighter loads first (currents before resistances), then rising supply, temperature and gain; what is not stated comes first. */
export function compareConditions(a: Condition, b: Condition): number {
  // Parts of one list share the conditions of its columns, and most figures have none.
  if (a === b) return 0;
  return (
    order(loadRank(a), loadRank(b)) ||
    order(amperes(a), amperes(b)) ||
    order(-ohms(a), -ohms(b)) ||
    order(end(a), end(b)) ||
    order(a.supply ?? NOT_STATED, b.supply ?? NOT_STATED) ||
    order(temperature(a), temperature(b)) ||
    order(a.gain ?? NOT_STATED, b.gain ?? NOT_STATED)
  );
}

const order = (a: number, b: number): number => (a === b ? 0 : a < b ? -1 : 1);

const KIND_RANK: Readonly<Record<LimitKind, number>> = { min: 0, typ: 1, max: 2 };
const RANKS: ReadonlyMap<string, number> = new Map(Object.keys(PARAMETERS).map((parameter, index) => [parameter, index]));
const ENDS = ['ground', 'supply', 'mid-supply'] as const;
const NOT_STATED = Number.NEGATIVE_INFINITY;

function rank(parameter: string): number {
  return RANKS.get(parameter) ?? RANKS.size;
}

const loadRank = ({ load }: Condition): number => (load === undefined ? 0 : load.kind === 'current' ? 1 : 2);
const amperes = ({ load }: Condition): number => (load?.kind === 'current' ? load.amperes : 0);
const ohms = ({ load }: Condition): number => (load?.kind === 'resistance' ? load.ohms : 0);
const end = ({ load }: Condition): number => (load?.kind === 'resistance' ? ENDS.indexOf(load.to) : 0);
const temperature = (condition: Condition): number => (condition.temperature === 'over' ? Number.POSITIVE_INFINITY : (condition.temperature ?? NOT_STATED));
