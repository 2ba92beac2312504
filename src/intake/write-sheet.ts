import { compareFigures } from '../parts/figure-order.js';
import type { Condition, LimitKind, Parameter } from '../parts/figures.js';
import { canonicalHeader } from './canonical-header.js';
import type { IdentityField } from './header-words.js';
import { SHEET_HEADER } from './patch-sheet.js';
import { guardCell } from './text-cell.js';

/** What one cell of a look-up sheet is for. */
export type SheetField =
  | { readonly parameter: Parameter; readonly kind: LimitKind; readonly condition: Condition }
  | { readonly identity: IdentityField }
  | { readonly currency: string };

/** One part of a look-up sheet. */
export interface SheetRow {
  readonly id: string;
  /** What is wanted and what it must be, in words. */
  readonly wanted: string;
  readonly fields: readonly SheetField[];
}

/** In the cells to be filled: a word for "not known", so that a cell nobody filled is read as one. */
const TO_FILL = '?';

/** A sheet to fill in (RFC 4180): id, what is wanted in words, and a canonical column for each figure; cells to be filled hold a question mark. */
export function writeSheet(rows: readonly SheetRow[]): string {
  const fields = new Map(rows.flatMap((row) => row.fields.map((field): [string, SheetField] => [headerOf(field), field])));
  const headers = [...fields].sort(([, a], [, b]) => compareFields(a, b)).map(([header]) => header);
  const lines = rows.map(({ id, wanted, fields: own }) => {
    const asked = new Set(own.map(headerOf));
    return [guardCell(id), guardCell(wanted), ...headers.map((header) => (asked.has(header) ? TO_FILL : ''))];
  });
  return [['id', SHEET_HEADER, ...headers], ...lines].map((cells) => `${cells.map(quote).join(',')}\r\n`).join('');
}

function headerOf(field: SheetField): string {
  if ('identity' in field) return field.identity;
  return 'currency' in field ? `price (${field.currency})` : canonicalHeader(field.parameter, field.kind, field.condition);
}

/** As the canonical CSV has them: identity, price, figures. */
function compareFields(a: SheetField, b: SheetField): number {
  if ('parameter' in a && 'parameter' in b) return compareFigures(a, b);
  const place = (field: SheetField): number => ('identity' in field ? 0 : 'currency' in field ? 1 : 2);
  return place(a) - place(b) || (headerOf(a) < headerOf(b) ? -1 : 1);
}

function quote(cell: string): string {
  return /[",\r\n]/u.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
