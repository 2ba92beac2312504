import { parse } from 'csv-parse/sync';
import type { CsvError, Info } from 'csv-parse/sync';
import type { Trial } from './delimiter.js';
import { bestTrial } from './delimiter.js';
import type { Delimiter, ListRecord } from './list.js';

/** A record that could not be taken apart. */
export interface SplitFault {
  readonly code: 'I303' | 'I304';
  readonly line: number;
  readonly row: number;
  /** From 1. */
  readonly column: number;
}

export interface SplitText {
  readonly delimiter: Delimiter;
  /** Header first. Blank rows are records with one empty cell. */
  readonly records: readonly ListRecord[];
  readonly faults: readonly SplitFault[];
  /** Present when it cannot be told what separates the cells: what each delimiter of the header gives. */
  readonly undecided?: readonly Trial[];
}

interface Parsed {
  readonly record: string[];
  readonly info: Info;
}

/** Takes a CSV apart (RFC 4180, also with `;` or tab) and finds the physical line of every record. */
export function splitList(text: string, bytes: Uint8Array): SplitText {
  const [first, ...others] = delimitersOf(text);
  const lineAt = lineFinder(bytes);
  const split = splitAt(first, bytes, lineAt);
  if (others.length === 0) return split;
  const splits = [split, ...others.map((delimiter) => splitAt(delimiter, bytes, lineAt))];
  const trials = splits.map(trialOf);
  // A header alone is refused anyway, for having no rows.
  if (trials.every(({ rows }) => rows === 0)) return split;
  const best = bestTrial(trials);
  return splits.find(({ delimiter }) => delimiter === best?.delimiter) ?? { ...split, undecided: trials };
}

function splitAt(delimiter: Delimiter, bytes: Uint8Array, lineAt: (offset: number) => number): SplitText {
  const faults: SplitFault[] = [];
  const parsed = parse(bytes, {
    delimiter,
    record_delimiter: ['\r\n', '\n', '\r'],
    relax_column_count: true,
    info: true,
    skip_records_with_error: true,
    on_skip: (error) => void faults.push(faultOf(error, faults.length, lineAt)),
  }) as unknown as Parsed[];
  return { delimiter, records: place(parsed, faults, lineAt), faults };
}

/** The delimiters that stand in the header. Any of them may be part of a name: `(mV) @ 10 kΩ, 5 V`. */
function delimitersOf(text: string): [Delimiter, ...Delimiter[]] {
  const header = headerText(text);
  const [first = ',', ...others] = DELIMITERS.filter((delimiter) => header.includes(delimiter));
  return [first, ...others];
}

const DELIMITERS = [',', ';', '\t'] as const;

function trialOf({ delimiter, records, faults }: SplitText): Trial {
  const header = records.find(({ row }) => row === 1)?.cells ?? [];
  const columns = header.length;
  const hasId = header.some((cell) => cell.trim().toLowerCase() === 'id');
  const counts = records.filter(({ row, cells }) => row > 1 && cells.some((cell) => cell.trim() !== '')).map(({ cells }) => cells.length);
  const often = new Map<number, number>();
  for (const count of counts) often.set(count, (often.get(count) ?? 0) + 1);
  const [usual = null] = [...often].sort((a, b) => b[1] - a[1]).map(([count]) => count);
  const broken = faults.filter(({ row }) => row > 1).length;
  return { delimiter, columns, rows: counts.length + broken, fitting: often.get(columns) ?? 0, usual, hasId };
}

/** The first record without what stands in quotes. */
function headerText(text: string): string {
  const unquoted = text.slice(0, 64 * 1024).replace(/"(?:[^"]|"")*"/gu, '');
  return unquoted.split(/[\r\n]/u, 1)[0] ?? '';
}

/** The parser's own line counter counts CR LF inside quotes twice, so lines are found from the byte where a record ends. */
function place(parsed: readonly Parsed[], faults: readonly SplitFault[], lineAt: (offset: number) => number): ListRecord[] {
  let skipped = 0;
  return parsed.map(({ record, info }, index) => {
    const lineEnd = lineAt(info.bytes - 1);
    const line = lineEnd - record.reduce((sum, cell) => sum + breaks(cell), 0);
    while ((faults[skipped]?.line ?? Number.POSITIVE_INFINITY) < line) skipped += 1;
    return { line, lineEnd, row: index + 1 + skipped, cells: record };
  });
}

interface ErrorPlace {
  readonly bytes?: number;
  readonly column?: number;
  readonly records?: number;
  readonly code?: string;
}

function faultOf(error: CsvError | undefined, earlier: number, lineAt: (offset: number) => number): SplitFault {
  const { bytes = 1, column = 0, records = 0, code }: ErrorPlace = error ?? {};
  return {
    code: code === 'CSV_QUOTE_NOT_CLOSED' ? 'I303' : 'I304',
    line: lineAt(bytes - 1),
    row: records + earlier + 1,
    column: column + 1,
  };
}

function breaks(cell: string): number {
  return cell.includes('\n') || cell.includes('\r') ? (cell.match(/\r\n|\n|\r/gu) ?? []).length : 0;
}

/** Physical line of a byte by bisection. The byte that ends a line belongs to it. */
function lineFinder(bytes: Uint8Array): (offset: number) => number {
  const ends: number[] = [];
  for (let at = 0; at < bytes.length; at += 1) {
    if (bytes[at] === 0x0a || (bytes[at] === 0x0d && bytes[at + 1] !== 0x0a)) ends.push(at);
  }
  return (offset) => {
    let [low, high] = [0, ends.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((ends[middle] ?? 0) < offset) low = middle + 1;
      else high = middle;
    }
    return low + 1;
  };
}
