import type Database from 'better-sqlite3';
import type { ReadList } from '../intake/list.js';
import type { Tier } from '../parts/part.js';
import { encodeList, rebuildDictionary } from './dictionary.js';
import { encoder, type Encoder } from './encoder.js';
import type { Difference } from './difference.js';
import { FATE } from './difference.js';
import { currentImport, insertImport, updateOrigin } from './imports.js';
import { PART_COLUMNS } from './part-columns.js';
import { partToRow } from './part-row.js';
import type { Progress } from './progress.js';

/** The same parts in other bytes: where each figure came from is now this file. No version is made, so undo takes back what it did before. */
export function refreshOrigins(database: Database.Database, list: ReadList, importId: number): void {
  updateOrigin(database, importId, list);
  database.prepare('delete from record where import_id = ?').run(importId);
  const writeRecord = recordWriter(database, list, importId);
  list.parts.forEach(({ id }, index) => writeRecord(id, index));
}

export interface Writing {
  readonly difference: Difference;
  readonly now: string | null;
  readonly progress: Progress;
}

/** Writes a difference: a new import, its versions and its records. To be run inside a transaction. */
export function writeDifference(database: Database.Database, list: ReadList, { difference, now, progress }: Writing): void {
  const { file, sha256, tier, columns, sources } = list;
  const { counts, contentSha256, removed, fates } = difference;
  const importId = insertImport(database, { file, sha256, tier, columns, sources, counts, contentSha256, importedAt: now });
  const withdraw = database.prepare('update part set withdrawn_at = ? where tier = ? and id = ? and withdrawn_at is null');
  for (const id of removed) withdraw.run(importId, tier, id);
  const insert = database.prepare(
    `insert into part (import_id, ${PART_COLUMNS.join(', ')}) values (?, ${PART_COLUMNS.map(() => '?').join(', ')})`,
  );
  const writeRecord = recordWriter(database, list, importId);
  const encoding = encodingOnTheWay(database, list, difference);
  list.parts.forEach((part, index) => {
    if (fates[index] === FATE.changed) withdraw.run(importId, tier, part.id);
    if (fates[index] !== FATE.unchanged) {
      const row = partToRow(part);
      const { lastInsertRowid: key } = insert.run(importId, row);
      encoding?.add(Number(key), row);
    }
    writeRecord(part.id, index);
    progress(index + 1, list.parts.length);
  });
  if (encoding !== null) encoding.finish();
  else if (tier === 'approved') encodeList(database, list.parts);
}

/** A list of new versions alone, in the order of the dictionary, is encoded while it is written; any other afterwards. */
function encodingOnTheWay(database: Database.Database, { tier, parts }: ReadList, { counts }: Difference): Encoder | null {
  const isInOrder = parts.every(({ id }, at) => at === 0 || (parts[at - 1]?.id ?? '') < id);
  return tier === 'approved' && counts.unchanged === 0 && isInOrder ? encoder(database, parts.length) : null;
}

/**
 * Takes the last import of a tier back: its versions end, those it had ended are in force again.
 *
 * @returns false when there is no import to take back.
 */
export function undoImport(database: Database.Database, tier: Tier): boolean {
  const current = currentImport(database, tier);
  if (current === null) return false;
  database.prepare('update part set withdrawn_at = ? where import_id = ?').run(current.id, current.id);
  database.prepare('update part set withdrawn_at = null where withdrawn_at = ? and import_id <> ?').run(current.id, current.id);
  database.prepare('update list_import set undone = 1 where id = ?').run(current.id);
  if (tier === 'approved') rebuildDictionary(database);
  return true;
}

function recordWriter(database: Database.Database, list: ReadList, importId: number): (id: string, index: number) => void {
  const insert = database.prepare('insert into record (import_id, part_id, line, row, cells, figures, patched) values (?, ?, ?, ?, ?, ?, ?)');
  return (id, index) => {
    const record = list.records[index];
    if (record === undefined) return;
    const others = list.sources.others.get(index);
    const patched = list.patched?.get(index);
    insert.run(importId, id, record.line, record.row, JSON.stringify(record.cells), others === undefined ? null : JSON.stringify(Object.fromEntries(others)), patched === undefined ? null : JSON.stringify(patched));
  };
}
