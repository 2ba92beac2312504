import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import type { Catalog, GuardName } from '../../src/catalog/index.js';
import { openCatalog } from '../../src/catalog/index.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

const HEADER = 'id,package,slew rate min (V/µs),output low headroom max (mV) @ 1 mA,output low headroom max (mV) @ 5 mA';
const FIRST = list([HEADER, 'B,SO-8,0.5,30,150', 'A,SC-70-5,1,20,']);
const SECOND = list([HEADER, 'A,SC-70-5,2,20,', 'C,SO-8,3,,'], { file: 'second.csv' });
/** One of two parts goes: the guard has been told. */
const SAID = { accept: new Set<GuardName>(['removed']) };
const GENERIC = list(['id,class,slew rate typ (V/µs)', 'GX-2,fast,5', 'GX-1,fast,4'], { tier: 'generic', file: 'generic.csv' });

async function newCatalog(): Promise<Catalog> {
  return openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
}

const ids = (catalog: Catalog): string[] => catalog.source().parts.map(({ id }) => id);

describe('opening', () => {
  it('creates folder and file once', async () => {
    const file = join(temporaryFolder(), 'a', 'b', 'catalog.sqlite');
    const first = await openCatalog(file);
    expect(first.isNew).toBe(true);
    expect(first.source().parts).toEqual([]);
    first.close();
    const second = await openCatalog(file);
    expect(second.isNew).toBe(false);
    second.close();
    expect(readdirSync(join(file, '..'))).toEqual(['catalog.sqlite']);
  });

  it('leaves one catalog when several open it at once', async () => {
    const file = join(temporaryFolder(), 'catalog.sqlite');
    const all = await Promise.all([openCatalog(file), openCatalog(file), openCatalog(file)]);
    expect(all.filter(({ isNew }) => isNew)).toHaveLength(1);
    all[0].importList(FIRST);
    expect(all.map(ids)).toEqual([['A', 'B'], ['A', 'B'], ['A', 'B']]);
    for (const catalog of all) catalog.close();
    expect(readdirSync(join(file, '..'))).toEqual(['catalog.sqlite']);
  });
});

describe('importing', () => {
  it('stores parts as they were read, by id', async () => {
    const catalog = await newCatalog();
    expect(catalog.importList(FIRST)).toMatchObject({ outcome: 'imported', counts: { rows: 2, added: 2, changed: 0, removed: 0, unchanged: 0 } });
    expect(catalog.source().parts).toEqual([...FIRST.parts].sort((a, b) => (a.id < b.id ? -1 : 1)));
    catalog.close();
  });

  it('is no change when the file is the same', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    const before = catalog.source().sha256;
    const again = { outcome: 'no-change', counts: { rows: 2, added: 0, changed: 0, removed: 0, unchanged: 2 } };
    expect(catalog.importList(FIRST, { now: '2031-01-01T00:00:00Z' })).toMatchObject(again);
    expect(catalog.importList(FIRST, { dryRun: true })).toMatchObject(again);
    expect(catalog.source().sha256).toBe(before);
    catalog.close();
  });

  it('replaces the list, counting what was added, changed and removed', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    const counts = { rows: 2, added: 1, changed: 1, removed: 1, unchanged: 0 };
    const dry = catalog.importList(SECOND, { ...SAID, dryRun: true });
    expect(dry).toMatchObject({ outcome: 'dry-run', counts, added: ['C'], removed: ['B'], previous: { file: 'list.csv', sha256: FIRST.sha256 } });
    expect(dry.changed.map(({ before, after }) => [before.id, before.figures.at(-1)?.value, after.figures.at(-1)?.value])).toEqual([['A', 1e6, 2e6]]);
    expect(ids(catalog)).toEqual(['A', 'B']);
    expect(catalog.importList(SECOND, SAID)).toMatchObject({ outcome: 'imported', counts });
    expect(catalog.source().parts.map(({ id, figures }) => [id, figures.at(-1)?.value])).toEqual([['A', 2e6], ['C', 3e6]]);
    catalog.close();
  });

  it('keeps every version: withdrawn, never erased', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    catalog.importList(SECOND, SAID);
    const database = new Database(catalog.file, { readonly: true });
    const versions = database.prepare('select id, import_id, withdrawn_at from part order by id, import_id').raw().all();
    expect(versions).toEqual([['A', 1, 2], ['A', 2, null], ['B', 1, 2], ['C', 2, null]]);
    database.close();
    catalog.close();
  });

  it('is no change when other bytes say the same: the origins are kept anew, and undo takes back what it did before', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    const reordered = list([HEADER, 'A,SC-70-5,1,20,', 'B,SO-8,0.5,30,150'], { file: 'reordered.csv' });
    const before = catalog.source().sha256;
    const noChange = { outcome: 'no-change', counts: { rows: 2, added: 0, changed: 0, removed: 0, unchanged: 2 } };
    expect(catalog.importList(reordered, { dryRun: true })).toMatchObject(noChange);
    expect(catalog.source().origin('A', 'slewRate.min')).toMatchObject({ file: 'list.csv', line: 3, cell: '1' });
    expect(catalog.importList(reordered)).toMatchObject(noChange);
    expect(catalog.source().sha256).toBe(before);
    expect(catalog.source().origin('A', 'slewRate.min')).toMatchObject({ file: 'reordered.csv', line: 2, cell: '1' });
    expect([catalog.undo(), catalog.undo()]).toEqual([true, false]);
    expect(ids(catalog)).toEqual([]);
    catalog.close();
  });

  it('keeps the time it was told, which changes no hash', async () => {
    const [one, two] = [await newCatalog(), await newCatalog()];
    one.importList(FIRST, { now: '2031-01-01T00:00:00Z' });
    two.importList(FIRST);
    expect(one.source().sha256).toBe(two.source().sha256);
    const database = new Database(one.file, { readonly: true });
    expect(database.prepare('select imported_at from list_import').pluck().all()).toEqual(['2031-01-01T00:00:00Z']);
    for (const handle of [database, one, two]) handle.close();
  });

  it('writes nothing when it fails half-way', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    const [part] = SECOND.parts;
    if (part === undefined) throw new Error('the second list has parts');
    expect(() => catalog.importList({ ...SECOND, parts: [part, part] }, SAID)).toThrow(/UNIQUE/u);
    expect(ids(catalog)).toEqual(['A', 'B']);
    expect(catalog.source().parts[0]?.figures.at(-1)?.value).toBe(1e6);
    catalog.close();
  });
});

