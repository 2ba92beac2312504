import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { openCatalog } from '../../src/catalog/index.js';
import { readList } from '../../src/intake/read-list.js';
import { writeList } from '../../src/intake/write-list.js';
import type { Part } from '../../src/parts/part.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

let place: Workplace;
beforeAll(() => {
  requireBuilt();
  place = makeWorkplace();
  return () => { place.remove(); };
});

const approved = (parts: readonly Part[]): Part[] => parts.map((part) => ({ ...part, tier: 'approved', status: part.status ?? 'approved' }));

describe('parts --csv', () => {
  it('goes through import and the catalog to the same bytes', { timeout: 300_000 }, async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(arbitraryParts, async (parts) => {
        run += 1;
        const csv = writeList(approved(parts));
        const list = readList(new TextEncoder().encode(csv), { file: 'list.csv', tier: 'approved' });
        if (!list.ok) throw new Error(list.problems.map(({ message }) => message).join('; '));
        const catalog = await openCatalog(join(place.folder, `round-${run}.sqlite`));
        catalog.importList(list);
        const kept = catalog.source().parts;
        catalog.close();
        expect(writeList(kept)).toBe(writeList([...list.parts].sort((a, b) => (a.id < b.id ? -1 : 1))));
        expect([...kept].sort((a, b) => (a.id < b.id ? -1 : 1))).toEqual([...list.parts].sort((a, b) => (a.id < b.id ? -1 : 1)));
      }),
      { numRuns: 25 },
    );
  });

  it('the built command writes what it reads, byte for byte, and the second import is no change', async () => {
    await place.run(['import', 'approved.csv']);
    const first = await place.run(['parts', '--csv']);
    writeFileSync(join(place.folder, 'again.csv'), first.stdout);
    expect((await place.run(['import', 'again.csv'])).stdout).toContain('no change');
    expect((await place.run(['parts', '--csv'])).stdout).toBe(first.stdout);
    expect(first.stdout.endsWith('\r\n')).toBe(true);
  });

  it('disarms what a spreadsheet would run, says so, and import takes it off; numbers stay; --raw leaves all', async () => {
    const texts = ['=1+1', '+12', '-12', '-1.5e3', '@home', "'=1", '＝1', 'a=1', '-'];
    const catalog = ['--catalog', join(place.folder, 'formulas.sqlite')];
    const parts = texts.slice(0, -1).map((description, at) => ({ id: `T-${at}`, description }));
    const cells = (text: string): string[] => text.trimEnd().split('\r\n').slice(1).map((line) => line.split(',')[1] ?? '');
    writeFileSync(join(place.folder, 'formulas.csv'), ['id,description,status', ...parts.map(({ id, description }) => `${id},${/^['=+@＝]/u.test(description) ? `'${description}` : description},approved`), ''].join('\r\n'));
    const done = await place.run(['import', 'formulas.csv', ...catalog]);
    expect(done.exit, done.stderr).toBe(0);
    const safe = await place.run(['parts', '--csv', ...catalog]);
    expect(cells(safe.stdout)).toEqual(["'=1+1", "'+12", '-12', '-1.5e3', "'@home", "''=1", "'＝1", 'a=1']);
    expect(safe.stderr).toBe('note: 5 cells start like a formula and got an apostrophe in front; import takes it off again, --raw leaves it out\n');
    expect(safe.stdout).toBe(readFileSync(join(place.folder, 'formulas.csv'), 'utf8'));
    const raw = await place.run(['parts', '--csv', '--raw', ...catalog]);
    expect(cells(raw.stdout)).toEqual(texts.slice(0, -1));
    expect(raw.stderr).toBe('');
  });

  it('--raw belongs to --csv', async () => {
    expect(await place.run(['parts', '--raw'])).toMatchObject({ exit: 2, stdout: '' });
  });
});
