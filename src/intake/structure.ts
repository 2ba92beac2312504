import type { Problem } from '../quantities/problem.js';
import { isBlank } from './blank.js';
import { cellProblem } from './cell-fault.js';
import { columnLetter } from './column-letter.js';
import type { Trial } from './delimiter.js';
import { trialWords } from './delimiter.js';
import type { Limits } from './limits.js';
import type { ListColumn, ListRecord } from './list.js';
import type { ProblemLog } from './problem-log.js';
import { shiftedCell } from './shifted-cell.js';
import type { SplitFault } from './records.js';
import { isPartId } from './recognised.js';

export interface Structure {
  readonly header: ListRecord | null;
  readonly rows: readonly ListRecord[];
  readonly faults: readonly SplitFault[];
  readonly limits: Limits;
  /** What is offered for too many records. */
  readonly lift: string;
}

/** Faults of the file's structure. While there is one, no cell is read: its errors would be noise. */
export function structureProblems({ header, rows, faults, limits, lift }: Structure, file: string): Problem[] {
  const width = header === null ? null : widthOf(header);
  return [
    ...faults.map((fault) => quoteProblem(fault, { file, header })),
    ...(width === null ? [] : limitProblems(rows, { columns: width.all, limits, lift, file })),
    ...(width === null ? [] : rows.flatMap((row) => raggedProblem(row, width, file) ?? [])),
  ].sort((a, b) => (a.place?.line ?? 0) - (b.place?.line ?? 0));
}

/** True for a row that has as many cells as the header, or lacks only cells of columns without header. */
export function isWhole(record: ListRecord, header: ListRecord): boolean {
  const { all, named } = widthOf(header);
  return record.cells.length >= named && record.cells.length <= all;
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

export function warnHeaderless(rows: readonly ListRecord[], columns: readonly Pick<ListColumn, 'number' | 'letter' | 'header'>[], log: ProblemLog): void {
  const headerless = columns.filter(({ header }) => header === '');
  for (const record of rows) {
    for (const column of headerless) {
      if ((record.cells[column.number - 1] ?? '').trim() === '') continue;
      const fault = { code: 'I205', reason: 'a value in a column without header; it is not imported', fix: 'name the column' };
      log.add(cellProblem(fault, { file: log.file, record, column: { ...column, reading: { kind: 'text' } }, part: null }, 'warning'));
    }
  }
}

/** The columns of a header by their places alone, before anything is read into them. */
export function plainColumns({ cells }: ListRecord): Pick<ListColumn, 'number' | 'letter' | 'header'>[] {
  return cells.map((cell, index) => ({ number: index + 1, letter: columnLetter(index + 1), header: cell.trim() }));
}

interface Width {
  readonly all: number;
  /** Columns up to the last one with a header; those behind it are the trailing separators of a spreadsheet. */
  readonly named: number;
  /** Index of the id column; -1 without one. */
  readonly id: number;
  readonly headers: readonly string[];
}

function widthOf(header: ListRecord): Width {
  const named = header.cells.findLastIndex((cell) => cell.trim() !== '') + 1;
  return { all: header.cells.length, named, id: header.cells.findIndex(isPartId), headers: header.cells };
}

const SHOWN = 120;

function quoteProblem({ code, line, quoteLine, row, column, character, text }: SplitFault, { file, header }: { file: string; header: ListRecord | null }): Problem {
  const letter = columnLetter(column);
  const where = `line ${quoteLine}, character ${character}`;
  const first = text.split(',', 1)[0] ?? '';
  const message =
    code === 'I303'
      ? `the quote opened at ${where} is never closed; the rest of the file is inside it`
      : `a quote in the middle of a cell (${where}): inside a cell it is doubled, and the whole cell is quoted`;
  const fix = code === 'I303' ? `close it behind ${first.slice(0, SHOWN).trim() === '' ? 'the cell' : `"${first.slice(0, SHOWN)}`}` : `"${withDoubledQuote(text)}"`;
  const name = header?.cells[column - 1]?.trim() ?? '';
  const shown = text.length > SHOWN * 4 ? `${text.slice(0, SHOWN)}…` : text;
  return { code, severity: 'error', message, fix, text: shown, place: { file, line, row, column, columnLetter: letter, ...(name === '' ? {} : { header: name }) } };
}

/** `Nanopower 5 reel"` was `"Nanopower 5" reel"`: the quote that ended the cell too early belongs to it. */
function withDoubledQuote(text: string): string {
  const inches = /^(.*\d)(\s.*)"$/su.exec(text);
  return inches === null ? text.replaceAll('"', '""') : `${inches[1] ?? ''}""${inches[2] ?? ''}`;
}

/** What separates the cells cannot be told: what each delimiter would give, and the option that answers. */
export function delimiterProblem(trials: readonly Trial[], file: string): Problem {
  const message = `what separates the cells cannot be told; split ${trials.map(trialWords).join('; ')}`;
  const options = trials.map(({ delimiter }) => `--delimiter "${delimiter === '\t' ? 'tab' : delimiter}"`).join(' or ');
  return { code: 'I306', severity: 'error', message, fix: `${options}; or quotes around a cell or header that holds the other`, place: { file, line: 1 } };
}

function raggedProblem(record: ListRecord, width: Width, file: string): Problem | null {
  const count = record.cells.length;
  if (isBlank(record) || (count >= width.named && count <= width.all)) return null;
  const place = { file, line: record.line, row: record.row, ...partOf(record, width.id) };
  if (count > width.all) {
    const shifted = shiftedCell(record, width.headers);
    const named = width.named === width.all ? '' : ` (${width.named} named)`;
    const message = `${count} cells, the header has ${width.all}${named}${shifted === null ? '' : `; ${shifted.message}`}`;
    return { code: 'I301', severity: 'error', message, fix: shifted?.fix ?? 'quote the cell that holds a separator: "Low noise, dual"', place };
  }
  const missing = width.headers.slice(count, width.named).filter((header) => header.trim() !== '').map((header) => `"${header.trim()}"`);
  const message = `${count} cells, the header has ${width.named}; ${missing.slice(0, 4).join(', ')}${missing.length > 4 ? ', …' : ''} ${missing.length === 1 ? 'is' : 'are'} missing`;
  return { code: 'I302', severity: 'error', message, fix: 'complete the row; leave a cell empty where nothing is known', place };
}

function partOf(record: ListRecord, id: number): { part?: string } {
  const text = record.cells[id]?.trim() ?? '';
  return text === '' ? {} : { part: text };
}

interface LimitContext {
  readonly columns: number;
  readonly limits: Limits;
  readonly lift: string;
  readonly file: string;
}

function limitProblems(rows: readonly ListRecord[], { columns, limits, lift, file }: LimitContext): Problem[] {
  const problems: Problem[] = [];
  const refuse = (message: string, line: number, fix: string): void => void problems.push({ code: 'I105', severity: 'error', message, fix, place: { file, line } });
  if (rows.length > limits.records) refuse(`${rows.length} records, the limit is ${limits.records}`, 1, lift);
  if (columns > limits.columns) refuse(`${columns} columns, the limit is ${limits.columns}`, 1, 'leave out the columns nothing reads');
  for (const row of rows) {
    const long = row.cells.findIndex((cell) => cell.length > limits.cell);
    if (long >= 0) refuse(`column ${columnLetter(long + 1)} holds a cell of more than 64 KiB; is a quote left open`, row.line, 'close the quote, or shorten the cell');
  }
  return problems;
}
