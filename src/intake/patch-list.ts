import { compareFigures } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { canonicalHeader } from './canonical-header.js';
import { cellProblem } from './cell-fault.js';
import { columnLetter } from './column-letter.js';
import { IDENTITY_FIELDS, STATEMENTS, type Statement } from './header-words.js';
import type { ListColumn, ListRecord, PatchedCell, ReadList } from './list.js';
import { sourceColumn } from './list-sources.js';
import { patchDoubts } from './patch-checks.js';
import { isSheetNote } from './patch-sheet.js';
import { slotOf } from './slot.js';
import { isMissing } from './text-cell.js';

/** The list with the filled cells of a sheet, or everything that stands against it. */
export type PatchResult =
  | { readonly ok: true; readonly list: ReadList; readonly cells: number; readonly parts: number }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** One part of the sheet, what it adds to the part of the list. */
export interface Patched {
  readonly index: number;
  readonly part: Part;
  readonly record: ListRecord;
  /** New figures and the column of the sheet each stands in. */
  readonly figures: readonly { readonly figure: Figure; readonly column: ListColumn }[];
  /** New identity fields and statements. */
  readonly fields: readonly { readonly field: keyof Part; readonly column: ListColumn }[];
}

/**
 * Adds the filled cells of a sheet to the list in force; everything else stays. A sheet fills gaps: what the list knows already must be
 * the same. All or nothing.
 */
export function patchList(base: ReadList, sheet: ReadList): PatchResult {
  const indices = new Map(base.parts.map(({ id }, index) => [id, index]));
  const problems: Problem[] = [...unreadColumns(sheet)];
  const patched = sheet.parts.flatMap((told, at): Patched[] => {
    const index = indices.get(told.id);
    const record = sheet.records[at];
    if (record === undefined) return [];
    if (index === undefined) {
      problems.push(unknownPart(told.id, { base, sheet, record }));
      return [];
    }
    return [patchOf({ told, at, record, index }, { base, sheet, problems })];
  });
  const filled = patched.filter(({ figures, fields }) => figures.length + fields.length > 0);
  if (problems.length === 0 && filled.length === 0 && !sheet.parts.some((part) => saysSomething(part))) problems.push(nothingFilled(sheet.file));
  const doubts = problems.length > 0 ? [] : patchDoubts(filled, base, sheet);
  const faults = [...problems, ...doubts.filter(({ severity }) => severity === 'error')];
  if (faults.length > 0) return { ok: false, problems: faults };
  return { ok: true, list: { ...merged(base, filled, sheet), warnings: [...sheet.warnings, ...doubts] }, cells: filled.reduce((sum, { figures, fields }) => sum + figures.length + fields.length, 0), parts: filled.length };
}

interface Told {
  readonly told: Part;
  /** In the sheet, and in the list. */
  readonly at: number;
  readonly index: number;
  readonly record: ListRecord;
}

interface Patching {
  readonly base: ReadList;
  readonly sheet: ReadList;
  readonly problems: Problem[];
}

function patchOf({ told, at, record, index }: Told, { base, sheet, problems }: Patching): Patched {
  const known = base.parts[index] ?? told;
  const differs = (column: ListColumn, was: string): void =>
    void problems.push(cellProblem({ code: 'I803', reason: `the list already says ${was} there; a look-up sheet fills gaps and changes nothing that is known`, fix: `clear the cell, or correct ${base.file} and import it` }, { file: sheet.file, record, column, part: told.id }));
  const figures = told.figures.flatMap((figure) => {
    const column = sourceColumn(sheet, slotOf(figure), at);
    const there = known.figures.find((one) => slotOf(one) === slotOf(figure) && one.assumed !== true);
    if (column === null) return [];
    if (there === undefined) return [{ figure, column }];
    if (there.value !== figure.value) differs(column, `${canonicalHeader(figure.parameter, figure.kind, figure.condition)} = ${whereOf(base, { index, slot: slotOf(figure) })}`);
    return [];
  });
  const fields = FIELDS.flatMap((field) => {
    const column = sheet.columns.find((one) => fieldOf(one) === field);
    if (column === undefined || told[field] === null) return [];
    if (known[field] === null) return [{ field, column }];
    if (JSON.stringify(known[field]) !== JSON.stringify(told[field])) differs(column, `${field} ${wordOf(known[field])}`);
    return [];
  });
  const added = { ...known, ...Object.fromEntries(fields.map(({ field }) => [field, told[field]])) };
  const slots = new Set(figures.map(({ figure }) => slotOf(figure)));
  const kept = known.figures.filter((one) => !slots.has(slotOf(one)));
  return { index, record, figures, fields, part: { ...added, figures: [...kept, ...figures.map(({ figure }) => figure)].sort(compareFigures) } };
}

