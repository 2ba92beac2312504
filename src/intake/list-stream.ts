import { isBlank } from './blank.js';
import type { ByteSource, TextRun } from './byte-source.js';
import { textRun } from './byte-source.js';
import { readColumns } from './columns.js';
import { plainTable } from './plain-table.js';
import { idHabits } from './id-habits.js';
import { likenessOf, ownFaults } from './identity.js';
import { likenessSet } from './likeness-set.js';
import { LIMITS, limitsOf, type Limits } from './limits.js';
import type { ListColumn, ListOptions, ListRecord, ListRow, ListStream } from './list.js';
import { partReader } from './part-reader.js';
import { ProblemLog } from './problem-log.js';
import { recordStream } from './records.js';
import { identityProblem, readRow } from './rows.js';
import { ListRefused, NeedsWhole } from './stream-errors.js';
import { textTallies, type TextTallies } from './text-tally.js';

/**
 * A canonical CSV, to be read row by row: UTF-8, commas, a header of known columns in its first row, parts by id. Null for any other
 * list. What such a list turns out to have that can only be told of the whole (ragged rows, quotes that do not close, ids alike,
 * ids in another order) throws `NeedsWhole`: `readList` then tells it, with the same readers of records, cells and parts.
 */
export function openStream(source: ByteSource, options: ListOptions): ListStream | null {
  const header = source.length > limitsOf(options.large === true).bytes ? null : plainTable(source, options);
  return header === null ? null : streamOf({ source, options, header, columns: readColumns(header, { file: options.file }).columns });
}

interface Opened {
  readonly source: ByteSource;
  readonly options: ListOptions;
  readonly header: ListRecord;
  readonly columns: readonly ListColumn[];
}

function streamOf(opened: Opened): ListStream {
  const { source, options, columns } = opened;
  let share = (): number => 0;
  let known: Pick<ListStream, 'sha256' | 'warnings' | 'tallies'> | null = null;
  const run = (): TextRun => {
    const text = textRun(source);
    share = (): number => text.share();
    return text;
  };
  const ended = (): NonNullable<typeof known> => {
    if (known === null) throw new RangeError('the list has not been read to its end');
    return known;
  };
  return {
    ok: true,
    file: options.file,
    tier: options.tier,
    columns,
    sources: { usual: new Map(), others: new Map(), declared: null },
    get sha256() { return ended().sha256; },
    get warnings() { return ended().warnings; },
    share: (): number => share(),
    get tallies() { return ended().tallies; },
    *rows() {
      const text = run();
      const [log, tallies] = [new ProblemLog(options.file), textTallies(columns)];
      yield* rowsOf(text, { log, tallies }, opened);
      known = { sha256: text.sha256(), warnings: log.list(), tallies: tallies.found() };
    },
  };
}

function* rowsOf(text: TextRun, { log, tallies }: { readonly log: ProblemLog; readonly tallies: TextTallies }, opened: Opened): Generator<ListRow> {
  const { options, header, columns } = opened;
  log.headerRow = header.row;
  log.addAll(readColumns(header, { file: options.file }).problems);
  const readPart = partReader(columns, options, null);
  const ids = idsInOrder();
  for (const record of recordsBelow(text, opened)) {
    const { part } = readRow(record, { readPart, log });
    ids.add(part.id);
    for (const fault of ownFaults(part, options)) for (const problem of identityProblem({ record, part: part.id, ...fault }, columns, options.file)) log.addLater(problem);
    log.rows += 1;
    tallies.add(record);
    // What is refused is read to its end, so that all faults are told at once; it goes no further.
    if (log.errors === 0) yield { part, record, index: log.rows - 1 };
  }
  if (log.rows === 0) throw new NeedsWhole();
  addHabits(ids.all, log, opened);
  if (log.errors > 0) throw new ListRefused(log.refused());
}

/** The records below the header, each as wide as it. */
function* recordsBelow({ pieces }: TextRun, { options, header }: Opened): Generator<ListRecord> {
  const limits = limitsOf(options.large === true);
  for (const record of recordStream(pieces, ',')) {
    if (record.row === 1) continue;
    if (!('cells' in record) || !isPlain(record, header, limits)) throw new NeedsWhole();
    yield record;
  }
}

function isPlain({ cells, row }: ListRecord, header: ListRecord, limits: Limits): boolean {
  return cells.length === header.cells.length && row - 1 <= limits.records && !isBlank({ cells }) && cells.every((cell) => cell.length <= limits.cell);
}

/** Ids as they come. Two that are alike, or that stand in another order than the catalog keeps them in, are told of the whole list. */
function idsInOrder(): { readonly all: readonly string[]; add(id: string): void } {
  const all: string[] = [];
  const alike = likenessSet();
  let [last, lastText] = ['', ''];
  return {
    all,
    add(id) {
      all.push(id);
      if (id === '') return;
      // By itself, and as the text it is hashed as.
      const text = JSON.stringify(id);
      if (id <= last || text <= lastText || alike.add(likenessOf(id))) throw new NeedsWhole();
      [last, lastText] = [id, text];
    },
  };
}

/** Ids that fall out of what the list is used to, known when all were seen: their rows are looked for once more. */
function addHabits(ids: readonly string[], log: ProblemLog, opened: Opened): void {
  const habits = idHabits(ids);
  const odd = new Map(ids.flatMap((id, index) => {
    const fault = habits.fault(id);
    return fault === null ? [] : [[index, { part: id, field: 'id', severity: 'warning', fault } as const]];
  }));
  if (odd.size === 0) return;
  // Such an id may be refused as well, and both are told in one order; so are those that are told when not all can be.
  if (log.errors > 0 || log.kept + odd.size > LIMITS.problems) throw new NeedsWhole();
  let index = 0;
  for (const record of recordsBelow(textRun(opened.source), opened)) {
    const found = odd.get(index++);
    if (found !== undefined) for (const problem of identityProblem({ record, ...found }, opened.columns, log.file)) log.addLater(problem);
  }
}
