import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { expect, it } from 'vitest';
import { openCatalog } from '../../src/catalog/index.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

/** Another process that holds the write lock of a catalog for some milliseconds. */
const HOLDER = `
  const [, module, file, time] = process.argv;
  const Database = require(module);
  const database = new Database(file);
  database.exec('begin immediate');
  process.stdout.write('locked');
  setTimeout(() => { database.exec('commit'); database.close(); }, Number(time));
`;

it('an import waits for the process that is writing', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const catalog = await openCatalog(file);
  const holder = spawn(process.execPath, ['-e', HOLDER, createRequire(import.meta.url).resolve('better-sqlite3'), file, '300']);
  await once(holder.stdout, 'data');
  const ended = once(holder, 'exit');
  const started = performance.now();
  expect(catalog.importList(list(['id', 'A'])).outcome).toBe('imported');
  expect(performance.now() - started).toBeGreaterThan(100);
  expect(await ended).toEqual([0, null]);
  catalog.close();
});

it('two connections import one after the other, and both see the result', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const [one, two] = [await openCatalog(file), await openCatalog(file)];
  one.importList(list(['id', 'A']));
  expect(two.importList(list(['id', 'A', 'B'])).counts).toMatchObject({ added: 1, unchanged: 1 });
  expect(one.source().parts.map(({ id }) => id)).toEqual(['A', 'B']);
  for (const catalog of [one, two]) catalog.close();
});

it('a lock that is not given back is told as such', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const catalog = await openCatalog(file, { patience: 50 });
  const holder = new Database(file);
  holder.exec('begin immediate');
  expect(() => catalog.importList(list(['id', 'A']))).toThrow(expect.objectContaining({ code: 'locked' }));
  expect(catalog.source().parts).toEqual([]);
  holder.exec('rollback');
  holder.close();
  catalog.close();
});
