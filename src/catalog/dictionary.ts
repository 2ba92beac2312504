import type Database from 'better-sqlite3';
import type { Part } from '../parts/part.js';
import { encoder, FORM } from './encoder.js';
import { PART_COLUMNS } from './part-columns.js';
import { partToRow, type Cell } from './part-row.js';

/** How many parts the dictionary holds; null when it is missing, of another form, or older than the part table. */
export function freshSize(database: Database.Database): number | null {
  const query = database.prepare<[number], number>('select parts from dictionary join part_generation using (generation) where form = ?').pluck();
  return query.get(FORM) ?? null;
}

/** Whether the catalog has the tables: one that may not be written can be of an earlier version. */
export function hasDictionary(database: Database.Database): boolean {
  return Number(database.pragma('user_version', { simple: true })) >= WITH_DICTIONARY;
}

const WITH_DICTIONARY = 6;

/** Makes the dictionary of the approved list just written. To be called in the transaction that wrote it, after the last change of a part. */
export function encodeList(database: Database.Database, parts: readonly Part[]): void {
  const byId = new Map(parts.map((part, at) => [part.id, at]));
  const keys = database.prepare<[], [number, string]>("select key, id from part where tier = 'approved' and withdrawn_at is null").raw().all();
  const { add, finish } = encoder(database, keys.length);
  for (const [key, id] of keys.sort(byIdOf)) {
    const part = parts[byId.get(id) ?? -1];
    if (part === undefined) throw new RangeError(`part ${id} is in force, but not in the list that was written`);
    add(key, partToRow(part));
  }
  finish();
}

/** Makes the dictionary anew from the part table, in a transaction of its own unless one is open. */
export function rebuildDictionary(database: Database.Database): void {
  const work = database.transaction(() => {
    const keys = database.prepare<[], [number, string]>("select key, id from part where tier = 'approved' and withdrawn_at is null").raw().all();
    const row = database.prepare<[number], Cell[]>(`select ${PART_COLUMNS.join(', ')} from part where key = ?`).raw();
    const { add, finish } = encoder(database, keys.length);
    for (const [key] of keys.sort(byIdOf)) add(key, row.get(key) ?? []);
    finish();
  });
  work.immediate();
}

/** As `partsInForce` orders them. */
const byIdOf = ([, a]: [number, string], [, b]: [number, string]): number => (a < b ? -1 : Number(a > b));
