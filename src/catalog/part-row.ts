import { compareFigures } from '../parts/figure-order.js';
import type { Condition, Figure, LimitKind, Parameter } from '../parts/figures.js';
import type { InputType, Lifecycle, Part, Status, Tier } from '../parts/part.js';
import type { FigureColumn } from './part-columns.js';
import { FIGURE_COLUMNS, IDENTITY_COLUMNS } from './part-columns.js';

export type Cell = string | number | null;

/** A figure within the points of its parameter, because it has a condition or is assumed: kind, value in SI, condition, and true when assumed. */
type Point = readonly [LimitKind, number, Condition, true?];

/** A part as the values of `PART_COLUMNS`. */
export function partToRow(part: Part): Cell[] {
  return [...identityCells(part), ...figureCells(part.figures)];
}

/** The part of a row that `partToRow` made; figures come back in canonical order. */
export function rowToPart(row: readonly Cell[]): Part {
  const figures: Figure[] = [];
  FIGURE_COLUMNS.forEach((column, index) => {
    const cell = row[IDENTITY_COLUMNS.length + index] ?? null;
    if (cell !== null) addFigures(figures, column, cell);
  });
  return { ...identityOf(row), figures: figures.sort(compareFigures) };
}

function identityCells(part: Part): Cell[] {
  return [
    part.tier, part.id, part.description, part.status, part.lifecycle, part.package, part.channels,
    part.qualification, part.class, part.family,
    part.price?.amount ?? null, part.price?.currency ?? null, part.price?.quantity ?? null,
    bit(part.phaseReversal), bit(part.inputClamp), part.inputType, bit(part.crossoverFree),
  ];
}

/** Everything of a row but its figures. */
export function identityOf(row: readonly Cell[]): Omit<Part, 'figures'> {
  const [tier, id, description, status, lifecycle, pack, channels, qualification, partClass, family, ...rest] = row;
  const [amount, currency, quantity, phaseReversal, inputClamp, inputType, crossoverFree] = rest;
  return {
    id: String(id), tier: tier as Tier, description: text(description), status: text(status) as Status | null,
    lifecycle: text(lifecycle) as Lifecycle | null, package: text(pack), channels: number(channels), qualification: text(qualification),
    class: text(partClass), family: text(family),
    price: typeof amount === 'number' ? { amount, currency: String(currency), quantity: number(quantity) } : null,
    phaseReversal: flag(phaseReversal), inputClamp: flag(inputClamp), inputType: text(inputType) as InputType | null,
    crossoverFree: flag(crossoverFree),
  };
}

function figureCells(figures: readonly Figure[]): Cell[] {
  const cells = new Array<Cell>(FIGURE_COLUMNS.length).fill(null);
  const points = new Map<number, Point[]>();
  for (const { parameter, kind, value, condition, assumed } of figures) {
    const isOneCell = isPlain(condition) && assumed !== true;
    const index = COLUMN_INDEX[parameter][isOneCell ? kind : 'points'];
    if (index === undefined) throw new RangeError(`${parameter} ${kind} has no column`);
    if (isOneCell) cells[index] = value;
    else points.set(index, [...(points.get(index) ?? []), assumed === true ? [kind, value, condition, true] : [kind, value, condition]]);
  }
  for (const [index, list] of points) cells[index] = JSON.stringify(list);
  return cells;
}

/** Nothing was stated. Asked for every figure of a list, so without making a list of the keys. */
function isPlain({ supply, load, temperature, gain }: Condition): boolean {
  return supply === undefined && load === undefined && temperature === undefined && gain === undefined;
}

const COLUMN_INDEX = columnIndex();

function columnIndex(): Readonly<Record<Parameter, Partial<Record<LimitKind | 'points', number>>>> {
  const index = Object.fromEntries(FIGURE_COLUMNS.map(({ parameter }) => [parameter, {}])) as Record<Parameter, Partial<Record<LimitKind | 'points', number>>>;
  FIGURE_COLUMNS.forEach(({ parameter, kind }, at) => { index[parameter][kind ?? 'points'] = at; });
  return index;
}

/** One for all figures without condition: a large list has millions of them. */
const PLAIN: Condition = Object.freeze({});

/** Adds what one cell of a figure column holds. */
export function addFigures(figures: Figure[], { parameter, kind }: FigureColumn, cell: string | number): void {
  if (kind !== null) return void figures.push({ parameter, kind, value: Number(cell), condition: PLAIN });
  for (const [limit, value, condition, assumed] of JSON.parse(String(cell)) as readonly Point[]) {
    figures.push({ parameter, kind: limit, value, condition, ...(assumed === true ? { assumed } : {}) });
  }
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
