import type Database from 'better-sqlite3';
import type { ListColumn } from '../intake/list.js';
import type { Tier } from '../parts/part.js';

/** The import a tier stands at. */
export interface CurrentImport {
  readonly id: number;
  readonly file: string;
  readonly sha256: string;
  readonly contentSha256: string;
}

/** What an import did to the list: parts by id, and `rows` read. */
export interface ImportCounts {
  readonly rows: number;
  readonly added: number;
  readonly changed: number;
  readonly removed: number;
  readonly unchanged: number;
}

export interface NewImport extends Omit<CurrentImport, 'id'> {
  readonly tier: Tier;
  readonly columns: readonly ListColumn[];
  /** ISO 8601 as the caller gave it, or null. */
  readonly importedAt: string | null;
  readonly counts: ImportCounts;
}

/** The last import of a tier that was not taken back; null before the first. */
export function currentImport(database: Database.Database, tier: Tier): CurrentImport | null {
  const query = database.prepare<[Tier], CurrentImport>(
    `select id, file, sha256, content_sha256 as contentSha256 from list_import where tier = ? and undone = 0 order by id desc limit 1`,
  );
  return query.get(tier) ?? null;
}

export function insertImport(database: Database.Database, { counts, columns, ...values }: NewImport): number {
  const insert = database.prepare(
    `insert into list_import (tier, file, sha256, content_sha256, imported_at, columns, rows, added, changed, removed, unchanged)
     values (@tier, @file, @sha256, @contentSha256, @importedAt, @columns, @rows, @added, @changed, @removed, @unchanged)`,
  );
  return Number(insert.run({ ...values, ...counts, columns: JSON.stringify(columns) }).lastInsertRowid);
}

/** The file an import is read from now. */
export function updateOrigin(database: Database.Database, importId: number, { file, sha256, columns }: Pick<NewImport, 'file' | 'sha256' | 'columns'>): void {
  database.prepare('update list_import set file = ?, sha256 = ?, columns = ? where id = ?').run(file, sha256, JSON.stringify(columns), importId);
}

export function importColumns(database: Database.Database, importId: number): readonly ListColumn[] {
  const query = database.prepare<[number], string>('select columns from list_import where id = ?').pluck();
  return JSON.parse(query.get(importId) ?? '[]') as ListColumn[];
}
