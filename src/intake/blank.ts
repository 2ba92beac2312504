import type { ListRecord } from './list.js';

/** A record with nothing in it: an empty line, or separators only. */
export function isBlank(record: Pick<ListRecord, 'cells'>): boolean {
  return record.cells.every((cell) => cell.trim() === '');
}
