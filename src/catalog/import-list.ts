import type Database from 'better-sqlite3';
import { CatalogError } from './catalog-error.js';
import type { ChangedPart, Difference } from './difference.js';
import { compareLists } from './difference.js';
import type { Guard, GuardName } from './guards.js';
import { guardsOf } from './guards.js';
import type { CurrentImport, ImportCounts } from './imports.js';
import { currentImport, isReadAlike, isSuperseded } from './imports.js';
import { lengthOf, type IncomingList } from './incoming.js';
import type { Progress } from './progress.js';
import { NO_PROGRESS } from './progress.js';
import { refreshOrigins, writeDifference, writeFirst } from './store.js';

export interface ImportOptions {
  /** When it was imported, ISO 8601; kept as told, never read from a clock. */
  readonly now?: string;
  /** The import this list was made from: another one in force means that somebody else was quicker. */
  readonly basedOn?: number;
  /** Compare only; nothing is written. */
  readonly dryRun?: boolean;
  /** Guards the user has accepted by name. */
  readonly accept?: ReadonlySet<GuardName>;
  /** Told about the comparison, then about the writing. */
  readonly progress?: { readonly comparing: Progress; readonly writing: Progress };
}

export interface ImportResult {
  /** `held`: a guard that was not accepted stands against the list; nothing was written. */
  readonly outcome: 'imported' | 'no-change' | 'dry-run' | 'held';
  readonly counts: ImportCounts;
  /** New ids, by id. */
  readonly added: readonly string[];
  /** Parts that are in both lists and differ, before and after, by id; the first thousand. */
  readonly changed: readonly ChangedPart[];
  /** Ids that are not in the new list any more, by id. */
  readonly removed: readonly string[];
  /** What the list runs into, accepted or not. */
  readonly guards: readonly Guard[];
  /** The import that was in force before; null when this is the first. */
  readonly previous: CurrentImport | null;
}

/** Replaces the list of a tier in one transaction: compared, held back by the guards or written, all or nothing. */
export function importList(database: Database.Database, list: IncomingList, options: ImportOptions = {}): ImportResult {
  const work = database.transaction(() => importInTransaction(database, list, options));
  // A writer waits its turn before it compares; a dry run only reads, also from a catalog that may not be written.
  return options.dryRun === true ? work.deferred() : work.immediate();
}

function importInTransaction(database: Database.Database, list: IncomingList, options: ImportOptions): ImportResult {
  const { dryRun = false, accept = new Set<GuardName>(), progress } = options;
  const previous = currentImport(database, list.tier);
  if (options.basedOn !== undefined && previous?.id !== options.basedOn) throw new CatalogError('locked', database.name, { message: 'the list in force was replaced by another process meanwhile' });
  // The same bytes are the same generic sets. An approved list may be read in another way (mapping, classes, declarations) and is compared.
  if (list.tier === 'generic' && previous?.sha256 === list.sha256) return unchanged(lengthOf(list), previous);
  const writing = { now: options.now ?? null, progress: progress?.writing ?? NO_PROGRESS };
  if (previous === null && !dryRun) return { outcome: 'imported', ...writeFirst(database, list, writing), changed: [], removed: [], guards: [], previous };
  const difference = compareLists(database, list, progress?.comparing ?? NO_PROGRESS);
  const { counts } = difference;
  if (previous !== null && counts.added + counts.changed + counts.removed === 0) {
    if (!dryRun && !isReadAlike(database, previous, list)) refreshOrigins(database, list, previous.id);
    return unchanged(counts.rows, previous);
  }
  const guards = previous === null || list.tier === 'generic' ? [] : guardsAgainst(database, list, { difference, previous });
  if (guards.some(({ name }) => !accept.has(name))) return resultOf('held', difference, { guards, previous });
  if (!dryRun) writeDifference(database, list, { difference, ...writing });
  return resultOf(dryRun ? 'dry-run' : 'imported', difference, { guards, previous });
}

function guardsAgainst(database: Database.Database, list: IncomingList, { difference, previous }: { difference: Difference; previous: CurrentImport }): Guard[] {
  const { inForce, removed, scaled, lifecycle } = difference;
  const olderThan = isSuperseded(database, list) ? previous.file : null;
  return guardsOf({ inForce, removed: removed.length, scaled, lifecycle, olderThan });
}

function resultOf(outcome: ImportResult['outcome'], { counts, added, changed, removed }: Difference, rest: Pick<ImportResult, 'guards' | 'previous'>): ImportResult {
  return { outcome, counts, added, changed, removed, ...rest };
}

function unchanged(length: number, previous: CurrentImport): ImportResult {
  const counts = { rows: length, added: 0, changed: 0, removed: 0, unchanged: length };
  return { outcome: 'no-change', counts, added: [], changed: [], removed: [], guards: [], previous };
}
