import { join } from 'node:path';
import { killedAfter, planOf, type Kill } from '../support/kill.js';
import { writeLongList } from '../support/long-list.js';
import { makeWorkplace } from '../support/railfit.js';
import { drawing } from './draw.js';

/** Kills an import at so many points of its run; gives the kills that left anything but the old or the new list. */
export async function fuzzKilling({ points, seed, tell }: { readonly points: number; readonly seed: number; readonly tell: (line: string) => void }): Promise<readonly Kill[]> {
  const place = makeWorkplace();
  try {
    writeLongList(join(place.folder, 'old.csv'), 1500);
    writeLongList(join(place.folder, 'new.csv'), 1500, 3);
    await place.run(['import', 'old.csv']);
    const { plan, time } = await planOf(place, ['import', 'new.csv']);
    const draw = drawing(seed);
    const kills: Kill[] = [];
    for (let point = 0; point < points; point += 1) {
      // Half over the whole run, half over its last third, where the writing is.
      const share = draw(10_000) / 10_000;
      kills.push(await killedAfter(place, plan, time * (point % 2 === 0 ? share : 0.6 + 0.4 * share)));
      if ((point + 1) % 50 === 0) tell(`${point + 1} kills: ${kills.filter(({ left }) => left === 'old').length} old, ${kills.filter(({ left }) => left === 'new').length} new`);
    }
    return kills.filter(({ left, ended }) => left === 'between' || (ended && left !== 'new'));
  } finally {
    place.remove();
  }
}
