import { compareFigures } from '../parts/figure-order.js';
import type { Condition, Figure, LimitKind } from '../parts/figures.js';
import type { InputType, Lifecycle, Part, Status, Tier } from '../parts/part.js';
import type { FigureColumn } from './part-columns.js';
import { FIGURE_COLUMNS, IDENTITY_COLUMNS } from './part-columns.js';

export type Cell = string | number | null;

/** A figure under a condition within the points of its parameter: kind, value in SI, condition. */
type Point = readonly [LimitKind, number, Condition];

/** A part as the values of `PART_COLUMNS`. */
export function partToRow(part: Part): Cell[] {
  return [...identityCells(part), ...figureCells(part.figures)];
}

/** The part of a row that `partToRow` made; figures come back in canonical order. */
export function rowToPart(row: readonly Cell[]): Part {
  const figures = FIGURE_COLUMNS.flatMap((column, index) => figuresOf(column, row[IDENTITY_COLUMNS.length + index] ?? null));
  return { ...identityOf(row), figures: figures.sort(compareFigures) };
}

function identityCells(part: Part): Cell[] {
  return [
    part.tier, part.id, part.description, part.status, part.lifecycle, part.package, part.channels,
    part.qualification, part.class, part.family,
    part.price?.amount ?? null, part.price?.currency ?? null, part.price?.quantity ?? null,
    bit(part.phaseReversal), bit(part.inputClamp), part.inputType,
  ];
}

function identityOf(row: readonly Cell[]): Omit<Part, 'figures'> {
  const [tier, id, description, status, lifecycle, pack, channels, qualification, partClass, family, ...rest] = row;
  const [amount, currency, quantity, phaseReversal, inputClamp, inputType] = rest;
  return {
    id: String(id), tier: tier as Tier, description: text(description), status: text(status) as Status | null,
    lifecycle: text(lifecycle) as Lifecycle | null, package: text(pack), channels: number(channels), qualification: text(qualification),
    class: text(partClass), family: text(family),
    price: typeof amount === 'number' ? { amount, currency: String(currency), quantity: number(quantity) } : null,
    phaseReversal: flag(phaseReversal), inputClamp: flag(inputClamp), inputType: text(inputType) as InputType | null,
  };
}

function figureCells(figures: readonly Figure[]): Cell[] {
  const cells = FIGURE_COLUMNS.map((): Cell => null);
  const points = new Map<number, Point[]>();
  for (const { parameter, kind, value, condition } of figures) {
    const isPlain = Object.keys(condition).length === 0;
    const index = COLUMN_INDEX.get(isPlain ? `${parameter}.${kind}` : parameter);
    if (index === undefined) throw new RangeError(`${parameter} ${kind} has no column`);
    if (isPlain) cells[index] = value;
    else points.set(index, [...(points.get(index) ?? []), [kind, value, condition]]);
  }
  for (const [index, list] of points) cells[index] = JSON.stringify(list);
  return cells;
}

const COLUMN_INDEX: ReadonlyMap<string, number> = new Map(
  FIGURE_COLUMNS.map(({ parameter, kind }, index) => [kind === null ? parameter : `${parameter}.${kind}`, index]),
);

function figuresOf({ parameter, kind }: FigureColumn, cell: Cell): Figure[] {
  if (cell === null) return [];
  if (kind !== null) return [{ parameter, kind, value: Number(cell), condition: {} }];
  const points = JSON.parse(String(cell)) as readonly Point[];
  return points.map(([kind, value, condition]) => ({ parameter, kind, value, condition }));
}

function text(cell: Cell | undefined): string | null {
  return typeof cell === 'string' ? cell : null;
}

function number(cell: Cell | undefined): number | null {
  return typeof cell === 'number' ? cell : null;
}

function bit(value: boolean | null): number | null {
  return value === null ? null : Number(value);
}

function flag(cell: Cell | undefined): boolean | null {
  return typeof cell === 'number' ? cell === 1 : null;
}
