import { isBlank } from './blank.js';
import type { ByteSource } from './byte-source.js';
import { textRun } from './byte-source.js';
import { columnKey, readColumns } from './columns.js';
import { limitsOf } from './limits.js';
import type { ListOptions, ListRecord } from './list.js';
import { matchMapping } from './mapping.js';
import { recordStream } from './records.js';
import { NeedsWhole } from './stream-errors.js';

/**
 * The header of a list that says all about itself: canonical headers between commas in the first row, each column another, an id among
 * them; nothing the user or a saved mapping adds. Null otherwise.
 */
export function plainTable(source: ByteSource, options: ListOptions): ListRecord | null {
  if (ANSWERS.some((answer) => options[answer] !== undefined)) return null;
  const start = firstRecords(source, options);
  const [header] = start;
  if (header === undefined || matchMapping(start, options.mappings ?? []) !== null) return null;
  return isCanonical(header, options) ? header : null;
}

/** With one of these a list is read as it was answered. */
const ANSWERS = ['workbook', 'sheet', 'encoding', 'delimiter', 'decimal', 'layout', 'map', 'words', 'missing', 'declare', 'classWithin'] as const satisfies readonly (keyof ListOptions)[];

/** So many as the header of a saved mapping may stand below; none where the start is no plain table. */
function firstRecords(source: ByteSource, { mappings = [] }: ListOptions): ListRecord[] {
  const depth = Math.max(1, ...mappings.flatMap(({ layout }) => layout.headerRows));
  const records: ListRecord[] = [];
  try {
    for (const record of recordStream(textRun(source).pieces, ',')) {
      if (!('cells' in record)) return [];
      records.push(record);
      if (records.length >= depth) break;
    }
  } catch (error) {
    if (!(error instanceof NeedsWhole)) throw error;
    return [];
  }
  return records;
}

const CANONICAL: ReadonlySet<string> = new Set(['identity', 'figure', 'price', 'statement', 'text']);

function isCanonical(header: ListRecord, { file, large }: ListOptions): boolean {
  const { cells } = header;
  if (isBlank(header) || cells.length < 2 || cells.length > limitsOf(large === true).columns) return false;
  // What separates the cells is then told of the whole list.
  if (cells.some((cell) => /[;\t|]/u.test(cell))) return false;
  const { columns, problems, questions } = readColumns(header, { file });
  if (questions.length > 0 || problems.some(({ severity }) => severity === 'error')) return false;
  const keys = columns.map((column) => columnKey(column));
  const isOwn = keys.every((key, at) => key !== null && keys.indexOf(key) === at);
  return isOwn && columns.every(({ reading }) => CANONICAL.has(reading.kind)) && cells.some((cell) => cell.trim().toLowerCase() === 'id');
}
