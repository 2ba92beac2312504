import type Database from 'better-sqlite3';
import type { ListColumn } from '../intake/list.js';
import { isMissing } from '../intake/text-cell.js';
import type { LimitKind } from '../parts/figures.js';
import type { ListCell } from '../parts/part.js';
import { columnTables } from './import-columns.js';
import type { CurrentImport } from './imports.js';

/** Finds the cells of a part whose columns hold a parameter or an identity field; none for a part the import does not have. */
export function cellFinder(database: Database.Database): (from: CurrentImport, partId: string, figure: string) => ListCell[] {
  const tableOf = columnTables(database);
  const records = database.prepare<[number, string], RecordRow>('select line, row, cells from record where import_id = ? and part_id = ?');
  return (from, partId, figure) => {
    const columns = tableOf(from.id).all.filter((column) => holds(column, figure));
    const record = columns.length === 0 ? undefined : records.get(from.id, partId);
    if (record === undefined) return [];
    const cells = JSON.parse(record.cells) as string[];
    return columns.map((column) => cellOf(column, cells[column.number - 1] ?? '', { from, record }));
  };
}

interface RecordRow {
  readonly line: number;
  readonly row: number;
  readonly cells: string;
}

/** A column that says one thing; of a column for two ends or both rails no single cell can be named. */
function holds({ reading }: ListColumn, figure: string): boolean {
  if (reading.kind === 'figure') return reading.parameter === figure;
  if (reading.kind === 'measured') return reading.target === figure;
  if (reading.kind === 'identity') return reading.field === figure;
  return reading.kind === 'price' && figure === 'price';
}

function cellOf({ number, letter, header, reading }: ListColumn, cell: string, { from, record }: { readonly from: CurrentImport; readonly record: RecordRow }): ListCell {
  const { file } = from;
  const { line, row } = record;
  const kind: LimitKind | null = reading.kind === 'figure' || reading.kind === 'measured' ? reading.limit : null;
  const condition = reading.kind === 'figure' || reading.kind === 'measured' ? reading.condition : {};
  return { file, line, row, column: number, columnLetter: letter, header, cell, empty: isMissing(cell), kind, condition };
}
