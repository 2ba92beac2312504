import type Database from 'better-sqlite3';
import type { ReadList } from '../intake/list.js';
import type { Part, Tier } from '../parts/part.js';
import { contentHash, partContent } from './content.js';
import type { ImportCounts } from './imports.js';
import { currentImport, insertImport, updateOrigin } from './imports.js';
import { PART_COLUMNS } from './part-columns.js';
import type { Cell } from './part-row.js';
import { partToRow, rowToPart } from './part-row.js';

export interface ChangedPart {
  readonly before: Part;
  readonly after: Part;
}

/** The difference between the list in force and a new one. Ids are compared, then everything that can change an answer. */
export interface Difference {
  /** The parts whose version changes, by id, before and after. */
  readonly changed: readonly ChangedPart[];
  /** Ids in force that are not in the new list. */
  readonly removed: readonly string[];
  /** New or changed: to be written. */
  readonly written: readonly Part[];
  /** Ids of the versions in force that end. */
  readonly withdrawn: readonly string[];
  readonly counts: ImportCounts;
  readonly contentSha256: string;
}

export function compareLists(database: Database.Database, list: ReadList): Difference {
  const before = new Map(partsInForce(database, list.tier).map((part) => [part.id, part]));
  const contents = list.parts.map(partContent);
  const after = new Set(list.parts.map(({ id }) => id));
  const written = list.parts.filter(({ id }, index) => contentOf(before.get(id)) !== contents[index]);
  const changed = written.flatMap((part) => changeOf(before.get(part.id), part));
  const removed = [...before.keys()].filter((id) => !after.has(id));
  const counts = {
    rows: list.parts.length,
    added: written.length - changed.length,
    changed: changed.length,
    removed: removed.length,
    unchanged: list.parts.length - written.length,
  };
  const withdrawn = [...changed.map((change) => change.after.id), ...removed];
  return { written, changed, removed, withdrawn, counts, contentSha256: contentHash(contents) };
}

const contentOf = (part: Part | undefined): string | null => (part === undefined ? null : partContent(part));

const changeOf = (before: Part | undefined, after: Part): ChangedPart[] => (before === undefined ? [] : [{ before, after }]);

/** The same parts in other bytes: where each figure came from is now this file. No version is made, so undo takes back what it did before. */
export function refreshOrigins(database: Database.Database, list: ReadList, importId: number): void {
  updateOrigin(database, importId, list);
  database.prepare('delete from record where import_id = ?').run(importId);
  writeRecords(database, list, importId);
}

interface Writing {
  readonly difference: Difference;
  readonly now: string | null;
}

/** Writes a difference: a new import, its versions and its records. To be run inside a transaction. */
export function writeDifference(database: Database.Database, list: ReadList, { difference, now }: Writing): void {
  const { file, sha256, tier, columns } = list;
  const { counts, contentSha256, withdrawn, written } = difference;
  const importId = insertImport(database, { file, sha256, tier, columns, counts, contentSha256, importedAt: now });
  const withdraw = database.prepare('update part set withdrawn_at = ? where tier = ? and id = ? and withdrawn_at is null');
  for (const id of withdrawn) withdraw.run(importId, tier, id);
  const insert = database.prepare(
    `insert into part (import_id, ${PART_COLUMNS.join(', ')}) values (?, ${PART_COLUMNS.map(() => '?').join(', ')})`,
  );
  for (const part of written) insert.run(importId, ...partToRow(part));
  writeRecords(database, list, importId);
}

/** The parts of a tier in force, by id. */
export function partsInForce(database: Database.Database, tier: Tier): Part[] {
  const query = database.prepare<[Tier], Cell[]>(
    `select ${PART_COLUMNS.join(', ')} from part where tier = ? and withdrawn_at is null`,
  );
  const parts = query.raw().all(tier).map(rowToPart);
  return parts.sort((a, b) => (a.id < b.id ? -1 : Number(a.id > b.id)));
}

/** Ids of a tier in force. */
export function idsInForce(database: Database.Database, tier: Tier): string[] {
  return database.prepare<[Tier], string>('select id from part where tier = ? and withdrawn_at is null').pluck().all(tier);
}

/** Classes the parts of a tier in force belong to. */
export function classesInForce(database: Database.Database, tier: Tier): string[] {
  const query = database.prepare<[Tier], string>(
    'select distinct class from part where tier = ? and withdrawn_at is null and class is not null',
  );
  return query.pluck().all(tier);
}

/**
 * Takes the last import of a tier back: its versions end, those it had ended are in force again.
 *
 * @returns false when there is no import to take back.
 */
export function undoImport(database: Database.Database, tier: Tier): boolean {
  const current = currentImport(database, tier);
  if (current === null) return false;
  database.prepare('update part set withdrawn_at = ? where import_id = ?').run(current.id, current.id);
  database.prepare('update part set withdrawn_at = null where withdrawn_at = ? and import_id <> ?').run(current.id, current.id);
  database.prepare('update list_import set undone = 1 where id = ?').run(current.id);
  return true;
}

function writeRecords(database: Database.Database, { parts, records }: ReadList, importId: number): void {
  const insert = database.prepare('insert into record (import_id, part_id, line, row, cells) values (?, ?, ?, ?, ?)');
  parts.forEach(({ id }, index) => {
    const record = records[index];
    if (record !== undefined) insert.run(importId, id, record.line, record.row, JSON.stringify(record.cells));
  });
}
