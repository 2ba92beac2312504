import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { GUARDS, openCatalog, type Catalog, type GuardName, type ImportResult } from '../../src/catalog/index.js';
import { GUARD_WORDS } from '../../src/cli/guard-words.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

const HEADER = 'id,lifecycle,slew rate min (V/µs)';
const rows = (count: number, cells = 'active,1'): string[] => Array.from({ length: count }, (_, at) => `P${String(at).padStart(2, '0')},${cells}`);
const named = (lines: readonly string[], file: string): ReturnType<typeof list> => list([HEADER, ...lines], { file });

async function after(first: readonly string[], second: readonly string[]): Promise<{ catalog: Catalog; again: (...accept: GuardName[]) => ImportResult }> {
  const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
  expect(catalog.importList(named(first, 'first.csv')).outcome).toBe('imported');
  return { catalog, again: (...accept) => catalog.importList(named(second, 'second.csv'), { accept: new Set(accept) }) };
}

const guardsOf = ({ outcome, guards }: ImportResult): unknown[] => [outcome, ...guards.map(({ name }) => name)];

describe('parts that are gone', () => {
  it('a fifth of the list may go, one more may not', async () => {
    const ten = await after(rows(10), rows(8));
    expect(guardsOf(ten.again())).toEqual(['imported']);
    ten.catalog.close();
    const more = await after(rows(10), rows(7));
    const held = more.again();
    expect(held).toMatchObject({ outcome: 'held', removed: ['P07', 'P08', 'P09'], guards: [{ name: 'removed', removed: 3, of: 10 }] });
    expect(more.catalog.source().parts).toHaveLength(10);
    expect(guardsOf(more.again('scaled'))).toEqual(['held', 'removed']);
    expect(guardsOf(more.again('removed'))).toEqual(['imported', 'removed']);
    expect(more.catalog.source().parts).toHaveLength(7);
    more.catalog.close();
  });

  it('a dry run is held back as well', async () => {
    const { catalog } = await after(rows(4), rows(1));
    expect(guardsOf(catalog.importList(named(rows(1), 'second.csv'), { dryRun: true }))).toEqual(['held', 'removed']);
    catalog.close();
  });
});

describe('a column scaled', () => {
  it('is held back until it is said', async () => {
    const { catalog, again } = await after(rows(3), rows(3, 'active,1000'));
    expect(again()).toMatchObject({ outcome: 'held', guards: [{ name: 'scaled', columns: [{ power: 3, known: 3, scaled: 3 }] }] });
    expect(guardsOf(again('scaled'))).toEqual(['imported', 'scaled']);
    catalog.close();
  });
});

describe('lifecycle', () => {
  it.each<[string, readonly string[], readonly string[], unknown[]]>([
    ['two of four come back', ['obsolete', 'nrnd', 'active', 'active'], ['active', 'active', 'active', 'active'], ['held', 'lifecycle']],
    ['one of four comes back', ['obsolete', 'active', 'active', 'active'], ['active', 'active', 'active', 'active'], ['imported']],
    ['two of ten come back', ['nrnd', 'nrnd', ...Array<string>(8).fill('active')], Array<string>(10).fill('active'), ['imported']],
    ['they grow old', ['active', 'active', 'active', 'active'], ['nrnd', 'obsolete', 'last-time-buy', 'nrnd'], ['imported']],
    ['preliminary parts become active', ['preliminary', 'preliminary', 'active', 'active'], ['active', 'active', 'active', 'active'], ['imported']],
    ['words where there were none', ['', '', 'active', 'active'], ['active', 'active', 'active', 'active'], ['imported']],
  ])('%s', async (_, before, now, expected) => {
    const lines = (words: readonly string[]): string[] => words.map((word, at) => `P${at},${word},1`);
    const { catalog, again } = await after(lines(before), lines(now));
    expect(guardsOf(again())).toEqual(expected);
    catalog.close();
  });
});

describe('an older file', () => {
  it('is held back when another list has replaced it, not after an undo', async () => {
    const { catalog, again } = await after(rows(5), rows(6));
    again();
    const older = catalog.importList(named(rows(5), 'first.csv'));
    expect(older).toMatchObject({ outcome: 'held', guards: [{ name: 'older', since: 'second.csv' }] });
    expect(guardsOf(catalog.importList(named(rows(5), 'first.csv'), { accept: new Set<GuardName>(['older']) }))).toEqual(['imported', 'older']);
    expect(catalog.undo()).toBe(true);
    expect(catalog.undo()).toBe(true);
    expect(guardsOf(again())).toEqual(['imported']);
    catalog.close();
  });
});

it('generic sets are not guarded: they come with the program', async () => {
  const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
  const sets = (ids: readonly string[]): ReturnType<typeof list> => list(['id', ...ids], { tier: 'generic' });
  expect(catalog.seedGeneric(sets(['GX-1', 'GX-2', 'GX-3']))).toBe(true);
  expect(catalog.seedGeneric(sets(['GX-1']))).toBe(true);
  expect(catalog.seedGeneric(sets(['GX-1', 'GX-2', 'GX-3']))).toBe(true);
  catalog.close();
});

it('the words of the command line are the guards (edit GUARD_WORDS in src/cli/guard-words.ts)', () => {
  expect(GUARD_WORDS).toEqual(GUARDS);
});
