import { compareFigures } from '../parts/figure-order.js';
import type { Part } from '../parts/part.js';
import type { CellFault } from './cell-fault.js';
import type { FigureColumn } from './figure-cell.js';
import { figureCellReader, readNumber } from './figure-cell.js';
import type { IdentityField } from './header-words.js';
import type { ColumnReading } from './header.js';
import type { ListColumn, ListOptions, ListRecord } from './list.js';
import type { CellReader } from './part-draft.js';
import { emptyDraft } from './part-draft.js';
import { readPartId } from './part-id.js';
import { priceCell } from './price-cell.js';
import { isMissing, readText } from './text-cell.js';
import { lifecycleCell, requiredStatusCell, STATEMENT_CELLS, statusCell } from './word-cells.js';

/** Told about each cell that is wrong, or was read with a note. */
export type Report = (column: ListColumn, fault: CellFault, severity: 'error' | 'warning') => void;
export type PartReader = (record: ListRecord, report: Report) => Part;

/** A reader of records for the columns of one list. Every cell is read, also after a fault, so that all faults are told at once. */
export function partReader(columns: readonly ListColumn[], options: ListOptions, decimal: 'point' | 'comma'): PartReader {
  const readers = columns.map((column) => ({ column, read: cellReader(column.reading, options, decimal) }));
  return (record, report) => {
    const draft = emptyDraft(options.tier);
    for (const { column, read } of readers) {
      read?.(draft, record.cells[column.number - 1] ?? '', (fault, severity) => report(column, fault, severity));
    }
    draft.figures.sort(compareFigures);
    return draft;
  };
}

function cellReader(reading: ColumnReading, options: ListOptions, decimal: 'point' | 'comma'): CellReader | null {
  if (reading.kind === 'identity') return identityReader(reading.field, options);
  if (reading.kind === 'statement') return STATEMENT_CELLS[reading.statement];
  if (reading.kind === 'price') return priceCell(reading, decimal);
  if (reading.kind === 'figure') return figureCell(reading, decimal);
  return null;
}

function identityReader(field: IdentityField, { tier }: ListOptions): CellReader {
  if (field === 'id') return readPartId;
  if (field === 'status') return tier === 'approved' ? requiredStatusCell : statusCell;
  if (field === 'lifecycle') return lifecycleCell;
  if (field === 'channels') return channelsCell;
  return (draft, cell) => void (draft[field] = readText(cell));
}

const channelsCell: CellReader = (draft, cell, report) => {
  if (isMissing(cell)) return;
  const number = readNumber(cell, 'count', {});
  if (!number.ok && /[^\d.,]/u.test(cell.trim())) return report(number.fault, 'error');
  if (number.ok && Number.isInteger(number.value) && number.value > 0 && number.value <= MOST_CHANNELS) draft.channels = number.value;
  else report({ code: 'I513', reason: `${cell.trim()} is not a number of amplifiers in one package`, fix: '1, 2 or 4; empty if unknown' }, 'error');
};

/** No package holds more amplifiers than this (common practice: one, two or four). */
const MOST_CHANNELS = 8;

function figureCell(column: FigureColumn, decimal: 'point' | 'comma'): CellReader {
  const { parameter, limit: kind, condition } = column;
  const read = figureCellReader(column, decimal);
  return (draft, cell, report) => {
    const result = read(cell);
    if (!result.ok) return report(result.fault, 'error');
    if (result.value === null) return;
    draft.figures.push({ parameter, kind, value: result.value, condition });
    for (const note of result.notes) report({ code: 'I515', reason: `${cell.trim()}: ${note}` }, 'warning');
  };
}
