import { accessSync, constants, statSync } from 'node:fs';
import Database from 'better-sqlite3';
import { asCatalogError, CatalogError } from './catalog-error.js';
import { createCatalog } from './create.js';
import { APPLICATION_ID, SCHEMA_VERSION } from './schema-version.js';

export interface OpenDatabase {
  readonly database: Database.Database;
  /** True when this call created the file. */
  readonly isNew: boolean;
}

export interface OpenOptions {
  /** How long to wait for another process to finish writing, milliseconds; 10 s when absent. */
  readonly patience?: number;
}

/** Opens the catalog file, creating it when there is none and bringing older tables up to date. Foreign files are left alone. */
export async function openDatabase(file: string, { patience = 10_000 }: OpenOptions = {}): Promise<OpenDatabase> {
  const isNew = exists(file) ? false : await createCatalog(file);
  const database = connect(file, patience);
  try {
    await bringUpToDate(database, file);
    return { database, isNew };
  } catch (error) {
    database.close();
    throw asCatalogError(error, file);
  }
}

function exists(file: string): boolean {
  try {
    const found = statSync(file);
    if (found.isDirectory()) throw new CatalogError('unreadable', file, { message: 'a folder, where a catalog file is expected' });
    if (found.size === 0) throw new CatalogError('notADatabase', file, { message: 'the file is empty, which no catalog is' });
    accessSync(file, constants.R_OK);
    return true;
  } catch (error) {
    if ((error as { code?: string }).code === 'ENOENT') return false;
    throw asCatalogError(error, file);
  }
}

function connect(file: string, patience: number): Database.Database {
  try {
    // The rollback journal is kept: a write-ahead log could not be read from a folder that is read-only.
    return new Database(file, { fileMustExist: true, timeout: patience });
  } catch (error) {
    throw asCatalogError(error, file);
  }
}

async function bringUpToDate(database: Database.Database, file: string): Promise<void> {
  if (database.pragma('application_id', { simple: true }) !== APPLICATION_ID) throw new CatalogError('notADatabase', file);
  const version = Number(database.pragma('user_version', { simple: true }));
  if (version > SCHEMA_VERSION) throw new CatalogError('newerSchema', file);
  if (version === SCHEMA_VERSION) return;
  try {
    await migrateInTurn(database);
  } catch (error) {
    // The tables of every version so far can be read as they are; what needs the new ones does without.
    if (version < 1 || (asCatalogError(error, file) as { code?: string }).code !== 'readOnly') throw error;
  }
}

/** Of several processes that find old tables at once one brings them up to date; the others find it done. */
async function migrateInTurn(database: Database.Database): Promise<void> {
  const { migrate } = await import('./migrate.js');
  for (let left = ATTEMPTS; ; left -= 1) {
    try {
      return await migrate(database);
    } catch (error) {
      // Two that have read before either writes cannot both wait: SQLite sends one away at once.
      if (left <= 1 || !String((error as { code?: unknown }).code).startsWith('SQLITE_BUSY')) throw error;
      await new Promise((resolve) => setTimeout(resolve, PAUSE));
    }
  }
}

const ATTEMPTS = 40;
/** Milliseconds. */
const PAUSE = 50;
