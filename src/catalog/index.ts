import type Database from 'better-sqlite3';
import type { ListColumn, ReadList } from '../intake/list.js';
import type { Origin, Part, PartSource } from '../parts/part.js';
import { guarded } from './catalog-error.js';
import type { OpenOptions } from './database.js';
import { openDatabase } from './database.js';
import type { ImportOptions, ImportResult } from './import-list.js';
import { importList } from './import-list.js';
import { columnOf, columnTables } from './import-columns.js';
import { currentImport } from './imports.js';
import type { CurrentImport } from './imports.js';
import { classesInForce, countInForce, idsInForce, partInForce, partsInForce } from './in-force.js';
import type { IncomingList } from './incoming.js';
import { listInForce } from './list-in-force.js';
import type { ListInForce } from './list-in-force.js';
import { originFinder } from './origins.js';
import type { SavedStage } from './saved-stages.js';
import { removeStages, savedStages, saveStages } from './saved-stages.js';
import { screenSource } from './screen-source.js';
import { partSource } from './source.js';
import { undoImport } from './store.js';
import type { WithdrawnPart } from './withdrawn.js';
import { withdrawnPart } from './withdrawn.js';

export { CatalogError } from './catalog-error.js';
export type { CatalogErrorCode } from './catalog-error.js';
export type { OpenOptions } from './database.js';
export type { ChangedPart } from './difference.js';
export { GUARDS } from './guards.js';
export type { Guard, GuardName } from './guards.js';
export type { ImportOptions, ImportResult } from './import-list.js';
export type { CurrentImport, ImportCounts } from './imports.js';
export type { IncomingList } from './incoming.js';
export type { ListInForce } from './list-in-force.js';
export type { Progress } from './progress.js';
export type { SavedStage } from './saved-stages.js';
export type { ColumnSubject, ScaledColumn } from './scaling.js';
export { stageList } from './staged-list.js';
export type { StagedList } from './staged-list.js';
export type { WithdrawnPart } from './withdrawn.js';

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
  /** How many parts the approved list has. */
  approvedCount(): number;
  /** Replaces the approved list in one transaction; the same parts again are no change: only where they came from is kept anew. */
  importList(list: IncomingList, options?: ImportOptions): ImportResult;
  /** The approved part in force with this id; null when there is none. */
  approvedPart(partId: string): Part | null;
  /** The generic sets, by id. */
  genericParts(): readonly Part[];
  /** The approved list in force with its records, to be patched; null when none was imported. */
  listInForce(): ListInForce | null;
  /** The columns of an earlier import as they were read. */
  columnsOf(imported: CurrentImport): readonly ListColumn[];
  /** The column that filled a slot of most parts in an earlier import; null when none did. */
  columnOf(imported: CurrentImport, slot: string): ListColumn | null;
  /** Where a figure of an approved part came from in an earlier import. */
  originIn(imported: CurrentImport, partId: string, slot: string): Origin | null;
  /** Returns to the approved list before the last import; false when there was none. */
  undo(): boolean;
  /** Replaces the generic sets when the file they are read from is another one; true when it did. */
  seedGeneric(list: ReadList): boolean;
  /** A part that was on the approved list and is not any more; null when it is, or never was. */
  withdrawn(partId: string): WithdrawnPart | null;
  /** The stage files the team keeps, by path. */
  savedStages(): readonly SavedStage[];
  /** Keeps stage files, or gives them another part, all or none. */
  saveStages(stages: readonly SavedStage[]): void;
  /** Forgets stage files; the files are left alone. */
  removeStages(paths: readonly string[]): void;
  /** The parts in force and where each figure came from. */
  source(): PartSource;
  /** The same, for one question: parts are read when they are looked at. The catalog is as it was at this moment until it is closed; nothing can be written meanwhile. */
  screenSource(): PartSource;
  close(): void;
}

/** Opens a catalog, creating folder and file when there are none. A file that is not a catalog is refused and left alone. */
export async function openCatalog(file: string, options: OpenOptions = {}): Promise<Catalog> {
  const { database, isNew } = await openDatabase(file, options);
  return catalogOf(database, { file, isNew });
}

function catalogOf(database: Database.Database, { file, isNew }: { file: string; isNew: boolean }): Catalog {
  const origin = originFinder(database);
  const tableOf = columnTables(database);
  const writing = <Result>(work: () => Result): Result => {
    // The open transaction of `screenSource` ends with the connection: what is written in it would be lost without a word.
    if (database.inTransaction) throw new RangeError(`${file} is being read for one question; close it before it is written`);
    return guarded(file, work);
  };
  return {
    file,
    isNew,
    get genericSha256() {
      return guarded(file, () => currentImport(database, 'generic')?.sha256 ?? null);
    },
    genericIds: () => guarded(file, () => new Set(idsInForce(database, 'generic'))),
    classes: () => guarded(file, () => new Set(classesInForce(database, 'generic'))),
    approvedCount: () => guarded(file, () => countInForce(database, 'approved')),
    importList: (list, options = {}) => writing(() => importList(database, asTier(list, 'approved'), options)),
    approvedPart: (partId) => guarded(file, () => partInForce(database, 'approved', partId)),
    genericParts: () => guarded(file, () => partsInForce(database, 'generic')),
    listInForce: () => guarded(file, () => database.transaction(() => listInForce(database))()),
    columnsOf: ({ id }) => guarded(file, () => tableOf(id).all),
    columnOf: ({ id }, slot) => guarded(file, () => columnOf(tableOf(id), slot)),
    originIn: (imported, partId, slot) => guarded(file, () => origin({ tier: 'approved', from: imported, partId, slot })),
    undo: () => writing(() => database.transaction(() => undoImport(database, 'approved')).immediate()),
    seedGeneric: (list) => writing(() => importList(database, asTier(list, 'generic')).outcome === 'imported'),
    withdrawn: (partId) => guarded(file, () => withdrawnPart(database, file, partId)),
    savedStages: () => guarded(file, () => savedStages(database)),
    saveStages: (stages) => writing(() => saveStages(database, stages)),
    removeStages: (paths) => writing(() => removeStages(database, paths)),
    source: () => partSource(database, file),
    screenSource: () => screenSource(database, file),
    close: () => void database.close(),
  };
}

function asTier(list: IncomingList, tier: IncomingList['tier']): IncomingList {
  if (list.tier !== tier) throw new RangeError(`a list read as ${list.tier} cannot become the ${tier} tier`);
  return list;
}
