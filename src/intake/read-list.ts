import { isBlank } from './blank.js';
import { cellQuestions } from './cell-questions.js';
import { readColumns } from './columns.js';
import { crossChecks } from './cross-checks.js';
import { decimalMark } from './decimal-mark.js';
import type { DecimalMark } from './decimal-mark.js';
import { decodeList } from './decode.js';
import type { DecodeResult } from './decode.js';
import { withoutDuplicates } from './duplicate-columns.js';
import { layoutProblem, layoutQuestion } from './layout-question.js';
import type { LaidOut, Layout } from './layout.js';
import { laidOut, PLAIN_LAYOUT, proposedLayout } from './layout.js';
import { finishedList, isOrdinary } from './finished-list.js';
import { limitsOf, sizeFault } from './limits.js';
import { columnNotes, countNote, detectionNote } from './list-notes.js';
import type { ListColumn, ListOptions, ListResult, RefusedList } from './list.js';
import type { MatchedMapping } from './mapping.js';
import { matchMapping } from './mapping.js';
import { ProblemLog } from './problem-log.js';
import { readParts } from './rows.js';
import { chosenSheet, sheetLabel, withoutLines } from './sheet.js';
import type { SplitText } from './split.js';
import { splitList } from './split.js';
import { delimiterProblem, isWhole, plainColumns, structureProblems, warnHeaderless, withoutBlank } from './structure.js';
import { unitFindings } from './unit-changes.js';
import type { Workbook } from './workbook.js';
import { trialWords } from './delimiter.js';

type Decoded = Extract<DecodeResult, { ok: true }> & { readonly sheet?: string };

/** A list on its way in. */
interface Reading {
  readonly options: ListOptions;
  readonly log: ProblemLog;
  readonly bytes: Uint8Array;
  readonly decoded: Decoded;
  readonly split: SplitText;
}

/**
 * Reads a list, canonical or ordinary, all or nothing: either every part with its origin, or every fault with its place. Nothing is
 * guessed and nothing repaired: what only the owner knows is a question, what was read with a note is told.
 */
export function readList(bytes: Uint8Array, options: ListOptions): ListResult {
  const log = new ProblemLog(options.file);
  if (options.workbook !== undefined) return readSheet(bytes, options.workbook, options);
  const decoded = decodeList(bytes, options);
  if (!decoded.ok) {
    const { code, reason: message, fix, line } = decoded;
    return log.refuse({ code, message, fix, line });
  }
  const split = splitList(decoded.text, options.delimiter);
  log.rows = split.records.slice(1).filter((row) => !isBlank(row)).length;
  log.shape = { delimiter: split.delimiter, columns: split.records[0]?.cells.length ?? 0, decimal: null };
  if (split.undecided !== undefined) return askDelimiter(split, log);
  return readLaidOut({ options, log, bytes, decoded, split });
}

/** A text of so many bytes, refused before it is read; null when it may be read. */
export function refusedBySize({ file, length }: { readonly file: string; readonly length: number }, { large = false }: Pick<ListOptions, 'large'>): RefusedList | null {
  const fault = sizeFault(length, large);
  if (fault === null) return null;
  const { reason: message, ...rest } = fault;
  return new ProblemLog(file).refuse({ message, ...rest });
}

/** A sheet of a workbook, in the same way; its places are rows, and the sheet is named with the file. */
function readSheet(bytes: Uint8Array, workbook: Workbook, options: ListOptions): ListResult {
  const whole = new ProblemLog(options.file);
  if (!workbook.ok) return whole.refuse({ code: workbook.code, message: workbook.reason, fix: workbook.fix });
  const choice = chosenSheet(workbook.sheets, options);
  if (!choice.ok) {
    if (choice.question !== null) whole.questions.push(choice.question);
    return whole.refuse(choice);
  }
  const { name, records } = choice.sheet;
  const file = sheetLabel(options.file, name);
  const log = new ProblemLog(file);
  log.rows = records.slice(1).filter((row) => !isBlank(row)).length;
  log.shape = { delimiter: SHEET, columns: records[0]?.cells.length ?? 0, decimal: null };
  const decoded = { ok: true, text: '', encoding: 'utf-8', how: 'workbook', sheet: name } as const;
  return withoutLines(readLaidOut({ options: { ...options, file }, log, bytes, decoded, split: { delimiter: SHEET, records, faults: [] } }));
}

/** Stands for the separator of a sheet, which has none. */
const SHEET = '\t';

function askDelimiter({ undecided = [] }: SplitText, log: ProblemLog): ListResult {
  log.add(delimiterProblem(undecided, log.file));
  log.questions.push({ words: 'What separates the cells?', samples: [], choices: undecided.map((trial) => ({ words: trialWords(trial), answer: { delimiter: trial.delimiter } })) });
  return log.refused();
}

