import { createHash } from 'node:crypto';
import { readColumns } from './columns.js';
import { decimalMark } from './decimal-mark.js';
import { decodeList } from './decode.js';
import type { ListColumn, ListOptions, ListResult } from './list.js';
import { ProblemLog } from './problem-log.js';
import { readParts } from './rows.js';
import type { SplitText } from './split.js';
import { splitList } from './split.js';
import { isBlank, structureProblems, warnHeaderless, withoutBlank } from './structure.js';

/**
 * Reads a list in the canonical CSV, all or nothing: either every part with its origin, or every fault with its place.
 * Nothing is guessed and nothing repaired; what was read with a note is told as a warning.
 */
export function readList(bytes: Uint8Array, options: ListOptions): ListResult {
  const log = new ProblemLog(options.file);
  const decoded = decodeList(bytes);
  if (!decoded.ok) {
    const { code, reason: message, fix, line } = decoded;
    return log.refuse({ code, message, fix, line });
  }
  const split = splitList(decoded.text, decoded.bytes);
  log.rows = split.records.slice(1).filter((row) => !isBlank(row)).length;
  log.shape = { delimiter: split.delimiter, columns: split.records[0]?.cells.length ?? 0, decimal: null };
  log.addAll(structureProblems(split, options.file));
  return log.errors > 0 ? log.refused() : readTable(split, { options, log, bytes });
}

interface Reading {
  readonly options: ListOptions;
  readonly log: ProblemLog;
  readonly bytes: Uint8Array;
}

function readTable({ records, delimiter }: SplitText, { options, log, bytes }: Reading): ListResult {
  const [header, ...below] = records;
  if (header === undefined || isBlank(header)) return log.refuse(EMPTY_FILE);
  if (log.rows === 0) return log.refuse(HEADER_ONLY);
  const { columns, problems } = readColumns(header, options.file);
  log.addAll(problems);
  if (!columns.some(isId)) return log.refused();
  const rows = withoutBlank(below, log);
  warnHeaderless(rows, columns, log);
  const decimal = decimalMark(delimiter, columns, rows);
  log.shape = { delimiter, columns: columns.length, decimal };
  const kept = readParts(rows, { columns, options, log, decimal });
  if (log.errors > 0) return log.refused();
  return {
    ok: true,
    file: options.file,
    tier: options.tier,
    parts: kept.map(({ part }) => part),
    columns,
    records: kept.map(({ record }) => record),
    sha256: createHash('sha256').update(bytes).digest('hex'),
    delimiter,
    decimal,
    warnings: log.list(),
  };
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