describe('undo', () => {
  it('returns to the list before, step by step, and then forward again', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    const hash = catalog.source().sha256;
    catalog.importList(SECOND, SAID);
    expect(catalog.undo()).toBe(true);
    expect(catalog.source()).toMatchObject({ sha256: hash, parts: [{ id: 'A' }, { id: 'B' }] });
    expect(catalog.source().origin('A', 'slewRate.min')).toMatchObject({ file: 'list.csv', line: 3, cell: '1' });
    expect(catalog.importList(SECOND, SAID).outcome).toBe('imported');
    expect(ids(catalog)).toEqual(['A', 'C']);
    expect([catalog.undo(), catalog.undo(), catalog.undo()]).toEqual([true, true, false]);
    expect(ids(catalog)).toEqual([]);
    catalog.close();
  });
});

describe('generic sets', () => {
  it('stand behind the approved list and are replaced when their file changes', async () => {
    const catalog = await newCatalog();
    expect(catalog.genericSha256).toBeNull();
    expect(catalog.seedGeneric(GENERIC)).toBe(true);
    expect(catalog.seedGeneric(GENERIC)).toBe(false);
    expect(catalog.genericSha256).toBe(GENERIC.sha256);
    catalog.importList(FIRST);
    expect(ids(catalog)).toEqual(['A', 'B', 'GX-1', 'GX-2']);
    expect(catalog.genericIds()).toEqual(new Set(['GX-1', 'GX-2']));
    expect(catalog.classes()).toEqual(new Set(['fast']));
    const before = catalog.source().sha256;
    expect(catalog.seedGeneric(list(['id', 'GX-3'], { tier: 'generic' }))).toBe(true);
    expect(ids(catalog)).toEqual(['A', 'B', 'GX-3']);
    expect(catalog.source().sha256).not.toBe(before);
    catalog.undo();
    expect(ids(catalog)).toEqual(['GX-3']);
    catalog.close();
  });

  it('are not taken for an approved list, nor the other way round', async () => {
    const catalog = await newCatalog();
    expect(() => catalog.importList(GENERIC)).toThrow(RangeError);
    expect(() => catalog.seedGeneric(FIRST)).toThrow(RangeError);
    expect(existsSync(catalog.file)).toBe(true);
    expect(ids(catalog)).toEqual([]);
    catalog.close();
  });
});

describe('origins', () => {
  it('join the cell of the list to the slot of a figure', async () => {
    const catalog = await newCatalog();
    catalog.importList(FIRST);
    catalog.seedGeneric(GENERIC);
    const source = catalog.source();
    expect(source.origin('B', 'outputLowHeadroom.max@I0.005')).toEqual({
      kind: 'cell', file: 'list.csv', sha256: FIRST.sha256, line: 2, row: 2, column: 5, columnLetter: 'E',
      header: 'output low headroom max (mV) @ 5 mA', cell: '150',
    });
    expect(source.origin('GX-1', 'slewRate.typ')).toEqual({ kind: 'generic', id: 'GX-1', header: 'slew rate typ (V/µs)', cell: '4' });
    expect(source.origin('B', 'slewRate.typ')).toBeNull();
    expect(source.origin('nobody', 'slewRate.min')).toBeNull();
    catalog.close();
  });
});
