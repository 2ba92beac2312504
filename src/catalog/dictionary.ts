import type Database from 'better-sqlite3';
import { encoder, FORM } from './encoder.js';
import { PART_COLUMNS } from './part-columns.js';
import type { Cell } from './part-row.js';

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

export interface EncodingInOrder {
  readonly add: (id: string, key: number, row: readonly Cell[]) => void;
  readonly finish: () => void;
}

/**
 * Makes the dictionary of the approved list while it is written, in the transaction that writes it. Should its order be another than
 * the dictionary's, it is made of the rows afterwards.
 */
export function encodingInOrder(database: Database.Database): EncodingInOrder {
  const { add, finish } = encoder(database, Number.POSITIVE_INFINITY);
  let [last, isInOrder] = ['', true];
  return {
    add(id, key, row) {
      isInOrder &&= last < id;
      last = id;
      if (isInOrder) add(key, row);
    },
    finish: () => (isInOrder ? finish() : rebuildDictionary(database)),
  };
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
