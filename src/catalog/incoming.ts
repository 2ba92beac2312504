import type { ReadList } from '../intake/list.js';
import type { Part } from '../parts/part.js';
import { contentOrder } from './content.js';
import { partToRow, type Cell } from './part-row.js';
import type { StagedList } from './staged-list.js';

/** A list that is taken in: in memory, or written aside while it was read. */
export type IncomingList = ReadList | StagedList;

/** One part of a list on its way into the catalog. */
export interface IncomingRow {
  readonly id: string;
  /** As `partToRow` makes it. */
  readonly row: readonly Cell[];
  /** `row` as JSON. */
  readonly content: string;
  /** Of the part in the list; what `sources.others` and `patched` are told by. */
  readonly index: number;
  /** Where the record starts in the file, and its number. */
  readonly place: { readonly line: number; readonly row: number };
  readonly part: () => Part;
  /** The cells of its record as JSON. */
  readonly cells: () => string;
}

/** The parts of a list in the order their content is hashed in. */
export function* rowsInOrder(list: IncomingList): Iterable<IncomingRow> {
  if ('rows' in list) {
    yield* list.rows();
    return;
  }
  const { parts, records } = list;
  for (const index of contentOrder(parts)) {
    const [part, record] = [parts[index], records[index]];
    if (part === undefined || record === undefined) throw new RangeError(`part ${index} of ${list.file} has no record`);
    const row = partToRow(part);
    yield { id: part.id, row, content: JSON.stringify(row), index, place: record, part: () => part, cells: () => JSON.stringify(record.cells) };
  }
}

/** How many parts there are. */
export const lengthOf = (list: IncomingList): number => ('rows' in list ? list.length : list.parts.length);
