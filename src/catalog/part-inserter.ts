import type Database from 'better-sqlite3';
import { PART_COLUMNS } from './part-columns.js';
import type { Cell } from './part-row.js';

/**
 * Writes rows of `partToRow` and gives their keys. Most columns are empty in all rows of a list: the statement names those that were
 * filled so far, and is made anew when a row fills one more.
 */
export function partInserter(database: Database.Database, importId: number): (row: readonly Cell[]) => number {
  let columns: number[] = [];
  const isKnown = new Uint8Array(PART_COLUMNS.length);
  let insert: Database.Statement | null = null;
  return (row) => {
    for (let at = 0; at < row.length; at += 1) {
      if (isKnown[at] === 1 || row[at] === null) continue;
      isKnown[at] = 1;
      insert = null;
    }
    if (insert === null) {
      columns = PART_COLUMNS.flatMap((_, at) => (isKnown[at] === 1 ? [at] : []));
      insert = database.prepare(`insert into part (import_id, ${columns.map((at) => PART_COLUMNS[at] ?? '').join(', ')}) values (?, ${columns.map(() => '?').join(', ')})`);
    }
    return Number(insert.run(importId, columns.map((at) => row[at] ?? null)).lastInsertRowid);
  };
}
