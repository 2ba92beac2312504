import { join } from 'node:path';
import Database from 'better-sqlite3';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { openCatalog, stageList, type ImportResult, type IncomingList, type StagedList } from '../../src/catalog/index.js';
import { wholeBytes } from '../../src/intake/byte-source.js';
import { openStream } from '../../src/intake/list-stream.js';
import type { ListOptions } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { temporaryFolder } from './temporary.js';

const HEADER = 'id,description,lifecycle,slew rate min (V/µs),offset voltage max (mV),output low headroom max (mV) @ 2 kΩ to ground, 5 V'.replace('ground, 5 V', 'ground');
const OPTIONS: ListOptions = { file: 'list.csv', tier: 'approved' };
const SILENT = (): void => undefined;

function stagedOf(text: string): StagedList {
  const stream = openStream(wholeBytes(new TextEncoder().encode(text)), OPTIONS);
  if (stream === null) throw new Error('not to be read row by row');
  return stageList(stream, SILENT);
}

function wholeOf(text: string): IncomingList {
  const list = readList(new TextEncoder().encode(text), OPTIONS);
  if (!list.ok) throw new Error(list.problems.map(({ message }) => message).join('; '));
  return list;
}

const TABLES = [
  'select tier, file, sha256, content_sha256, columns, sources, rows, added, changed, removed, unchanged, undone from list_import order by id',
  'select part_id, import_id, line, row, cells, figures, patched from record order by import_id, part_id',
  'select trait, pieces from dictionary_trait order by trait',
  "select trait, segment, width, hex(codes) from dictionary_segment where trait <> 'row key' order by trait, segment",
  'select parts, form, segment from dictionary',
];

function contentOf(file: string): unknown {
  const database = new Database(file, { readonly: true });
  const parts = (database.prepare('select * from part order by id, import_id').all() as Record<string, unknown>[]).map(({ key: _key, ...cells }) => cells);
  const rest = TABLES.map((table) => database.prepare(table).raw().all());
  database.close();
  return [parts, ...rest];
}

const plain = ({ changed, ...rest }: ImportResult): unknown => ({ ...rest, changed: changed.map(({ before, after, row, cells, index }) => ({ before, after, row, cells, index })) });

const cell = fc.constantFrom('', '1', '2.5', '40', '"a, b"', '"two\r\nlines"');
const word = fc.constantFrom('', 'active', 'nrnd', 'obsolete');
const list = fc.uniqueArray(fc.tuple(fc.integer({ min: 1, max: 12 }), cell, word, fc.constantFrom('', '1', '2.5', '4 V/µs'), fc.constantFrom('', '1', '3'), fc.constantFrom('', '50', '80')), { minLength: 1, maxLength: 10, selector: ([id]) => id });
const textOf = (rows: readonly (readonly [number, ...string[]])[]): string =>
  [HEADER, ...[...rows].sort(([a], [b]) => a - b).map(([id, ...cells]) => [`T-${String(id).padStart(3, '0')}`, ...cells].join(','))].join('\r\n');

describe('a list staged row by row', () => {
  it('leaves the catalog a list read as a whole leaves, import after import', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(list, { minLength: 1, maxLength: 3 }), fc.boolean(), async (lists, dryRun) => {
        const folder = temporaryFolder();
        const [first, second] = [join(folder, 'staged.sqlite'), join(folder, 'whole.sqlite')];
        const [one, two] = [await openCatalog(first), await openCatalog(second)];
        for (const [at, rows] of lists.entries()) {
          const options = { accept: new Set(['removed', 'scaled', 'lifecycle', 'older'] as const), dryRun: dryRun && at > 0 };
          const staged = stagedOf(textOf(rows));
          expect(plain(one.importList(staged, options))).toEqual(plain(two.importList(wholeOf(textOf(rows)), options)));
          staged.close();
        }
        for (const catalog of [one, two]) catalog.close();
        expect(contentOf(first)).toEqual(contentOf(second));
      }),
      { numRuns: 30 },
    );
  });

  it('waits for nobody while it is read, and holds no lock', async () => {
    const file = join(temporaryFolder(), 'catalog.sqlite');
    const catalog = await openCatalog(file, { patience: 50 });
    const holder = new Database(file);
    holder.exec('begin exclusive');
    const staged = stagedOf(`${HEADER}\nA,,,1,1,50\n`);
    expect(() => catalog.importList(staged)).toThrow(expect.objectContaining({ code: 'locked' }));
    holder.exec('rollback');
    expect(catalog.importList(staged)).toMatchObject({ outcome: 'imported', counts: { added: 1 } });
    staged.close();
    holder.close();
    catalog.close();
  });
});
