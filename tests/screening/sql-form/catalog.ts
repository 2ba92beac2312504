import Database from 'better-sqlite3';
import { createCatalog } from '../../../src/catalog/create.js';
import { rebuildDictionary } from '../../../src/catalog/dictionary.js';
import { PART_COLUMNS } from '../../../src/catalog/part-columns.js';
import { partToRow } from '../../../src/catalog/part-row.js';
import type { Part } from '../../../src/parts/part.js';

/** A catalog with these parts in its part table as an import leaves them, whatever a list could say of them, and its dictionary made. */
export async function writeCatalog(file: string, { approved, generic }: { readonly approved: readonly Part[]; readonly generic: readonly Part[] }): Promise<void> {
  await createCatalog(file);
  const database = new Database(file);
  const lists = database.prepare("insert into list_import (tier, file, sha256, content_sha256, columns, rows, added, changed, removed, unchanged) values (?, 'drawn.csv', 'none', 'none', '[]', ?, ?, 0, 0, 0)");
  const insert = database.prepare(`insert into part (import_id, ${PART_COLUMNS.join(', ')}) values (?, ${PART_COLUMNS.map(() => '?').join(', ')})`);
  for (const parts of [generic, approved]) {
    const { lastInsertRowid } = lists.run(parts[0]?.tier ?? 'generic', parts.length, parts.length);
    for (const part of parts) insert.run(lastInsertRowid, ...partToRow(part));
  }
  rebuildDictionary(database);
  database.close();
}
