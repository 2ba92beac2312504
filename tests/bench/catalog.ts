import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { createCatalog } from '../../src/catalog/create.js';
import { rebuildDictionary } from '../../src/catalog/dictionary.js';
import { importList } from '../../src/catalog/import-list.js';
import { PART_COLUMNS } from '../../src/catalog/part-columns.js';
import { partToRow } from '../../src/catalog/part-row.js';
import { dice } from '../simulate/random.js';
import { genericList } from '../support/generic-list.js';
import { plausibleParts } from './plausible-part.js';

export const SEED = 8;

/** A catalog of so many plausible parts beside the generic sets, made once and kept in `folder`. */
export async function benchCatalog(folder: string, parts: number): Promise<string> {
  const file = join(folder, `bench-${parts}.sqlite`);
  if (existsSync(file)) return file;
  mkdirSync(folder, { recursive: true });
  const draft = `${file}.draft`;
  rmSync(draft, { force: true });
  await createCatalog(draft);
  const database = new Database(draft);
  database.pragma('synchronous = off');
  importList(database, genericList);
  if (parts > 0) {
    fill(database, parts);
    rebuildDictionary(database);
  }
  database.close();
  renameSync(draft, file);
  return file;
}

/** The catalog as it is when it is new. */
export async function shippedCatalog(folder: string): Promise<string> {
  return benchCatalog(folder, 0);
}

/** Straight into the part table, as an import would have left it, without records: the bench asks for no origins of a million parts. */
function fill(database: Database.Database, parts: number): void {
  const sha256 = createHash('sha256').update(`seed ${SEED}, ${parts} parts`).digest('hex');
  database.transaction(() => {
    const { lastInsertRowid: importId } = database
      .prepare("insert into list_import (tier, file, sha256, content_sha256, columns, rows, added, changed, removed, unchanged) values ('approved', 'bench.csv', ?, ?, '[]', ?, ?, 0, 0, 0)")
      .run(sha256, sha256, parts, parts);
    const insert = database.prepare(`insert into part (import_id, ${PART_COLUMNS.join(', ')}) values (?, ${PART_COLUMNS.map(() => '?').join(', ')})`);
    let left = parts;
    for (const part of plausibleParts(dice(SEED, 0))) {
      if (left === 0) break;
      insert.run(importId, ...partToRow(part));
      left -= 1;
    }
  })();
}