function readLaidOut(reading: Reading): ListResult {
  const { options, log, split } = reading;
  const { records, faults } = split;
  const matched = matchMapping(records, options.mappings ?? []);
  const proposal = options.layout === undefined && matched === null && faults.length === 0 ? proposedLayout(records) : null;
  if (proposal !== null) {
    log.add(layoutProblem(proposal, records, log.file));
    log.questions.push(layoutQuestion(proposal, records));
    return log.refused();
  }
  const layout = options.layout ?? matched?.mapping.layout ?? { ...PLAIN_LAYOUT, headerRows: [records[0]?.row ?? 1] as const };
  const table = laidOut(records, layout);
  log.headerRow = table?.header.row ?? 0;
  if (table !== null) log.rows = table.rows.filter((row) => !isBlank(row)).length;
  log.addAll(structureProblems({ header: table?.header ?? null, rows: table?.rows ?? [], faults, limits: limitsOf(options.large === true), lift: options.large === true ? 'split the list' : 'split the list, or lift the limit with --large' }, options.file));
  if (log.errors === 0) return readTable({ ...reading, table, layout, matched });
  if (table !== null) warnHeaderless(withoutBlank(table.rows, log).filter((row) => isWhole(row, table.header)), plainColumns(table.header), log);
  return log.refused();
}

interface TableReading extends Reading {
  readonly table: LaidOut | null;
  readonly layout: Layout;
  readonly matched: MatchedMapping | null;
}

function readTable(reading: TableReading): ListResult {
  const { table, options, log, split, matched } = reading;
  if (table === null || isBlank(table.header)) return log.refuse(EMPTY_FILE);
  if (log.rows === 0) return log.refuse(HEADER_ONLY);
  const { header } = table;
  const row = readColumns(header, { file: options.file, map: options.map, mapping: matched?.mapping, doubts: table.doubts, rows: table.rows });
  log.addAll(row.problems);
  log.questions.push(...row.questions);
  if (!row.columns.some(isId)) return log.refused();
  const rows = withoutBlank(table.rows, log);
  warnHeaderless(rows, row.columns, log);
  const decimal = decimalMark(split.delimiter, row.columns, { rows, given: options.decimal });
  log.shape = { delimiter: split.delimiter, columns: row.columns.length, decimal: decimal.mark };
  log.notes.push(...tableNotes(reading, table, decimal));
  const asked = cellQuestions(row.columns, { rows, header, log });
  const columns = withoutDuplicates(asked, { header, rows, decimal: decimal.rule, log });
  const units = unitFindings(row.unitChanges, { file: options.file, header, rows, columns, decimal: decimal.rule, previous: options.previous ?? (() => null) });
  log.addAll(units.problems);
  log.notes.push(...units.notes);
  log.questions.push(...units.questions);
  const kept = readParts(rows, { columns, options: effective(options, matched), log, decimal: decimal.rule });
  if (isOrdinary(columns)) crossChecks(kept, columns, { log, suspect: new Set(units.problems.length === 0 ? [] : row.unitChanges.map(({ column }) => column.number)) });
  if (isOrdinary(columns)) log.notes.push(...columnNotes(columns, { rows, parts: kept, isKnown: matched?.exact === matched?.headers && matched !== null }));
  checkCount(table, kept.length, log);
  return log.errors > 0 ? log.refused() : finishedList({ ...reading, options: effective(options, matched) }, { columns, kept, decimal, header: header.cells });
}

function tableNotes({ split, decoded, matched }: TableReading, { header, rows, title, footer }: LaidOut, decimal: DecimalMark): string[] {
  const { encoding, how, sheet } = decoded;
  const skipped = [...title, ...footer].filter((record) => !isBlank(record)).map(({ row }) => row);
  return [
    `${detectionNote({ encoding, how, delimiter: split.delimiter, header, rows, decimal, ...(sheet === undefined ? {} : { sheet }) })}.`,
    ...(header.cells.length === 1 ? [`only one column${sheet === undefined ? ': no separator was found in the file' : ''}.`] : []),
    ...(matched === null ? [] : [`mapping ${matched.mapping.name}: ${matched.exact} of ${matched.mapping.columns.length} columns known by their exact header${matched.named === 0 ? '' : `, ${matched.named} by name with another unit`}.`]),
    ...(skipped.length === 0 ? [] : [`rows skipped: ${skipped.join(', ')} (before the header, or behind the blank row that ends the table).`]),
  ];
}

/** What a mapping keeps beside the columns holds for the next list too. */
function effective(options: ListOptions, matched: MatchedMapping | null): ListOptions {
  if (matched === null) return options;
  const { words, missing, declare, classWithin } = matched.mapping;
  const stated = options.declare ?? declare;
  const within = options.classWithin ?? classWithin;
  return { ...options, words: new Map([...words, ...(options.words ?? [])]), missing: [...missing, ...(options.missing ?? [])], ...(stated === null ? {} : { declare: stated }), ...(within === null ? {} : { classWithin: within }) };
}

function checkCount(table: LaidOut, parts: number, log: ProblemLog): void {
  const count = countNote(table.footer, parts);
  if (count === null) return;
  const place = { file: log.file, line: count.record.line, row: count.record.row };
  if (count.agrees) log.notes.push(`${count.note}.`);
  else log.add({ code: 'I211', severity: 'warning', message: count.note, fix: 'compare the list with its footer', place });
}

function isId({ reading }: ListColumn): boolean {
  return reading.kind === 'identity' && reading.field === 'id';
}

const EMPTY_FILE = { code: 'I103', message: 'the file is empty', fix: 'a header line and one line for each part', line: 1 };
const HEADER_ONLY = {
  code: 'I104',
  message: 'the file has a header and no part; importing it would withdraw every part',
  fix: 'railfit import --undo takes back the last import',
  line: 1,
};
