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

/**
 * The parts as canonical CSV (RFC 4180: CR LF, quotes where needed) that `readList` reads back with identical figures.
 * Only columns that hold something, always in the same order; parts in the order given.
 */
export function writeList(parts: readonly Part[]): string {
  const columns = [...identityColumns(parts), ...priceColumns(parts), ...statementColumns(parts), ...figureColumns(parts)];
  const rows = parts.map((part) => columns.map(({ cell }) => cell(part)));
  return [columns.map(({ header }) => header), ...rows].map((cells) => `${cells.map(quote).join(',')}\r\n`).join('');
}

interface OutputColumn {
  readonly header: string;
  readonly cell: (part: Part) => string;
}

function identityColumns(parts: readonly Part[]): OutputColumn[] {
  return IDENTITY_FIELDS.filter((field) => field === 'id' || parts.some((part) => part[field] !== null)).map((field) => ({
    header: field,
    cell: (part) => guardCell(String(part[field] ?? '')),
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
  for (const { figures } of parts) for (const figure of figures) slots.set(figureSlot(figure), figure);
  const values = new Map(parts.map((part) => [part, new Map(part.figures.map((figure) => [figureSlot(figure), figure.value]))]));
  return [...slots.values()].sort(compareFigures).map((figure) => {
    const slot = figureSlot(figure);
    const cell = (part: Part): string => {
      const value = values.get(part)?.get(slot);
      return value === undefined ? '' : figureText(figure.parameter, value);
    };
    return { header: canonicalHeader(figure.parameter, figure.kind, figure.condition), cell };
  });
}

function quote(cell: string): string {
  return /[",\r\n]/u.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
