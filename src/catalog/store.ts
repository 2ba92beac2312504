import type Database from 'better-sqlite3';
import type { Tier } from '../parts/part.js';
import { contentHasher } from './content.js';
import { encodingInOrder, rebuildDictionary } from './dictionary.js';
import type { Difference } from './difference.js';
import { FATE } from './difference.js';
import { completeImport, currentImport, insertImport, updateOrigin, type ImportEnd } from './imports.js';
import { lengthOf, rowsInOrder, type IncomingList, type IncomingRow } from './incoming.js';
import { partInserter } from './part-inserter.js';
import type { Progress } from './progress.js';

/** The same parts in other bytes: where each figure came from is now this file. No version is made, so undo takes back what it did before. */
export function refreshOrigins(database: Database.Database, list: IncomingList, importId: number): void {
  updateOrigin(database, importId, list);
  database.prepare('delete from record where import_id = ?').run(importId);
  const writeRecord = recordWriter(database, list, importId);
  for (const row of rowsInOrder(list)) writeRecord(row);
}

export interface Writing {
  readonly now: string | null;
  readonly progress: Progress;
}

/** Writes a difference: a new import, its versions and its records. To be run inside a transaction. */
export function writeDifference(database: Database.Database, list: IncomingList, { difference, ...writing }: Writing & { readonly difference: Difference }): void {
  const { counts, contentSha256, removed, fates } = difference;
  const writer = importWriter(database, list, writing);
  for (const id of removed) writer.withdraw(id);
  let at = 0;
  for (const one of rowsInOrder(list)) writer.write(one, fates[at++] ?? FATE.added);
  writer.finish({ sha256: list.sha256, contentSha256, counts });
}

/** Writes the first list of a tier, with which there is nothing to compare: in one walk. */
export function writeFirst(database: Database.Database, list: IncomingList, writing: Writing): Pick<Difference, 'added' | 'counts'> {
  const writer = importWriter(database, list, writing);
  const hasher = contentHasher();
  const added: string[] = [];
  for (const one of rowsInOrder(list)) {
    hasher.add(one.content);
    added.push(one.id);
    writer.write(one, FATE.added);
  }
  const counts = { rows: added.length, added: added.length, changed: 0, removed: 0, unchanged: 0 };
  writer.finish({ sha256: list.sha256, contentSha256: hasher.digest(), counts });
  return { added, counts };
}

interface ImportWriter {
  readonly withdraw: (id: string) => void;
  readonly write: (one: IncomingRow, fate: number) => void;
  readonly finish: (end: ImportEnd) => void;
}

function importWriter(database: Database.Database, list: IncomingList, { now, progress }: Writing): ImportWriter {
  const { file, tier, columns, sources } = list;
  const importId = insertImport(database, { file, tier, columns, sources, importedAt: now });
  const end = database.prepare('update part set withdrawn_at = ? where tier = ? and id = ? and withdrawn_at is null');
  const withdraw = (id: string): void => void end.run(importId, tier, id);
  const insert = partInserter(database, importId);
  const keyOf = database.prepare<[string, string], number>('select key from part where tier = ? and id = ? and withdrawn_at is null').pluck();
  const writeRecord = recordWriter(database, list, importId);
  const encoding = tier === 'approved' ? encodingInOrder(database) : null;
  const length = lengthOf(list);
  let written = 0;
  return {
    withdraw,
    write(one, fate) {
      const { id, row } = one;
      if (fate === FATE.changed) withdraw(id);
      const key = fate === FATE.unchanged ? keyOf.get(tier, id) : insert(row);
      if (key === undefined) throw new RangeError(`part ${id} is unchanged, but not in force`);
      encoding?.add(id, key, row);
      writeRecord(one);
      written += 1;
      progress(written, length);
    },
    finish(known) {
      encoding?.finish();
      completeImport(database, importId, known);
    },
  };
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

function recordWriter(database: Database.Database, list: IncomingList, importId: number): (one: IncomingRow) => void {
  const insert = database.prepare('insert into record (import_id, part_id, line, row, cells, figures, patched) values (?, ?, ?, ?, ?, ?, ?)');
  return ({ id, index, place: { line, row }, cells }) => {
    const others = list.sources.others.get(index);
    const patched = list.patched?.get(index);
    insert.run(importId, id, line, row, cells(), others === undefined ? null : JSON.stringify(Object.fromEntries(others)), patched === undefined ? null : JSON.stringify(patched));
  };
}
