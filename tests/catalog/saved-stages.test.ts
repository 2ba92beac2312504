import { chmodSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { Kysely, SqliteDialect } from 'kysely';
import { describe, expect, it } from 'vitest';
import * as m0001 from '../../migrations/0001-parts.js';
import { openCatalog } from '../../src/catalog/index.js';
import { migrate } from '../../src/catalog/migrate.js';
import { MIGRATIONS } from '../../migrations/index.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

/** A catalog file as the first version of the tables left it, with one part. */
async function oldCatalog(): Promise<string> {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const database = new Database(file);
  const [first = ''] = Object.keys(MIGRATIONS);
  await migrate(database, { [first]: m0001 });
  database.exec("insert into list_import (tier, file, sha256, content_sha256, columns, rows, added, changed, removed, unchanged) values ('approved', 'old.csv', 'x', 'y', '[]', 1, 1, 0, 0, 0)");
  database.exec("insert into part (import_id, tier, id) values (1, 'approved', 'A')");
  database.exec("insert into record (import_id, part_id, line, row, cells) values (1, 'A', 2, 2, '[\"A\"]')");
  database.close();
  return file;
}

describe('saved stages', () => {
  it('are kept by path with the part chosen, replaced and forgotten', async () => {
    const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
    expect(catalog.savedStages()).toEqual([]);
    catalog.saveStages([{ path: 'b.yaml', part: null }, { path: 'a.yaml', part: 'A' }]);
    expect(catalog.savedStages()).toEqual([{ path: 'a.yaml', part: 'A' }, { path: 'b.yaml', part: null }]);
    catalog.saveStages([{ path: 'b.yaml', part: '0012' }]);
    catalog.removeStages(['a.yaml', 'nowhere.yaml']);
    expect(catalog.savedStages()).toEqual([{ path: 'b.yaml', part: '0012' }]);
    catalog.importList(list(['id', 'A']));
    catalog.undo();
    expect(catalog.savedStages()).toHaveLength(1);
    catalog.close();
  });
});

describe('tables of an earlier version', () => {
  it('are brought up to date with what is in them, by one of several that open them at once', async () => {
    const file = await oldCatalog();
    const all = await Promise.all([openCatalog(file), openCatalog(file), openCatalog(file)]);
    for (const catalog of all) expect(catalog.source().parts.map(({ id }) => id)).toEqual(['A']);
    all[0].saveStages([{ path: 'a.yaml', part: null }]);
    expect(all[2].savedStages()).toHaveLength(1);
    for (const catalog of all) catalog.close();
  });

  it.skipIf(process.platform === 'win32' || process.geteuid === undefined)('are read as they are where nothing may be written', async () => {
    const file = await oldCatalog();
    const folder = join(file, '..');
    chmodSync(file, 0o444);
    chmodSync(folder, 0o555);
    const isRoot = process.geteuid?.() === 0;
    if (isRoot) process.seteuid?.(65_534);
    try {
      const catalog = await openCatalog(file);
      expect(catalog.source().parts.map(({ id }) => id)).toEqual(['A']);
      expect(catalog.source().origin('A', 'slewRate.min')).toBeNull();
      expect(catalog.savedStages()).toEqual([]);
      catalog.close();
    } finally {
      if (isRoot) process.seteuid?.(0);
      chmodSync(folder, 0o755);
    }
  });

  it('can be taken back, one version after the other', async () => {
    const database = new Database(':memory:');
    await migrate(database);
    const db = new Kysely<unknown>({ dialect: new SqliteDialect({ database }) });
    for (const [at, migration] of Object.values(MIGRATIONS).reverse().entries()) {
      await migration.down?.(db);
      expect(database.pragma('user_version', { simple: true })).toBe(Object.keys(MIGRATIONS).length - 1 - at);
    }
    expect(database.prepare("select name from sqlite_schema where type = 'table' and name not like 'kysely%' and name not like 'sqlite%'").all()).toEqual([]);
  });
});
