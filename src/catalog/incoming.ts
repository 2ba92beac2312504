import type { ListRow, ListStream, ReadList } from '../intake/list.js';
import { contentOrder } from './content.js';

/** A list that is taken in: read as a whole before, or while it is taken in. */
export type IncomingList = ReadList | ListStream;

/** The parts of a list in the order their content is hashed in; of a stream, every walk reads it anew. */
export function rowsInOrder(list: IncomingList): Iterable<ListRow> {
  if ('rows' in list) return list.rows();
  const { parts, records } = list;
  return contentOrder(parts).flatMap((index): ListRow[] => {
    const [part, record] = [parts[index], records[index]];
    return part === undefined ? [] : [{ part, index, record: record ?? NO_RECORD }];
  });
}

const NO_RECORD = { line: 0, lineEnd: 0, row: 0, cells: [] };

/** How many parts there are; of a stream, as the part of the file that was read lets expect. */
export function expectedRows(list: IncomingList, done: number): number {
  return 'rows' in list ? done / Math.max(list.share(), 1e-9) : list.parts.length;
}
