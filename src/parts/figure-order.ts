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
  const left = keys(a);
  const right = keys(b);
  for (const [index, key] of left.entries()) {
    const other = right[index] ?? 0;
    if (key !== other) return key < other ? -1 : 1;
  }
  return 0;
}

const KIND_RANK: Readonly<Record<LimitKind, number>> = { min: 0, typ: 1, max: 2 };
const RANKS: ReadonlyMap<string, number> = new Map(Object.keys(PARAMETERS).map((parameter, index) => [parameter, index]));
const ENDS = ['ground', 'supply', 'mid-supply'] as const;
const NOT_STATED = Number.NEGATIVE_INFINITY;

function rank(parameter: string): number {
  return RANKS.get(parameter) ?? RANKS.size;
}

function keys({ load, supply, temperature, gain }: Condition): number[] {
  return [
    load === undefined ? 0 : load.kind === 'current' ? 1 : 2,
    load?.kind === 'current' ? load.amperes : 0,
    load?.kind === 'resistance' ? -load.ohms : 0,
    load?.kind === 'resistance' ? ENDS.indexOf(load.to) : 0,
    supply ?? NOT_STATED,
    temperature === 'over' ? Number.POSITIVE_INFINITY : (temperature ?? NOT_STATED),
    gain ?? NOT_STATED,
  ];
}
