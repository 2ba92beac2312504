import { once } from 'node:events';
import { copyFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import type { Workplace } from './railfit.js';

/** What is in force in a catalog and how it came there, read without railfit; throws when the file is no sound database. */
export function stateOf(catalog: string): string {
  const database = new Database(catalog);
  try {
    // Opening takes back what a killed writer had begun.
    if (database.pragma('integrity_check', { simple: true }) !== 'ok') throw new Error(`${catalog} is damaged`);
    const all = (sql: string): unknown => database.prepare(sql).raw().all();
    return JSON.stringify([
      all('select id, tier, file, sha256, undone from list_import order by id'),
      all("select tier, id, import_id, withdrawn_at, slew_rate_min from part order by key"),
      all('select import_id, part_id, line, cells from record order by import_id, part_id'),
    ]);
  } finally {
    database.close();
  }
}

export interface Kill {
  /** Where the process was killed, milliseconds after its start. */
  readonly after: number;
  readonly left: 'old' | 'new' | 'between';
  /** It had ended by itself before. */
  readonly ended: boolean;
}

export interface KillPlan {
  /** The command, which changes the catalog of the workplace. */
  readonly words: readonly string[];
  /** The catalog before, which every run starts from, and the states that may be left. */
  readonly start: string;
  readonly old: string;
  readonly new: string;
}

/** Runs the command on a fresh copy of the catalog and kills it with SIGKILL after so many milliseconds. */
export async function killedAfter(place: Workplace, plan: KillPlan, after: number): Promise<Kill> {
  for (const suffix of ['', '-journal']) rmSync(place.catalog + suffix, { force: true });
  copyFileSync(plan.start, place.catalog);
  const child = place.start(plan.words);
  const closed = once(child, 'close');
  const timer = setTimeout(() => child.kill('SIGKILL'), after);
  const [code] = (await closed) as [number | null];
  clearTimeout(timer);
  const state = stateOf(place.catalog);
  return { after, ended: code !== null, left: state === plan.old ? 'old' : state === plan.new ? 'new' : 'between' };
}

/** The plan of a command from the catalog as it stands; runs it once to its end, and tells how long that took, milliseconds. */
export async function planOf(place: Workplace, words: readonly string[]): Promise<{ plan: KillPlan; time: number }> {
  const start = join(place.folder, 'start.sqlite');
  copyFileSync(place.catalog, start);
  const old = stateOf(start);
  const began = performance.now();
  const ran = await place.run(words);
  const time = performance.now() - began;
  if (ran.exit !== 0) throw new Error(`${words.join(' ')} ends with ${ran.exit}: ${ran.stderr}`);
  return { plan: { words, start, old, new: stateOf(place.catalog) }, time };
}
