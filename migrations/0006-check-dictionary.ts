import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/** What changes the approved list, and the rows that tell whether it does. */
const EVENTS = { insert: ['new'], update: ['old', 'new'], delete: ['old'] } as const;

/**
 * The approved list taken apart for judging: per trait its distinct pieces, and per segment of parts one code each. `part_generation`
 * counts every change of its rows; the dictionary holds while it was made at the same count.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`create table part_generation (only integer primary key check (only = 1), generation integer not null) strict`.execute(db);
  await sql`insert into part_generation values (1, 1)`.execute(db);
  for (const [event, rows] of Object.entries(EVENTS)) {
    const isApproved = rows.map((row) => `${row}.tier = 'approved'`).join(' or ');
    await sql`create trigger ${sql.id(`part_${event}_counts`)} after ${sql.raw(event)} on part when ${sql.raw(isApproved)} begin update part_generation set generation = generation + 1; end`.execute(db);
  }
  await sql`create table dictionary (only integer primary key check (only = 1), generation integer not null, form integer not null, parts integer not null, segment integer not null) strict`.execute(db);
  await sql`create table dictionary_trait (trait text primary key not null, pieces text not null) strict, without rowid`.execute(db);
  await sql`create table dictionary_segment (trait text not null, segment integer not null, width integer not null, codes blob not null, primary key (trait, segment)) strict`.execute(db);
  await sql`pragma user_version = 6`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of ['dictionary_segment', 'dictionary_trait', 'dictionary']) await db.schema.dropTable(table).execute();
  for (const event of Object.keys(EVENTS)) await sql`drop trigger ${sql.id(`part_${event}_counts`)}`.execute(db);
  await db.schema.dropTable('part_generation').execute();
  await sql`pragma user_version = 5`.execute(db);
}
