import type Database from 'better-sqlite3';
import type { ReadList } from '../intake/list.js';
import type { PartSource } from '../parts/part.js';
import { guarded } from './catalog-error.js';
import type { OpenOptions } from './database.js';
import { openDatabase } from './database.js';
import type { ImportCounts } from './imports.js';
import { currentImport } from './imports.js';
import { partSource } from './source.js';
import type { ChangedPart } from './store.js';
import { classesInForce, compareLists, idsInForce, refreshOrigins, undoImport, writeDifference } from './store.js';

export { CatalogError } from './catalog-error.js';
export type { CatalogErrorCode } from './catalog-error.js';
export type { OpenOptions } from './database.js';
export type { ImportCounts } from './imports.js';
export type { ChangedPart } from './store.js';

export interface ImportOptions {
  /** When it was imported, ISO 8601; kept as told, never read from a clock. */
  readonly now?: string;
  /** Compare only; nothing is written. */
  readonly dryRun?: boolean;
}

export interface ImportResult {
  readonly outcome: 'imported' | 'no-change' | 'dry-run';
  readonly counts: ImportCounts;
  /** Parts that are in both lists and differ, before and after. */
  readonly changed: readonly ChangedPart[];
  /** Ids that are not in the new list any more. */
  readonly removed: readonly string[];
}

/** The file that keeps the parts. Every method throws `CatalogError` when the surroundings do not allow it. */
export interface Catalog {
  readonly file: string;
  /** True when opening created the file: it holds no part yet. */
  readonly isNew: boolean;
  /** SHA-256 of the file the generic sets were read from; null while there are none. */
  readonly genericSha256: string | null;
  /** Ids of the generic sets, which no approved part may have. */
  genericIds(): ReadonlySet<string>;
  /** Classes of the generic sets, from which a part may borrow. */
  classes(): ReadonlySet<string>;
  /** Replaces the approved list in one transaction; the same parts again are no change: only where they came from is kept anew. */
  importList(list: ReadList, options?: ImportOptions): ImportResult;
  /** Returns to the approved list before the last import; false when there was none. */
  undo(): boolean;
  /** Replaces the generic sets when the file they are read from is another one; true when it did. */
  seedGeneric(list: ReadList): boolean;
  /** The parts in force and where each figure came from. */
  source(): PartSource;
  close(): void;
}

/** Opens a catalog, creating folder and file when there are none. A file that is not a catalog is refused and left alone. */
export async function openCatalog(file: string, options: OpenOptions = {}): Promise<Catalog> {
  const { database, isNew } = await openDatabase(file, options);
  return catalogOf(database, { file, isNew });
}

function catalogOf(database: Database.Database, { file, isNew }: { file: string; isNew: boolean }): Catalog {
  return {
    file,
    isNew,
    get genericSha256() {
      return guarded(file, () => currentImport(database, 'generic')?.sha256 ?? null);
    },
    genericIds: () => guarded(file, () => new Set(idsInForce(database, 'generic'))),
    classes: () => guarded(file, () => new Set(classesInForce(database, 'generic'))),
    importList: (list, options = {}) => guarded(file, () => importList(database, asTier(list, 'approved'), options)),
    undo: () => guarded(file, () => database.transaction(() => undoImport(database, 'approved')).immediate()),
    seedGeneric: (list) => guarded(file, () => importList(database, asTier(list, 'generic'), {}).outcome === 'imported'),
    source: () => partSource(database, file),
    close: () => void database.close(),
  };
}

function importList(database: Database.Database, list: ReadList, { now, dryRun = false }: ImportOptions): ImportResult {
  const work = database.transaction((): ImportResult => {
    const current = currentImport(database, list.tier);
    if (current?.sha256 === list.sha256) return unchanged(list);
    const difference = compareLists(database, list);
    const { counts, changed, removed } = difference;
    if (current !== null && counts.added + counts.changed + counts.removed === 0) {
      if (!dryRun) refreshOrigins(database, list, current.id);
      return unchanged(list);
    }
    if (!dryRun) writeDifference(database, list, { difference, now: now ?? null });
    return { outcome: dryRun ? 'dry-run' : 'imported', counts, changed, removed };
  });
  return dryRun ? work.deferred() : work.immediate();
}

function unchanged({ parts: { length } }: ReadList): ImportResult {
  return { outcome: 'no-change', counts: { rows: length, added: 0, changed: 0, removed: 0, unchanged: length }, changed: [], removed: [] };
}

function asTier(list: ReadList, tier: ReadList['tier']): ReadList {
  if (list.tier !== tier) throw new RangeError(`a list read as ${list.tier} cannot become the ${tier} tier`);
  return list;
}
