import type Database from 'better-sqlite3';
import type { ReadList } from '../intake/list.js';
import type { Part } from '../parts/part.js';
import { contentHasher, contentOrder } from './content.js';
import { isLifecycleBetter } from './guards.js';
import { idsInForce } from './in-force.js';
import type { ImportCounts } from './imports.js';
import { PART_COLUMNS } from './part-columns.js';
import type { Cell } from './part-row.js';
import { partToRow, rowToPart } from './part-row.js';
import type { Progress } from './progress.js';
import type { ScaledColumn } from './scaling.js';
import { watchScaling } from './scaling.js';

export interface ChangedPart {
  readonly before: Part;
  readonly after: Part;
}

/** What becomes of one part of the new list; in an array of bytes, one a part. */
export const FATE = { unchanged: 0, changed: 1, added: 2 } as const;

/** The difference between the list in force and a new one. Ids are compared, then everything that can change an answer. */
export interface Difference {
  /** By index of the part in the list. */
  readonly fates: Uint8Array;
  /** New ids, by id. */
  readonly added: readonly string[];
  /** The parts whose version changes, by id, before and after; the first `CHANGES_KEPT` of them. */
  readonly changed: readonly ChangedPart[];
  /** Ids in force that are not in the new list, by id. */
  readonly removed: readonly string[];
  readonly counts: ImportCounts;
  readonly contentSha256: string;
  /** Parts of the list in force. */
  readonly inForce: number;
  readonly scaled: readonly ScaledColumn[];
  readonly lifecycle: { readonly better: readonly string[]; readonly known: number };
}

/** So many changed parts are told field by field; the counts are always complete. Keeps a large list within bounded memory. */
export const CHANGES_KEPT = 1000;

/** Compares part by part against the row in force, so that never more than one old part is held beside the new list. */
export function compareLists(database: Database.Database, list: ReadList, progress: Progress): Difference {
  const { parts, tier } = list;
  const inForce = database
    .prepare<[string, string], Cell[]>(`select ${PART_COLUMNS.join(', ')} from part where tier = ? and id = ? and withdrawn_at is null`)
    .raw();
  const tally = newTally(parts.length);
  const hasher = contentHasher();
  const order = contentOrder(parts);
  const before = idsInForce(database, tier);
  const isFirst = before.length === 0;
  order.forEach((index, done) => {
    const part = parts[index];
    if (part === undefined) return;
    const row = partToRow(part);
    hasher.add(row);
    compareOne(tally, { index, part, row, old: isFirst ? undefined : inForce.get(tier, part.id) });
    progress(done + 1, order.length);
  });
  return differenceOf(tally, { ids: new Set(parts.map(({ id }) => id)), before: before.sort(), contentSha256: hasher.digest() });
}

interface Tally {
  readonly fates: Uint8Array;
  readonly added: string[];
  readonly changed: ChangedPart[];
  readonly scaling: ReturnType<typeof watchScaling>;
  readonly better: string[];
  lifecycles: number;
  changes: number;
}

function newTally(parts: number): Tally {
  return { fates: new Uint8Array(parts), added: [], changed: [], scaling: watchScaling(), better: [], lifecycles: 0, changes: 0 };
}

interface Pair {
  readonly index: number;
  readonly part: Part;
  readonly row: readonly Cell[];
  readonly old: readonly Cell[] | undefined;
}

function compareOne(tally: Tally, { index, part, row, old }: Pair): void {
  if (old === undefined) {
    tally.fates[index] = FATE.added;
    tally.added.push(part.id);
    return;
  }
  const isSame = row.every((cell, at) => cell === old[at]);
  const before = isSame ? part : rowToPart(old);
  tally.scaling.see(before, part);
  if (before.lifecycle !== null && part.lifecycle !== null) tally.lifecycles += 1;
  if (isSame) return;
  tally.fates[index] = FATE.changed;
  tally.changes += 1;
  if (isLifecycleBetter(before, part)) tally.better.push(part.id);
  if (tally.changed.length < CHANGES_KEPT) tally.changed.push({ before, after: part });
}

interface Ends {
  readonly ids: ReadonlySet<string>;
  readonly before: readonly string[];
  readonly contentSha256: string;
}

function differenceOf(tally: Tally, { ids, before, contentSha256 }: Ends): Difference {
  const { fates, added, changed, changes, better, lifecycles } = tally;
  const removed = before.filter((id) => !ids.has(id));
  const counts = { rows: fates.length, added: added.length, changed: changes, removed: removed.length, unchanged: fates.length - added.length - changes };
  return { fates, added, changed, removed, counts, contentSha256, inForce: before.length, scaled: tally.scaling.found(), lifecycle: { better, known: lifecycles } };
}
