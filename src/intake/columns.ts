import { figureSlot } from '../parts/figures.js';
import type { Problem } from '../quantities/problem.js';
import { cellProblem } from './cell-fault.js';
import type { CellFault } from './cell-fault.js';
import type { ColumnReading, HeaderReading } from './column-reading.js';
import { columnLetter } from './column-letter.js';
import type { ColumnAnswer, ListColumn, ListQuestion, ListRecord } from './list.js';
import type { JoinDoubt } from './layout.js';
import type { ListMapping } from './mapping.js';
import { mappedColumn, unitOf } from './mapping.js';
import { nearPhrase } from './ordinary-header.js';
import { isSheetNote } from './patch-sheet.js';
import { readAnyHeader } from './recognised.js';
import { isParameter } from './target.js';

export interface HeaderRow {
  readonly columns: readonly ListColumn[];
  readonly problems: readonly Problem[];
  readonly questions: readonly ListQuestion[];
  /** Columns the mapping knows under another unit. */
  readonly unitChanges: readonly UnitChange[];
}

export interface UnitChange {
  readonly column: ListColumn;
  readonly was: string | null;
  readonly now: string | null;
}

export interface HeaderContext {
  readonly file: string;
  readonly map?: readonly ColumnAnswer[] | undefined;
  readonly mapping?: ListMapping | null | undefined;
  readonly doubts?: readonly JoinDoubt[];
  /** Records below the header, for the samples of a question. */
  readonly rows?: readonly ListRecord[];
}

/** Reads the header record: every column with its meaning, and everything that is wrong with the headers or only the owner knows. */
export function readColumns(record: ListRecord, context: HeaderContext): HeaderRow {
  const { file } = context;
  const problems: Problem[] = [];
  const questions: ListQuestion[] = [];
  const unitChanges: UnitChange[] = [];
  const report: Report = (column, fault, severity) => void problems.push(cellProblem(fault, { file, record, column, part: null }, severity));
  const columns = record.cells.map((cell, index): ListColumn => {
    const header = cell.replace(/\s+/gu, ' ').trim();
    const place = { number: index + 1, letter: columnLetter(index + 1), header };
    const text: ListColumn = { ...place, reading: { kind: 'text' } };
    const { reading, change } = meaningOf(place, context);
    if (change !== undefined) unitChanges.push({ column: { ...place, reading: reading as ColumnReading }, ...change });
    if (reading.kind === 'problem') report(text, { code: 'I204', reason: `"${header}": ${reading.reason}`, ...(reading.fix === undefined ? {} : { fix: reading.fix }) }, 'error');
    else if (reading.kind === 'question') questions.push(asked(text, reading, { context, report }));
    else return { ...place, reading };
    return text;
  });
  reportUnknown(columns, problems, { report, context });
  reportMissingId(columns, report);
  return { columns, problems, questions, unitChanges };
}

/** What makes two columns the same: a slot of the part, or the same text. Null for columns without header, and those that fill no slot alone. */
export function columnKey({ header, reading }: Pick<ListColumn, 'header' | 'reading'>): string | null {
  switch (reading.kind) {
    case 'text': case 'known': return header === '' ? null : `text ${header}`;
    case 'identity': return reading.field;
    case 'statement': return reading.statement;
    case 'price': return `price ${reading.currency ?? ''} ${reading.quantity ?? ''}`;
    case 'figure': return figureSlot({ parameter: reading.parameter, kind: reading.limit, condition: reading.condition });
    case 'measured': {
      const { target, limit, order, condition } = reading;
      if (isParameter(target) && limit !== null) return figureSlot({ parameter: target, kind: limit, condition });
      return `${target} ${order?.join('/') ?? ''} ${JSON.stringify(condition)}`;
    }
    case 'rail': return `rail ${reading.sense}`;
    case 'load': return 'load';
    case 'question': return null;
  }
}

type Report = (column: ListColumn, fault: CellFault, severity: Problem['severity']) => void;
type Place = Omit<ListColumn, 'reading'>;

interface Meaning {
  readonly reading: HeaderReading;
  readonly change?: { readonly was: string | null; readonly now: string | null };
}

