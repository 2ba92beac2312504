import type Database from 'better-sqlite3';
import type { ListColumn } from '../intake/list.js';
import type { ListSources } from '../intake/list-sources.js';
import type { Tier } from '../parts/part.js';
import { sourcesText } from './import-columns.js';

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
  readonly sources: ListSources;
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

/** The bytes of this list were in force before, and another list has replaced them since. */
export function isSuperseded(database: Database.Database, { tier, sha256 }: Pick<NewImport, 'tier' | 'sha256'>): boolean {
  const query = database.prepare<[Tier, string], number>('select 1 from list_import where tier = ? and sha256 = ? and undone = 0').pluck();
  return query.get(tier, sha256) !== undefined && currentImport(database, tier)?.sha256 !== sha256;
}

/** What an import is known to be when its rows are written. */
export type ImportEnd = Pick<NewImport, 'sha256' | 'contentSha256' | 'counts'>;

/** Begins an import, to be completed in the same transaction. */
export function insertImport(database: Database.Database, { columns, sources, ...values }: Omit<NewImport, keyof ImportEnd>): number {
  const insert = database.prepare(
    `insert into list_import (tier, file, sha256, content_sha256, imported_at, columns, sources, rows, added, changed, removed, unchanged)
     values (@tier, @file, '', '', @importedAt, @columns, @sources, 0, 0, 0, 0, 0)`,
  );
  return Number(insert.run({ ...values, columns: JSON.stringify(columns), sources: sourcesText(sources) }).lastInsertRowid);
}

export function completeImport(database: Database.Database, id: number, { sha256, contentSha256, counts }: ImportEnd): void {
  database
    .prepare('update list_import set sha256 = @sha256, content_sha256 = @contentSha256, rows = @rows, added = @added, changed = @changed, removed = @removed, unchanged = @unchanged where id = @id')
    .run({ id, sha256, contentSha256, ...counts });
}

/** One import by its number. */
export function importById(database: Database.Database, importId: number): CurrentImport | null {
  const query = database.prepare<[number], CurrentImport>('select id, file, sha256, content_sha256 as contentSha256 from list_import where id = ?');
  return query.get(importId) ?? null;
}

type Read = Pick<NewImport, 'file' | 'sha256' | 'columns' | 'sources'>;

/** The file an import is read from now, and how. */
export function updateOrigin(database: Database.Database, importId: number, { file, sha256, columns, sources }: Read): void {
  database.prepare('update list_import set file = ?, sha256 = ?, columns = ?, sources = ? where id = ?').run(file, sha256, JSON.stringify(columns), sourcesText(sources), importId);
}

/** The same bytes read in the same way as this import was. */
export function isReadAlike(database: Database.Database, { id, sha256 }: CurrentImport, read: Read): boolean {
  if (sha256 !== read.sha256) return false;
  const query = database.prepare<[number], readonly [string, string | null]>('select columns, sources from list_import where id = ?').raw();
  const [columns, sources] = query.get(id) ?? [];
  return columns === JSON.stringify(read.columns) && sources === sourcesText(read.sources);
}
