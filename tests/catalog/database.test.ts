import { chmodSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import { asCatalogError, CatalogError } from '../../src/catalog/catalog-error.js';
import type { CatalogErrorCode } from '../../src/catalog/index.js';
import { openCatalog } from '../../src/catalog/index.js';
import { SCHEMA_VERSION } from '../../src/catalog/schema-version.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

const LIST = list(['id,slew rate min (V/µs)', 'A,1']);

async function codeOf(work: () => unknown): Promise<CatalogErrorCode | null> {
  try {
    await work();
    return null;
  } catch (error) {
    if (error instanceof CatalogError) return error.code;
    throw error;
  }
}

/** Runs as a user who owns nothing: file permissions do not bind the superuser. */
async function asNobody<Result>(work: () => Promise<Result>): Promise<Result> {
  if (process.geteuid?.() !== 0) return work();
  process.seteuid?.(65_534);
  try {
    return await work();
  } finally {
    process.seteuid?.(0);
  }
}

describe('a file that is no catalog', () => {
  it.each([
    ['an empty file', ''],
    ['a text', 'id,package\nA,SO-8\n'.repeat(100)],
  ])('%s is refused and left as it is', async (_, content) => {
    const file = join(temporaryFolder(), 'file');
    writeFileSync(file, content);
    expect(await codeOf(() => openCatalog(file))).toBe('notADatabase');
    expect(readFileSync(file, 'utf8')).toBe(content);
  });

  it('the database of another program is refused and left as it is', async () => {
    const file = join(temporaryFolder(), 'other.sqlite');
    const other = new Database(file);
    other.exec('create table part (id text)');
    other.close();
    const before = readFileSync(file);
    expect(await codeOf(() => openCatalog(file))).toBe('notADatabase');
    expect(readFileSync(file).equals(before)).toBe(true);
  });

  it('a folder cannot be read', async () => {
    expect(await codeOf(() => openCatalog(temporaryFolder()))).toBe('unreadable');
  });

  it('a path through a file cannot be made', async () => {
    const file = join(temporaryFolder(), 'file');
    writeFileSync(file, 'x');
    expect(await codeOf(() => openCatalog(join(file, 'catalog.sqlite')))).toBe('unreadable');
  });
});

it('a catalog of a newer railfit is refused', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  (await openCatalog(file)).close();
  const database = new Database(file);
  database.pragma(`user_version = ${SCHEMA_VERSION + 1}`);
  database.close();
  expect(await codeOf(() => openCatalog(file))).toBe('newerSchema');
});

describe('read-only surroundings', () => {
  async function readOnlyCatalog(): Promise<string> {
    const folder = join(temporaryFolder(), 'shared');
    mkdirSync(folder);
    const file = join(folder, 'catalog.sqlite');
    const catalog = await openCatalog(file);
    catalog.importList(LIST);
    catalog.close();
    chmodSync(file, 0o444);
    chmodSync(folder, 0o555);
    chmodSync(join(folder, '..'), 0o755);
    return file;
  }

  it('a catalog can still be read, and an import says why it cannot be written', async () => {
    const file = await readOnlyCatalog();
    await asNobody(async () => {
      const catalog = await openCatalog(file);
      expect(catalog.source().parts.map(({ id }) => id)).toEqual(['A']);
      expect(catalog.source().origin('A', 'slewRate.min')).toMatchObject({ cell: '1' });
      const other = list(['id', 'A', 'B']);
      expect(catalog.importList(other, { dryRun: true }).outcome).toBe('dry-run');
      expect(await codeOf(() => catalog.importList(other))).toBe('readOnly');
      expect(await codeOf(() => catalog.undo())).toBe('readOnly');
      catalog.close();
    });
    chmodSync(join(file, '..'), 0o755);
  });

  it('a catalog that may be written in a folder that may not is not written', async () => {
    const file = await readOnlyCatalog();
    chmodSync(file, 0o666);
    await asNobody(async () => {
      const catalog = await openCatalog(file);
      expect(await codeOf(() => catalog.importList(list(['id', 'A', 'B'])))).toBe('readOnly');
      expect(catalog.source().parts.map(({ id }) => id)).toEqual(['A']);
      catalog.close();
    });
    chmodSync(join(file, '..'), 0o755);
  });

  it('a catalog is not created there', async () => {
    const file = await readOnlyCatalog();
    expect(await asNobody(() => codeOf(() => openCatalog(join(file, '..', 'new.sqlite'))))).toBe('readOnly');
    chmodSync(join(file, '..'), 0o755);
  });

  it('a catalog of somebody else cannot be read', async () => {
    const file = await readOnlyCatalog();
    chmodSync(file, 0o000);
    expect(await asNobody(() => codeOf(() => openCatalog(file)))).toBe('unreadable');
    chmodSync(join(file, '..'), 0o755);
  });
});

describe('errors of SQLite and the system', () => {
  it.each([
    ['SQLITE_BUSY', 'locked'],
    ['SQLITE_BUSY_SNAPSHOT', 'locked'],
    ['SQLITE_FULL', 'diskFull'],
    ['ENOSPC', 'diskFull'],
    ['SQLITE_READONLY_DBMOVED', 'readOnly'],
    ['SQLITE_IOERR_READ', 'unreadable'],
    ['SQLITE_CORRUPT', 'unreadable'],
    ['SQLITE_NOTADB', 'notADatabase'],
  ])('%s is %s', (code, expected) => {
    const error = asCatalogError(Object.assign(new Error('told by the system'), { code }), 'list.sqlite');
    expect(error).toMatchObject({ code: expected, file: 'list.sqlite', message: expect.stringContaining('list.sqlite: ') as unknown });
    expect((error as CatalogError).fix).not.toBe('');
  });

  it('others stay what they are', () => {
    const fault = new TypeError('a fault of the program');
    expect(asCatalogError(fault, 'list.sqlite')).toBe(fault);
  });
});
