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
  const row = identityCells(part);
  while (row.length < WIDTH) row.push(null);
  placeFigures(row, part.figures);
  return row;
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

const WIDTH = IDENTITY_COLUMNS.length + FIGURE_COLUMNS.length;

function placeFigures(row: Cell[], figures: readonly Figure[]): void {
  const points = new Map<number, string>();
  for (const figure of figures) {
    const { parameter, kind, value, condition } = figure;
    const isOneCell = figure.assumed !== true && isPlain(condition);
    const index = COLUMN_INDEX.get(parameter)?.[isOneCell ? kind : 'points'];
    if (index === undefined) throw new RangeError(`${parameter} ${kind} has no column`);
    if (isOneCell) row[index] = value;
    else points.set(index, points.has(index) ? `${points.get(index) ?? ''},${pointText(figure)}` : pointText(figure));
  }
  for (const [index, texts] of points) row[index] = `[${texts}]`;
}

/** A `Point` as JSON. */
function pointText({ kind, value, condition, assumed }: Figure): string {
  return `["${kind}",${JSON.stringify(value)},${conditionText(condition)}${assumed === true ? ',true' : ''}]`;
}

const CONDITION_TEXTS = new WeakMap<Condition, string>();

/** The figures of a column share their condition, so each is written once. */
function conditionText(condition: Condition): string {
  const known = CONDITION_TEXTS.get(condition);
  if (known !== undefined) return known;
  const text = JSON.stringify(condition);
  CONDITION_TEXTS.set(condition, text);
  return text;
}

/** Nothing was stated. Asked for every figure of a list, so without making a list of the keys. */
function isPlain({ supply, load, temperature, gain }: Condition): boolean {
  return supply === undefined && load === undefined && temperature === undefined && gain === undefined;
}

const COLUMN_INDEX = columnIndex();

type Places = Record<LimitKind | 'points', number | undefined>;

/** Where in the row a kind of a parameter stands, and its points. */
function columnIndex(): ReadonlyMap<Parameter, Places> {
  const index = new Map<Parameter, Places>();
  FIGURE_COLUMNS.forEach(({ parameter, kind }, at) => {
    const places = index.get(parameter) ?? { min: undefined, typ: undefined, max: undefined, points: undefined };
    index.set(parameter, places);
    places[kind ?? 'points'] = IDENTITY_COLUMNS.length + at;
  });
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
