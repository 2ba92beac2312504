import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import type { Kysely, Migration } from 'kysely';
import { Migrator, sql } from 'kysely';
import { describe, expect, it } from 'vitest';
import { MIGRATIONS } from '../../migrations/index.js';
import * as m0001 from '../../migrations/0001-parts.js';
import { createCatalog } from '../../src/catalog/create.js';
import { migrate } from '../../src/catalog/migrate.js';
import { FIGURE_COLUMNS, PART_COLUMNS } from '../../src/catalog/part-columns.js';
import { APPLICATION_ID, SCHEMA_VERSION } from '../../src/catalog/schema-version.js';
import { PARAMETERS } from '../../src/parts/figures.js';
import type { Parameter } from '../../src/parts/figures.js';
import { temporaryFolder } from './temporary.js';

const tables = (database: Database.Database): unknown[] =>
  database.prepare("select name from sqlite_schema where type = 'table' and name not like 'sqlite_%' order by name").pluck().all();

const BROKEN: Migration = {
  async up(db: Kysely<unknown>): Promise<void> {
    await db.schema.createTable('half_way').addColumn('id', 'text').execute();
    await sql`pragma user_version = 2`.execute(db);
    await sql`insert into nowhere values (1)`.execute(db);
  },
};

describe('the migrations', () => {
  it('are all listed, and their number is the schema version (edit migrations/index.ts and src/catalog/schema-version.ts)', () => {
    const files = readdirSync(join(import.meta.dirname, '../../migrations'))
      .filter((name) => /^\d{4}-.*\.ts$/u.test(name))
      .map((name) => name.replace('.ts', ''));
    expect(Object.keys(MIGRATIONS)).toEqual(files.sort());
    expect(SCHEMA_VERSION).toBe(files.length);
  });

  it('make STRICT tables, with the marks of a catalog', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    const strict = database.prepare("select name from pragma_table_list where strict = 1 and schema = 'main' order by name").pluck().all();
    expect(strict).toEqual(['dictionary', 'dictionary_segment', 'dictionary_trait', 'list_import', 'part', 'part_generation', 'record', 'saved_stage']);
    expect(database.pragma('application_id', { simple: true })).toBe(APPLICATION_ID);
    expect(database.pragma('user_version', { simple: true })).toBe(SCHEMA_VERSION);
  });

  it('are done once', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    await migrate(database);
    expect(database.pragma('user_version', { simple: true })).toBe(SCHEMA_VERSION);
  });

  it('can be taken back', async () => {
    const database = new Database(':memory:');
    const { Kysely, SqliteDialect } = await import('kysely');
    const db = new Kysely<unknown>({ dialect: new SqliteDialect({ database }) });
    await m0001.up(db);
    await m0001.down(db);
    expect(tables(database)).toEqual([]);
    expect(database.pragma('user_version', { simple: true })).toBe(0);
  });
});

describe('a migration that fails half-way', () => {
  it('leaves the tables as they were', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    const before = tables(database);
    await expect(migrate(database, { ...MIGRATIONS, '9999-broken': BROKEN })).rejects.toThrow(/nowhere/u);
    expect(tables(database)).toEqual(before);
    expect(database.pragma('user_version', { simple: true })).toBe(SCHEMA_VERSION);
    await migrate(database);
  });

  it('would leave them with the ordinary dialect, which is why there is one of our own', async () => {
    const database = new Database(':memory:');
    const { Kysely, SqliteDialect } = await import('kysely');
    const db = new Kysely<unknown>({ dialect: new SqliteDialect({ database }) });
    await new Migrator({ db, provider: { getMigrations: () => Promise.resolve({ '0001-broken': BROKEN }) } }).migrateToLatest();
    expect(tables(database)).toContain('half_way');
  });

  it('leaves no file behind when the catalog was being created', async () => {
    const folder = temporaryFolder();
    const create = createCatalog(join(folder, 'catalog.sqlite'), { ...MIGRATIONS, '9999-broken': BROKEN });
    await expect(create).rejects.toThrow(/nowhere/u);
    expect(readdirSync(folder)).toEqual([]);
  });
});

describe('the part table', () => {
  it('has the columns of every parameter and kind (a new one needs a migration)', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    const types = new Map(database.prepare<[], [string, string]>("select name, type from pragma_table_info('part')").raw().all());
    for (const parameter of Object.keys(PARAMETERS) as Parameter[]) {
      const columns = FIGURE_COLUMNS.filter((column) => column.parameter === parameter);
      expect(columns.map(({ kind }) => kind)).toEqual([...PARAMETERS[parameter].kinds, null]);
      expect(columns.map(({ name, kind }) => [types.get(name), kind])).toEqual(columns.map(({ kind }) => [kind === null ? 'TEXT' : 'REAL', kind]));
    }
    expect([...types.keys()].filter((name) => !PART_COLUMNS.includes(name))).toEqual(['key', 'import_id', 'withdrawn_at']);
  });

  it('keeps ids as text', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    const type = database.prepare("select type from pragma_table_info('part') where name = 'id'").pluck().get();
    expect(type).toBe('TEXT');
  });
});
