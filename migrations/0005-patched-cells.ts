import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/**
 * Figures that came from a look-up sheet and not from the list itself: a record keeps as JSON, by slot or identity field, the cell of
 * the sheet they stand in.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema.alterTable('record').addColumn('patched', 'text').execute();
  await sql`pragma user_version = 5`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.alterTable('record').dropColumn('patched').execute();
  await sql`pragma user_version = 4`.execute(db);
}
