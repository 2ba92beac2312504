import type { Problem } from '../quantities/problem.js';
import { cellProblem } from './cell-fault.js';
import { columnLetter } from './column-letter.js';
import type { Trial } from './delimiter.js';
import { trialWords } from './delimiter.js';
import type { ListColumn, ListRecord } from './list.js';
import type { ProblemLog } from './problem-log.js';
import { LIMITS } from './list.js';
import type { SplitFault, SplitText } from './split.js';

/** Faults of the file's structure. While there is one, no cell is read: its errors would be noise. */
export function structureProblems({ records, faults, undecided }: SplitText, file: string): Problem[] {
  if (undecided !== undefined) return [delimiterProblem(undecided, file)];
  const [header, ...rows] = records;
  const width = header === undefined ? null : { all: header.cells.length, named: namedWidth(header), id: idIndex(header) };
  return [
    ...faults.map((fault) => quoteProblem(fault, file)),
    ...(width === null ? [] : limitProblems(rows, width.all, file)),
    ...(width === null ? [] : rows.flatMap((row) => raggedProblem(row, width, file) ?? [])),
  ].sort((a, b) => (a.place?.line ?? 0) - (b.place?.line ?? 0));
}

/** A record with nothing in it: an empty line, or separators only. */
export function isBlank(record: ListRecord): boolean {
  return record.cells.every((cell) => cell.trim() === '');
}

/** The rows that hold something. A blank one between others is told; those at the end are the habit of spreadsheets. */
export function withoutBlank(rows: readonly ListRecord[], log: ProblemLog): ListRecord[] {
  const last = rows.findLastIndex((row) => !isBlank(row));
  return rows.filter((row, index) => {
    if (!isBlank(row)) return true;
    const place = { file: log.file, line: row.line, row: row.row };
    if (index < last) log.add({ code: 'I305', severity: 'warning', message: 'blank row skipped', place });
    return false;
  });
}

export function warnHeaderless(rows: readonly ListRecord[], columns: readonly ListColumn[], log: ProblemLog): void {
  const headerless = columns.filter(({ header }) => header === '');
  for (const record of rows) {
    for (const column of headerless) {
      if ((record.cells[column.number - 1] ?? '').trim() === '') continue;
      const fault = { code: 'I205', reason: 'a value in a column without header; it is not imported', fix: 'name the column' };
      log.add(cellProblem(fault, { file: log.file, record, column, part: null }, 'warning'));
    }
  }
}

/** Columns up to the last one with a header; those behind it are the trailing separators of a spreadsheet. */
function namedWidth(header: ListRecord): number {
  return header.cells.findLastIndex((cell) => cell.trim() !== '') + 1;
}

interface Width {
  readonly all: number;
  readonly named: number;
  /** Index of the id column; -1 without one. */
  readonly id: number;
}

function idIndex(header: ListRecord): number {
  return header.cells.findIndex((cell) => cell.trim().toLowerCase() === 'id');
}

function quoteProblem({ code, line, row, column }: SplitFault, file: string): Problem {
  const letter = columnLetter(column);
  const message =
    code === 'I303'
      ? `the quote opened in column ${letter} of line ${line} is never closed; the rest of the file is inside it`
      : `a quote in the middle of column ${letter}: inside a cell it is doubled, and the whole cell is quoted`;
  const fix = code === 'I303' ? 'close the quote at the end of the cell' : 'write 5" reel as "5"" reel"';
  return { code, severity: 'error', message, fix, place: { file, line, row, column, columnLetter: letter } };
}

function delimiterProblem(trials: readonly Trial[], file: string): Problem {
  const message = `what separates the cells cannot be told; split ${trials.map(trialWords).join('; ')}`;
  return { code: 'I306', severity: 'error', message, fix: 'one separator in the whole file, and quotes around a cell or header that holds it', place: { file, line: 1 } };
}

function raggedProblem(record: ListRecord, width: Width, file: string): Problem | null {
  const count = record.cells.length;
  if (isBlank(record) || (count >= width.named && count <= width.all)) return null;
  const over = count > width.all;
  const message = `${count} cells, the header has ${width.all}`;
  const place = { file, line: record.line, row: record.row, ...partOf(record, width.id) };
  return over
    ? { code: 'I301', severity: 'error', message, fix: 'quote the cell that holds a separator: "Low noise, dual"', place }
    : { code: 'I302', severity: 'error', message, fix: 'complete the row; leave a cell empty where nothing is known', place };
}

function partOf(record: ListRecord, id: number): { part?: string } {
  const text = record.cells[id]?.trim() ?? '';
  return text === '' ? {} : { part: text };
}

function limitProblems(rows: readonly ListRecord[], columns: number, file: string): Problem[] {
  const problems: Problem[] = [];
  const refuse = (message: string, line: number): void => {
    problems.push({ code: 'I105', severity: 'error', message, fix: 'split the list', place: { file, line } });
  };
  if (rows.length > LIMITS.records) refuse(`${rows.length} records, the limit is ${LIMITS.records}`, 1);
  if (columns > LIMITS.columns) refuse(`${columns} columns, the limit is ${LIMITS.columns}`, 1);
  for (const row of rows) {
    const long = row.cells.findIndex((cell) => cell.length > LIMITS.cell);
    if (long >= 0) refuse(`column ${columnLetter(long + 1)} holds a cell of more than 64 KiB; is a quote left open`, row.line);
  }
  return problems;
}