const FIELDS: readonly (keyof Part)[] = [...IDENTITY_FIELDS.filter((field) => field !== 'id'), ...(Object.keys(STATEMENTS) as Statement[]), 'price'];

function fieldOf({ reading }: ListColumn): string | null {
  if (reading.kind === 'identity') return reading.field;
  if (reading.kind === 'statement') return reading.statement;
  return reading.kind === 'price' ? 'price' : null;
}

/** The cell of the list, as written, and where it stands. */
function whereOf(base: ReadList, { index, slot }: { readonly index: number; readonly slot: string }): string {
  const sheet = base.patched?.get(index)?.[slot];
  if (sheet !== undefined) return `"${sheet.cell.trim()}" (${sheet.file} ${sheet.columnLetter}${sheet.row})`;
  const column = sourceColumn(base, slot, index);
  const record = base.records[index];
  return column === null || record === undefined ? 'another value' : `"${(record.cells[column.number - 1] ?? '').trim()}" (${base.file} ${column.letter}${record.row})`;
}

const wordOf = (value: unknown): string => (typeof value === 'string' ? value : JSON.stringify(value));

const saysSomething = (part: Part): boolean => part.figures.length > 0 || FIELDS.some((field) => part[field] !== null);

function unknownPart(id: string, { base, sheet, record }: { readonly base: ReadList; readonly sheet: ReadList; readonly record: ListRecord }): Problem {
  const near = suggest(id, base.parts.map((part) => part.id));
  const fix = near.length === 0 ? `a part of ${base.file}; a new part belongs in the list itself` : near.join(', ');
  const fault = { code: 'I801', reason: `${id} is no part of the list in force (${base.file})`, fix };
  const column = sheet.columns.find((one) => fieldOf(one) === 'id');
  if (column !== undefined) return cellProblem(fault, { file: sheet.file, record, column, part: id });
  return { code: fault.code, severity: 'error', message: fault.reason, fix, place: { file: sheet.file, line: record.line, row: record.row } };
}

/** What stands in a column nobody reads would be lost without a word. */
function unreadColumns({ file, columns, records }: ReadList): Problem[] {
  return columns.flatMap((column): Problem[] => {
    const { reading } = column;
    if (reading.kind !== 'text' || isSheetNote(column)) return [];
    const filled = records.filter(({ cells }) => !isMissing(cells[column.number - 1] ?? '')).length;
    if (filled === 0) return [];
    const place = { file, row: 1, column: column.number, columnLetter: columnLetter(column.number), header: column.header };
    return [{ code: 'I804', severity: 'error', message: `no figure is called "${column.header}", and ${filled} filled ${filled === 1 ? 'cell' : 'cells'} of it would be lost`, fix: reading.suggestion ?? 'the header as the sheet was written', text: column.header, place }];
  });
}

const nothingFilled = (file: string): Problem => ({ code: 'I802', severity: 'error', message: 'no cell of the sheet is filled', fix: 'write the figures in place of the question marks', place: { file, line: 1 } });

function merged(base: ReadList, filled: readonly Patched[], sheet: ReadList): ReadList {
  const parts = [...base.parts];
  const patched = new Map(base.patched);
  for (const { index, part, record, figures, fields } of filled) {
    parts[index] = part;
    const cells = [...figures.map(({ figure, column }) => [slotOf(figure), cellOf(sheet, record, column)] as const), ...fields.map(({ field, column }) => [field, cellOf(sheet, record, column)] as const)];
    patched.set(index, { ...patched.get(index), ...Object.fromEntries(cells) });
  }
  return { ...base, parts, patched };
}

function cellOf({ file, sha256 }: ReadList, { line, row, cells }: ListRecord, { number, letter, header }: ListColumn): PatchedCell {
  return { kind: 'cell', file, sha256, line, row, column: number, columnLetter: letter, header, cell: cells[number - 1] ?? '' };
}
