import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/**
 * Where figures stand that no header names: two in one cell, words, declarations. An import keeps as JSON what its rows share,
 * `{"slots": {slot: column number}, "declared": text}`; a record keeps, slot to column number, only what is other there.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema.alterTable('list_import').addColumn('sources', 'text').execute();
  await db.schema.alterTable('record').addColumn('figures', 'text').execute();
  await sql`pragma user_version = 3`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.alterTable('record').dropColumn('figures').execute();
  await db.schema.alterTable('list_import').dropColumn('sources').execute();
  await sql`pragma user_version = 2`.execute(db);
}
