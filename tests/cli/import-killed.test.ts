import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { killedAfter, planOf, stateOf, type Kill } from '../support/kill.js';
import { writeLongList } from '../support/long-list.js';
import { ended, makeWorkplace, type Workplace } from '../support/railfit.js';

let place: Workplace;
const PARTS = 1500;
const POINTS = 20;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  writeLongList(join(place.folder, 'old.csv'), PARTS);
  writeLongList(join(place.folder, 'new.csv'), PARTS, 3);
  expect((await place.run(['import', 'old.csv'])).exit).toBe(0);
  return () => { place.remove(); };
}, 60_000);

/** Half over the whole run, half over its last third, where the writing is. Drawn by a generator of its own, so that a failure can be had again. */
function points(time: number): number[] {
  let seed = 20_260;
  const next = (): number => (seed = (seed * 48_271) % 2_147_483_647) / 2_147_483_647;
  return Array.from({ length: POINTS }, (_, at) => (at % 2 === 0 ? next() * time : time * (0.6 + 0.4 * next())));
}

// There is no SIGKILL on Windows.
describe.skipIf(process.platform === 'win32')('killed at any moment', () => {
  it('an import leaves the old list or the new one, never anything between', { timeout: 600_000 }, async () => {
    const { plan, time } = await planOf(place, ['import', 'new.csv']);
    expect(plan.new).not.toBe(plan.old);
    const kills: Kill[] = [];
    for (const after of points(time)) kills.push(await killedAfter(place, plan, after));
    expect(kills.filter(({ left }) => left === 'between')).toEqual([]);
    expect(kills.filter(({ ended: byItself, left }) => byItself && left !== 'new')).toEqual([]);
    expect(kills.some(({ left }) => left === 'old')).toBe(true);
    // What is left can be used: the import that was killed is run again.
    expect((await place.run(plan.words)).exit).toBe(0);
    expect(stateOf(place.catalog)).toBe(plan.new);
  });

  it('Ctrl-C in the middle of the work ends it at once, with the old list', { timeout: 120_000 }, async () => {
    const catalog = join(place.folder, 'interrupted.sqlite');
    writeLongList(join(place.folder, 'longer.csv'), 40_000);
    await place.run(['import', 'old.csv', '--catalog', catalog]);
    const before = stateOf(catalog);
    const child = place.start(['import', 'longer.csv', '--catalog', catalog]);
    const done = new Promise<[number | null, NodeJS.Signals | null]>((resolve) => child.on('close', (code, signal) => { resolve([code, signal]); }));
    const finished = ended(child);
    setTimeout(() => child.kill('SIGINT'), 1500);
    const [code, signal] = await done;
    const { stdout } = await finished;
    // A shell shows either as 130.
    expect([code, signal]).toEqual(signal === null ? [130, null] : [null, 'SIGINT']);
    expect(stdout).toBe('');
    expect(stateOf(catalog)).toBe(before);
  });
});
