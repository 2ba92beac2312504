import { compareFigures } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import { figureSlot } from '../parts/figures.js';
import type { Part, Price } from '../parts/part.js';
import { canonicalHeader } from './canonical-header.js';
import { exactDecimal } from './exact.js';
import { figureText } from './figure-text.js';
import type { Statement } from './header-words.js';
import { IDENTITY_FIELDS, STATEMENTS } from './header-words.js';
import { guardCell } from './text-cell.js';

export interface WriteOptions {
  /** Cells that a spreadsheet would run are left as they are. */
  readonly raw?: boolean;
}

/**
 * The parts as canonical CSV (RFC 4180: CR LF, quotes where needed) that `readList` reads back with identical figures.
 * Only columns that hold something, always in the same order; parts in the order given.
 */
export function writeList(parts: readonly Part[], { raw = false }: WriteOptions = {}): string {
  const columns = [...identityColumns(parts, raw), ...priceColumns(parts), ...statementColumns(parts), ...figureColumns(parts)];
  const header = lineOf(columns.map((column) => column.header));
  return header + parts.map((part) => rowOf(part, columns)).join('');
}

/** How many cells `writeList` keeps a spreadsheet from running. */
export function guardedCells(parts: readonly Part[]): number {
  const cells = parts.flatMap((part) => IDENTITY_FIELDS.map((field) => String(part[field] ?? '')));
  return cells.filter((cell) => guardCell(cell) !== cell).length;
}

interface OutputColumn {
  readonly header: string;
  /** `values` are the figures of the part by slot. */
  readonly cell: (part: Part, values: ReadonlyMap<string, number>) => string;
}

function rowOf(part: Part, columns: readonly OutputColumn[]): string {
  const values = new Map(printed(part).map((figure) => [figureSlot(figure), figure.value]));
  return lineOf(columns.map(({ cell }) => cell(part, values)));
}

function lineOf(cells: readonly string[]): string {
  return `${cells.map(quote).join(',')}\r\n`;
}

function identityColumns(parts: readonly Part[], raw: boolean): OutputColumn[] {
  const written = raw ? (text: string): string => text : guardCell;
  return IDENTITY_FIELDS.filter((field) => field === 'id' || parts.some((part) => part[field] !== null)).map((field) => ({
    header: field,
    cell: (part) => written(String(part[field] ?? '')),
  }));
}

function priceColumns(parts: readonly Part[]): OutputColumn[] {
  const headers = new Set(parts.flatMap(({ price }) => (price === null ? [] : [priceHeader(price)])));
  return [...headers].sort().map((header) => ({
    header,
    cell: ({ price }) => (price !== null && priceHeader(price) === header ? exactDecimal(price.amount, 0) : ''),
  }));
}

function priceHeader({ currency, quantity }: Price): string {
  return quantity === null ? `price (${currency})` : `price (${currency}) @ ${quantity}`;
}

function statementColumns(parts: readonly Part[]): OutputColumn[] {
  return (Object.keys(STATEMENTS) as Statement[])
    .filter((statement) => parts.some((part) => part[statement] !== null))
    .map((statement) => ({ header: STATEMENTS[statement], cell: (part) => statementText(part[statement]) }));
}

function statementText(value: boolean | string | null): string {
  if (value === null) return '';
  return typeof value === 'string' ? value : value ? 'yes' : 'no';
}

function figureColumns(parts: readonly Part[]): OutputColumn[] {
  const slots = new Map<string, Figure>();
  for (const part of parts) for (const figure of printed(part)) slots.set(figureSlot(figure), figure);
  return [...slots].sort(([, a], [, b]) => compareFigures(a, b)).map(([slot, figure]) => ({
    header: canonicalHeader(figure.parameter, figure.kind, figure.condition),
    cell: (_, values) => {
      const value = values.get(slot);
      return value === undefined ? '' : figureText(figure.parameter, value);
    },
  }));
}

/** The canonical CSV has no word for an assumed figure, and without it one would come back as printed. */
const printed = ({ figures }: Part): readonly Figure[] => figures.filter(({ assumed }) => assumed !== true);

function quote(cell: string): string {
  return /[",\r\n]/u.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
