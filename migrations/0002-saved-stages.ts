import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/** The stage files a team keeps by path, each with the part chosen for it. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('saved_stage')
    .addColumn('path', 'text', (column) => column.primaryKey().notNull())
    .addColumn('part', 'text')
    .modifyEnd(sql`strict, without rowid`)
    .execute();
  await sql`pragma user_version = 2`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.dropTable('saved_stage').execute();
  await sql`pragma user_version = 1`.execute(db);
}
