import type Database from 'better-sqlite3';
import type { Migration } from 'kysely';
import { Kysely, Migrator, SqliteAdapter, SqliteDialect } from 'kysely';
import { MIGRATIONS } from '../../migrations/index.js';

/** Brings the tables up to date in one transaction: all migrations that are missing, or none. Throws what a migration threw. */
export async function migrate(database: Database.Database, migrations: Readonly<Record<string, Migration>> = MIGRATIONS): Promise<void> {
  // Destroying the Kysely instance would close the connection, which belongs to the caller.
  const db = new Kysely<unknown>({ dialect: new TransactionalDialect({ database }) });
  const provider = { getMigrations: () => Promise.resolve({ ...migrations }) };
  const { error } = await new Migrator({ db, provider }).migrateToLatest();
  if (error !== undefined) throw error instanceof Error ? error : new Error('a migration failed', { cause: error });
}

// SQLite rolls back DDL, but Kysely's adapter says it does not, and a migration that fails half-way would leave its first tables.
class TransactionalDialect extends SqliteDialect {
  override createAdapter(): SqliteAdapter {
    return new TransactionalAdapter();
  }
}

class TransactionalAdapter extends SqliteAdapter {
  override get supportsTransactionalDdl(): boolean {
    return true;
  }
}
