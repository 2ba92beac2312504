import type { LimitKind } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import type { FieldKind } from '../quantities/kinds.js';
import type { Quantity, ReadingContext } from '../quantities/quantity.js';
import type { CellFault } from './cell-fault.js';
import type { ColumnReading } from './header.js';
import type { DecimalRule } from './decimal-mark.js';
import { possible } from './possible.js';
import { spreadsheetDamage } from './spreadsheet-damage.js';
import { isMissing } from './text-cell.js';
import { withUnit } from './unit-offer.js';

export type FigureColumn = Extract<ColumnReading, { kind: 'figure' }>;

export type FigureCell =
  | { readonly ok: true; readonly value: number | null; readonly notes: readonly string[] }
  | { readonly ok: false; readonly fault: CellFault };

const UNKNOWN: FigureCell = { ok: true, value: null, notes: [] };

/** A reader for the cells of one column. Values in a list repeat, so each text is read once. */
export function figureCellReader(column: FigureColumn, decimal: DecimalRule): (cell: string) => FigureCell {
  const known = new Map<string, FigureCell>();
  return (cell) => {
    const earlier = known.get(cell);
    if (earlier !== undefined) return earlier;
    const read = readFigureCell(cell, column, decimal);
    if (known.size < MOST_REMEMBERED) known.set(cell, read);
    return read;
  };
}

function readFigureCell(cell: string, column: FigureColumn, decimal: DecimalRule): FigureCell {
  if (isMissing(cell)) return UNKNOWN;
  const { field } = PARAMETERS[column.parameter];
  const number = readNumber(cell, field, contextOf(column.unit, decimal));
  if (!number.ok) return { ok: false, fault: withUnit(number.fault, cell, column) };
  const stated = number.quantity.limit ?? number.end;
  if (stated !== null && stated !== column.limit) return { ok: false, fault: kindFault(cell, stated, column.limit) };
  const kept = possible(column.parameter, number.value);
  if (!kept.ok) return kept;
  const notes = [number.quantity.note, kept.note];
  return { ok: true, value: kept.value, notes: notes.filter((note) => note !== undefined) };
}

export type NumberCell =
  | { readonly ok: true; readonly value: number; readonly end: 'min' | 'max' | null; readonly quantity: Quantity }
  | { readonly ok: false; readonly fault: CellFault };

/** One number from a cell that is not empty; `end` tells that the cell itself says it is a bound (`<5 mV`). */
export function readNumber(cell: string, field: FieldKind, context: ReadingContext): NumberCell {
  if (!/\p{N}/u.test(cell)) return { ok: false, fault: wordFault(cell, field) };
  const result = parseQuantity(cell, field, context);
  if (!result.ok) {
    const { code, message, fix, span } = result.problem;
    return { ok: false, fault: { code, reason: message, ...(fix === undefined ? {} : { fix }), span } };
  }
  const { min, nominal, max } = result.quantity;
  const given = [min, nominal, max].filter((value) => value !== undefined);
  const [value] = given;
  if (value === undefined || given.length > 1) return { ok: false, fault: severalFault(cell) };
  const end = nominal !== undefined ? null : min !== undefined ? 'min' : 'max';
  return { ok: true, value, end, quantity: result.quantity };
}

/** So many different cells of a column are remembered. */
const MOST_REMEMBERED = 10_000;

/** `readNumber` for one column: values in a list repeat, so each text is read once. */
export function numberReader(field: FieldKind, context: ReadingContext): (cell: string) => NumberCell {
  const known = new Map<string, NumberCell>();
  return (cell) => {
    const earlier = known.get(cell);
    if (earlier !== undefined) return earlier;
    const read = readNumber(cell, field, context);
    if (known.size < MOST_REMEMBERED) known.set(cell, read);
    return read;
  };
}

export function contextOf(unit: string | null, decimal: DecimalRule): ReadingContext {
  return { ...(unit === null ? {} : { headerUnit: unit }), ...(decimal === null ? {} : { decimal }) };
}

export function wordFault(cell: string, field: FieldKind): CellFault {
  const damage = spreadsheetDamage(cell);
  if (damage !== null) return damage;
  const kind = field.replace('_', ' ');
  return {
    code: 'I502',
    reason: `${cell.trim()} is text where a number (${kind}) is expected, and none of the words for "not known"`,
    fix: 'empty if unknown',
  };
}

function severalFault(cell: string): CellFault {
  const reason = `${cell.trim()} holds more than one figure; a canonical column takes one`;
  return { code: 'I508', reason, fix: 'one column each, named min, typ or max' };
}

function kindFault(cell: string, stated: LimitKind, limit: LimitKind): CellFault {
  return {
    code: 'I507',
    reason: `${cell.trim()} says ${stated}, the header says ${limit}`,
    fix: `move it to a column named ${stated}`,
  };
}