/** The user's answer, else what the mapping says, else what the header says by itself. */
function meaningOf(place: Place, { map, mapping, doubts }: HeaderContext): Meaning {
  const answer = answerFor(place, map);
  if (answer !== undefined) return { reading: answered(answer) };
  const mapped = mapping == null ? null : mappedColumn(place.header, mapping);
  if (mapped?.exact === true) return { reading: mapped.column.reading };
  const doubt = doubts?.find(({ column }) => column === place.number);
  if (doubt !== undefined) return { reading: doubtful(doubt) };
  const own = readAnyHeader(place.header);
  if (mapped === null || own.kind === 'problem') return { reading: own };
  const [was, now] = [unitOf(mapped.column.reading), unitOf(own)];
  return was === now ? { reading: own } : { reading: own, change: { was, now } };
}

function answerFor({ letter, header }: Place, map: readonly ColumnAnswer[] | undefined): ColumnAnswer | undefined {
  return map?.find(({ column }) => column === header) ?? map?.find(({ column }) => column.toUpperCase() === letter);
}

function answered({ header }: ColumnAnswer): HeaderReading {
  if (/^(?:text|ignore)$/iu.test(header.trim())) return { kind: 'known', field: null, unit: null };
  const reading = readAnyHeader(header.replace(/\s+/gu, ' ').trim());
  if (reading.kind !== 'text') return reading;
  return { kind: 'problem', reason: `"${header}" (from --map) is no header that is known`, fix: reading.suggestion ?? 'a canonical header: offset voltage max (mV)' };
}

/** A group that covers a column with a unit of its own: what it measures is asked, never carried over. */
function doubtful({ group, own }: JoinDoubt): HeaderReading {
  return {
    kind: 'question',
    words: `the group "${group}" and its own "${own}" disagree about the unit`,
    choices: [
      ...(readAnyHeader(own).kind === 'load' ? [{ words: `the load the columns of "${group}" were measured at`, header: own }] : []),
      { words: 'none of these: keep it as text', header: 'text' },
    ],
  };
}

interface Asking {
  readonly context: HeaderContext;
  readonly report: Report;
}

function asked(column: ListColumn, { words, choices }: Extract<ColumnReading, { kind: 'question' }>, { context, report }: Asking): ListQuestion {
  const options = choices.map(({ header, words: meaning }) => `--map "${column.letter}=${header}" (${meaning})`);
  report(column, { code: 'I209', reason: `"${column.header}": ${words}`, fix: options.join('\nor ') }, 'error');
  return {
    words: `Column ${column.letter} "${column.header}": ${words}?`,
    samples: samplesOf(column, context.rows ?? []),
    choices: choices.map(({ words: meaning, header }) => ({ words: meaning, answer: { map: [{ column: column.letter, header }] } })),
  };
}

/** The first three different cells that say something. */
export function samplesOf({ number }: Pick<ListColumn, 'number'>, rows: readonly ListRecord[]): string[] {
  const found = new Set<string>();
  for (const { cells } of rows) {
    const cell = (cells[number - 1] ?? '').trim();
    if (cell !== '') found.add(cell);
    if (found.size === 3) break;
  }
  return [...found];
}

function reportUnknown(columns: readonly ListColumn[], problems: readonly Problem[], { report, context }: Asking): void {
  const refused = new Set(problems.map((problem) => problem.place?.column));
  for (const column of columns) {
    if (column.reading.kind !== 'text' || column.header === '' || isSheetNote(column) || refused.has(column.number)) continue;
    if (context.mapping != null && mappedColumn(column.header, context.mapping)?.exact === true) continue;
    const suggestion = column.reading.suggestion ?? nearPhrase(column.header) ?? undefined;
    const meant = suggestion === undefined ? '' : `; did you mean "${suggestion}"`;
    const reason = `"${column.header}" is not a column that is known; kept as text${meant}`;
    report(column, { code: 'I203', reason, ...(suggestion === undefined ? {} : { fix: suggestion }) }, 'warning');
  }
}

function reportMissingId(columns: readonly ListColumn[], report: Report): void {
  const first = columns[0];
  if (first === undefined || columns.some(({ reading }) => reading.kind === 'identity' && reading.field === 'id')) return;
  report(first, { code: 'I206', reason: 'no column is named id; every part needs one', fix: 'id, or --map "COLUMN=id"' }, 'error');
}
