import type { Trial } from './delimiter.js';
import { bestTrial } from './delimiter.js';
import { isBlank } from './blank.js';
import type { Delimiter, ListRecord } from './list.js';
import { DELIMITERS } from './list.js';
import type { SplitFault } from './records.js';
import { recordsOf } from './records.js';

export interface SplitText {
  readonly delimiter: Delimiter;
  /** Header first. Blank rows are records with one empty cell. */
  readonly records: readonly ListRecord[];
  readonly faults: readonly SplitFault[];
  /** Present when it cannot be told what separates the cells: what each delimiter of the header gives. */
  readonly undecided?: readonly Trial[];
  /** What a first line `sep=;` said; that line is not in the records. */
  readonly declared?: true;
}

/** Takes a CSV apart (RFC 4180, also with `;`, tab or `|`) and finds the delimiter. `wanted` is the user's word. */
export function splitList(text: string, wanted?: Delimiter): SplitText {
  const declared = declaredDelimiter(text);
  if (declared !== null) return withoutDeclaration(splitAt(text, wanted ?? declared));
  if (wanted !== undefined) return splitAt(text, wanted);
  const [first, ...others] = delimitersOf(text);
  const split = splitAt(text, first);
  if (others.length === 0) return split;
  const splits = [split, ...others.map((delimiter) => splitAt(text, delimiter))];
  const trials = splits.map((one) => trialOf(one));
  // A header alone is refused anyway, for having no rows.
  if (trials.every(({ rows }) => rows === 0)) return split;
  const best = bestTrial(trials) ?? bestTrial(splits.map((one) => trialOf(one, titleRows(one))));
  const found = splits.find(({ delimiter }) => delimiter === best?.delimiter);
  if (found !== undefined) return found;
  // No row falls apart anywhere: a list of one column, in whose cells the marks are text.
  return trials.every(({ columns, usual }) => columns <= 1 && (usual ?? 1) <= 1) ? split : { ...split, undecided: trials.filter(({ columns, usual }) => columns > 1 || (usual ?? 1) > 1) };
}

const splitAt = (text: string, delimiter: Delimiter): SplitText => ({ delimiter, ...recordsOf(text, delimiter) });

/** `sep=;` as the first line: a spreadsheet's own way to name the delimiter. */
function declaredDelimiter(text: string): Delimiter | null {
  const mark = /^"?sep=(.)"?[\r\n]/iu.exec(text)?.[1];
  return DELIMITERS.find((delimiter) => delimiter === mark) ?? null;
}

function withoutDeclaration(split: SplitText): SplitText {
  return { ...split, records: split.records.slice(1), declared: true };
}

/** The delimiters that stand in the file's first lines outside quotes. Any of them may be part of a name: `(mV) @ 10 kΩ, 5 V`. */
function delimitersOf(text: string): [Delimiter, ...Delimiter[]] {
  const start = text.slice(0, 64 * 1024).replace(/"(?:[^"]|"")*"/gu, '');
  const [first = ',', ...others] = DELIMITERS.filter((delimiter) => start.includes(delimiter));
  return [first, ...others];
}

/** What a split gives when `skip` records of a title stand before the header. */
function trialOf({ delimiter, records, faults }: SplitText, skip = 0): Trial {
  const head = records[skip];
  const header = skip > 0 || head?.row === 1 ? (head?.cells ?? []) : [];
  const top = skip > 0 ? (head?.row ?? 1) : 1;
  const columns = header.length;
  const hasId = header.some((cell) => cell.trim().toLowerCase() === 'id');
  const counts = records.filter((record) => record.row > top && !isBlank(record)).map(({ cells }) => cells.length);
  const often = countsOf(counts);
  const [usual = null] = [...often].sort((a, b) => b[1] - a[1]).map(([count]) => count);
  const broken = faults.filter(({ row }) => row > top).length;
  return { delimiter, columns, rows: counts.length + broken, fitting: often.get(columns) ?? 0, usual, hasId };
}

/** Records of a title that is narrower than the table below it. */
function titleRows({ records }: SplitText): number {
  const often = countsOf(records.filter((record) => !isBlank(record)).map(({ cells }) => cells.length));
  const [usual = 0] = [...often].sort((a, b) => b[1] - a[1]).map(([count]) => count);
  const first = records.findIndex(({ cells }) => cells.length >= usual);
  return Math.max(0, first);
}

function countsOf(counts: readonly number[]): Map<number, number> {
  const often = new Map<number, number>();
  for (const count of counts) often.set(count, (often.get(count) ?? 0) + 1);
  return often;
}
