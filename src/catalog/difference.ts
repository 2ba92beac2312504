import type Database from 'better-sqlite3';
import type { Part } from '../parts/part.js';
import { contentHasher } from './content.js';
import { isLifecycleBetter } from './guards.js';
import { idsInForce } from './in-force.js';
import { lengthOf, rowsInOrder, type IncomingList, type IncomingRow } from './incoming.js';
import type { ImportCounts } from './imports.js';
import { PART_COLUMNS } from './part-columns.js';
import type { Cell } from './part-row.js';
import { rowToPart } from './part-row.js';
import type { Progress } from './progress.js';
import type { ScaledColumn } from './scaling.js';
import { watchScaling } from './scaling.js';

export interface ChangedPart {
  readonly before: Part;
  readonly after: Part;
  /** Of the new list: number and cells of the record of the part, and its index. */
  readonly row: number;
  readonly cells: readonly string[];
  readonly index: number;
}

/** What becomes of one part of the new list. */
export const FATE = { unchanged: 0, changed: 1, added: 2 } as const;

/** The difference between the list in force and a new one. Ids are compared, then everything that can change an answer. */
export interface Difference {
  /** In the order of the comparison, by id. */
  readonly fates: readonly number[];
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
export function compareLists(database: Database.Database, list: IncomingList, progress: Progress): Difference {
  const inForce = database
    .prepare<[string, string], Cell[]>(`select ${PART_COLUMNS.join(', ')} from part where tier = ? and id = ? and withdrawn_at is null`)
    .raw();
  const tally = newTally();
  const hasher = contentHasher();
  const before = new Set(idsInForce(database, list.tier).sort());
  const of = before.size;
  const length = lengthOf(list);
  for (const one of rowsInOrder(list)) {
    hasher.add(one.content);
    compareOne(tally, one, before.delete(one.id) ? inForce.get(list.tier, one.id) : undefined);
    progress(tally.fates.length, length);
  }
  return differenceOf(tally, { removed: [...before], inForce: of, contentSha256: hasher.digest() });
}

interface Tally {
  readonly fates: number[];
  readonly added: string[];
  readonly changed: ChangedPart[];
  readonly scaling: ReturnType<typeof watchScaling>;
  readonly better: string[];
  lifecycles: number;
  changes: number;
}

function newTally(): Tally {
  return { fates: [], added: [], changed: [], scaling: watchScaling(), better: [], lifecycles: 0, changes: 0 };
}

function compareOne(tally: Tally, one: IncomingRow, old: readonly Cell[] | undefined): void {
  if (old === undefined) {
    tally.fates.push(FATE.added);
    tally.added.push(one.id);
    return;
  }
  const isSame = one.row.every((cell, at) => cell === old[at]);
  const part = one.part();
  const before = isSame ? part : rowToPart(old);
  tally.scaling.see(before, part);
  if (before.lifecycle !== null && part.lifecycle !== null) tally.lifecycles += 1;
  tally.fates.push(isSame ? FATE.unchanged : FATE.changed);
  if (isSame) return;
  tally.changes += 1;
  if (isLifecycleBetter(before, part)) tally.better.push(part.id);
  if (tally.changed.length < CHANGES_KEPT) tally.changed.push({ before, after: part, row: one.place.row, cells: JSON.parse(one.cells()) as string[], index: one.index });
}

type Ends = Pick<Difference, 'removed' | 'inForce' | 'contentSha256'>;

function differenceOf(tally: Tally, { removed, inForce, contentSha256 }: Ends): Difference {
  const { fates, added, changed, changes, better, lifecycles } = tally;
  const counts = { rows: fates.length, added: added.length, changed: changes, removed: removed.length, unchanged: fates.length - added.length - changes };
  return { fates, added, changed, removed, counts, contentSha256, inForce, scaled: tally.scaling.found(), lifecycle: { better, known: lifecycles } };
}
