import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/** What decides hazards: ratings of the inputs, recovery, start-up, and where the supply rejection begins to fall. */
const FIGURES = {
  input_overdrive: ['max'],
  overdrive_current: ['max'],
  differential_input: ['max'],
  overload_recovery: ['typ', 'max'],
  start_up_time: ['typ', 'max'],
  supply_rejection_corner: ['min', 'typ'],
} as const;

/** One REAL column a limit kind and one for points under conditions, and whether the inputs are free of a hand-over. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema.alterTable('part').addColumn('crossover_free', 'integer').execute();
  for (const name of columns()) await db.schema.alterTable('part').addColumn(name, name.endsWith('_points') ? 'text' : 'real').execute();
  await sql`pragma user_version = 4`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const name of columns()) await db.schema.alterTable('part').dropColumn(name).execute();
  await db.schema.alterTable('part').dropColumn('crossover_free').execute();
  await sql`pragma user_version = 3`.execute(db);
}

function columns(): string[] {
  return Object.entries(FIGURES).flatMap(([parameter, kinds]) => [...kinds.map((kind) => `${parameter}_${kind}`), `${parameter}_points`]);
}
