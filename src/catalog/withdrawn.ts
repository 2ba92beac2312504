import type Database from 'better-sqlite3';
import type { Origin, Part } from '../parts/part.js';
import { guarded } from './catalog-error.js';
import type { CurrentImport } from './imports.js';
import { importById } from './imports.js';
import { originFinder } from './origins.js';
import { readableColumns } from './readable-columns.js';
import type { Cell } from './part-row.js';
import { rowToPart } from './part-row.js';

/** A part that is on the approved list no more, as it was last: versions are never erased, so that old reports resolve. */
export interface WithdrawnPart {
  readonly part: Part;
  /** The import that no longer had it; when taken back, the one that had brought it. */
  readonly by: CurrentImport;
  /** It came with an import that was taken back. */
  readonly takenBack: boolean;
  /** Origin of a figure by its slot. */
  origin(slot: string): Origin | null;
}

/** The last version of a part that is not in force; null when it is in force or never was on the list. */
export function withdrawnPart(database: Database.Database, file: string, id: string): WithdrawnPart | null {
  if (database.prepare("select 1 from part where tier = 'approved' and id = ? and withdrawn_at is null").get(id) !== undefined) return null;
  const version = lastVersion(database, id);
  if (version === null) return null;
  const [undone, importId, withdrawnAt, ...row] = version;
  const takenBack = undone === 1;
  const from = importById(database, takenBack ? Number(importId) : lastImportWith(database, id, Number(withdrawnAt)));
  const by = importById(database, Number(withdrawnAt));
  if (from === null || by === null) return null;
  const origin = originFinder(database);
  return {
    part: rowToPart(row),
    by,
    takenBack,
    origin: (slot) => guarded(file, () => origin({ tier: 'approved', from, partId: id, slot })),
  };
}

/** Versions of imports that stand go before those of imports taken back. */
function lastVersion(database: Database.Database, id: string): Cell[] | null {
  const columns = readableColumns(database);
  const query = database.prepare<[string], Cell[]>(
    `select undone, part.import_id, part.withdrawn_at, ${columns} from part join list_import on list_import.id = part.import_id
     where part.tier = 'approved' and part.id = ? order by undone, part.withdrawn_at desc, part.key desc limit 1`,
  );
  return query.raw().get(id) ?? null;
}

/** The last list that had the part, before the one that ended it. */
function lastImportWith(database: Database.Database, id: string, before: number): number {
  const query = database.prepare<[string, number], number>(
    `select max(import_id) from record join list_import on list_import.id = record.import_id
     where part_id = ? and import_id < ? and undone = 0 and tier = 'approved'`,
  );
  return query.pluck().get(id, before) ?? 0;
}
