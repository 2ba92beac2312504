import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { BUILT, requireBuilt } from '../support/built.js';
import { writeLongList } from '../support/long-list.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

let place: Workplace;
beforeAll(() => {
  requireBuilt();
  place = makeWorkplace();
  return () => { place.remove(); };
});

/** The command with its heap held to so many MiB: over it the process dies of its own. */
function within(megabytes: number, words: readonly string[]): { exit: number | null; stderr: string } {
  const ran = spawnSync(process.execPath, [`--max-old-space-size=${megabytes}`, BUILT, ...words], { cwd: place.folder, encoding: 'utf8', env: { PATH: process.env['PATH'], RAILFIT_CATALOG: place.catalog, HOME: place.folder } });
  return { exit: ran.status, stderr: ran.stderr.slice(-400) };
}

describe('a long list', () => {
  // The full measure, 200 000 parts, is taken by hand (LONG=200000): the time it takes is no test's.
  const parts = Number(process.env['LONG'] ?? 20_000);
  const heap = Math.ceil(64 + parts * 0.001);

  it(`${parts} parts are imported, and replaced, within ${heap} MiB of heap`, { timeout: 1_200_000 }, () => {
    writeLongList(join(place.folder, 'old.csv'), parts);
    writeLongList(join(place.folder, 'new.csv'), parts, 3);
    expect(within(heap, ['import', 'old.csv'])).toMatchObject({ exit: 0 });
    expect(within(heap, ['import', 'new.csv'])).toMatchObject({ exit: 0 });
    expect(within(heap, ['import', '--undo'])).toMatchObject({ exit: 0 });
  });
});
