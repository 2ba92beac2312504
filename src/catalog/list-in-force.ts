import type Database from 'better-sqlite3';
import type { ListRecord, PatchedCell, ReadList } from '../intake/list.js';
import { plainSlot } from '../intake/list-sources.js';
import type { Part } from '../parts/part.js';
import { columnTables } from './import-columns.js';
import { currentImport, type CurrentImport } from './imports.js';
import { partsInForce } from './in-force.js';

/** The approved list as it is kept, to be changed cell by cell. */
export interface ListInForce {
  readonly list: ReadList;
  readonly from: CurrentImport;
}

/** The approved list in force as if it had just been read, with what look-up sheets added before; null when none was imported. */
export function listInForce(database: Database.Database): ListInForce | null {
  const from = currentImport(database, 'approved');
  if (from === null) return null;
  const parts = partsInForce(database, 'approved');
  const rows = recordsOf(database, from.id, parts);
  const { all, slots, declared } = columnTables(database)(from.id);
  const told = new Map(all.flatMap(plainSlot));
  return {
    from,
    list: {
      ok: true,
      file: from.file,
      tier: 'approved',
      parts,
      columns: all,
      records: rows.map(recordOf),
      sources: { usual: new Map([...slots].filter(([slot, number]) => told.get(slot) !== number)), others: kept(rows, ({ figures }) => mapOf(figures)), declared },
      patched: kept(rows, ({ patched }) => (patched == null ? null : (JSON.parse(patched) as Readonly<Record<string, PatchedCell>>))),
      sha256: from.sha256,
      delimiter: ',',
      decimal: 'point',
      warnings: [],
      notes: [],
      mapping: null,
      proposals: [],
    },
  };
}

interface RecordRow {
  readonly part_id: string;
  readonly line: number;
  readonly row: number;
  readonly cells: string;
  readonly figures?: string | null;
  readonly patched?: string | null;
}

/** One record a part, in the order of the parts. */
function recordsOf(database: Database.Database, importId: number, parts: readonly Part[]): RecordRow[] {
  const query = database.prepare<[number, string], RecordRow>('select * from record where import_id = ? and part_id = ?');
  return parts.map(({ id }) => query.get(importId, id) ?? { part_id: id, line: 0, row: 0, cells: '[]' });
}

const recordOf = ({ line, row, cells }: RecordRow): ListRecord => ({ line, lineEnd: line, row, cells: JSON.parse(cells) as string[] });

const mapOf = (figures: string | null | undefined): ReadonlyMap<string, number> | null => (figures == null ? null : new Map(Object.entries(JSON.parse(figures) as Record<string, number>)));

/** By index, where there is something. */
function kept<Value>(rows: readonly RecordRow[], read: (row: RecordRow) => Value | null): ReadonlyMap<number, Value> {
  return new Map(rows.flatMap((row, index): [number, Value][] => {
    const value = read(row);
    return value === null ? [] : [[index, value]];
  }));
}
