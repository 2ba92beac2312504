import { figureSlot } from '../parts/figures.js';
import type { Problem } from '../quantities/problem.js';
import { cellProblem } from './cell-fault.js';
import type { CellFault } from './cell-fault.js';
import { columnLetter } from './column-letter.js';
import { readHeader } from './header.js';
import type { ColumnReading } from './header.js';
import type { ListColumn, ListRecord } from './list.js';

export interface HeaderRow {
  readonly columns: readonly ListColumn[];
  readonly problems: readonly Problem[];
}

/** Reads the header record: every column with its meaning, and everything that is wrong with the headers. */
export function readColumns(record: ListRecord, file: string): HeaderRow {
  const problems: Problem[] = [];
  const columns = record.cells.map((cell, index) => {
    const header = cell.replace(/\s+/gu, ' ').trim();
    const place = { number: index + 1, letter: columnLetter(index + 1), header };
    const reading = readHeader(header);
    if (reading.kind !== 'problem') return { ...place, reading };
    const column: ListColumn = { ...place, reading: { kind: 'text' } };
    const fix = reading.fix === undefined ? {} : { fix: reading.fix };
    problems.push(cellProblem({ code: 'I204', reason: `"${header}": ${reading.reason}`, ...fix }, { file, record, column, part: null }));
    return column;
  });
  const report = (column: ListColumn, fault: CellFault, severity: Problem['severity']): void => {
    problems.push(cellProblem(fault, { file, record, column, part: null }, severity));
  };
  reportUnknown(columns, problems, report);
  reportDuplicates(columns, report);
  reportMissingId(columns, report);
  return { columns, problems };
}

/** What makes two columns the same: a slot of the part, or the same text. Null for columns without header. */
export function columnKey({ header, reading }: Pick<ListColumn, 'header' | 'reading'>): string | null {
  if (reading.kind === 'text') return header === '' ? null : `text ${header}`;
  return readingKey(reading);
}

type Report = (column: ListColumn, fault: CellFault, severity: Problem['severity']) => void;

function readingKey(reading: Exclude<ColumnReading, { kind: 'text' }>): string {
  if (reading.kind === 'identity') return reading.field;
  if (reading.kind === 'statement') return reading.statement;
  if (reading.kind === 'price') return `price ${reading.currency ?? ''} ${reading.quantity ?? ''}`;
  return figureSlot({ parameter: reading.parameter, kind: reading.limit, condition: reading.condition });
}

function reportUnknown(columns: readonly ListColumn[], problems: readonly Problem[], report: Report): void {
  const refused = new Set(problems.map((problem) => problem.place?.column));
  for (const column of columns) {
    if (column.reading.kind !== 'text' || column.header === '' || refused.has(column.number)) continue;
    const { suggestion } = column.reading;
    const meant = suggestion === undefined ? '' : `; did you mean "${suggestion}"`;
    const reason = `"${column.header}" is not a column of the canonical list; kept as text${meant}`;
    report(column, { code: 'I203', reason, ...(suggestion === undefined ? {} : { fix: suggestion }) }, 'warning');
  }
}

function reportDuplicates(columns: readonly ListColumn[], report: Report): void {
  const first = new Map<string, ListColumn>();
  for (const column of columns) {
    const key = columnKey(column);
    if (key === null) continue;
    const earlier = first.get(key);
    if (earlier === undefined) first.set(key, column);
    else {
      const reason = `"${column.header}" is the same field as column ${earlier.letter} "${earlier.header}"`;
      report(column, { code: 'I201', reason, fix: 'keep one of the two columns, or name kind and condition of each' }, 'error');
    }
  }
}

function reportMissingId(columns: readonly ListColumn[], report: Report): void {
  const first = columns[0];
  if (first === undefined || columns.some(({ reading }) => reading.kind === 'identity' && reading.field === 'id')) return;
  report(first, { code: 'I206', reason: 'no column is named id; every part needs one', fix: 'id' }, 'error');
}
