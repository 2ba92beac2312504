import type Database from 'better-sqlite3';
import { DECLARED } from '../intake/list-sources.js';
import type { ListColumn, PatchedCell } from '../intake/list.js';
import type { Origin, Tier } from '../parts/part.js';
import type { ColumnTable } from './import-columns.js';
import { columnTables } from './import-columns.js';
import type { CurrentImport } from './imports.js';

/** A figure as one import had it: the part it belongs to and its slot. */
export interface OriginQuery {
  readonly tier: Tier;
  readonly from: CurrentImport;
  readonly partId: string;
  readonly slot: string;
}

/** Joins the cell of an import to a figure; null where none is kept. Column tables are read once per import. */
export function originFinder(database: Database.Database): (query: OriginQuery) => Origin | null {
  const tableOf = columnTables(database);
  // Everything of the row, since the column of `figures` came with a later version of the tables.
  const records = database.prepare<[number, string], RecordRow>('select * from record where import_id = ? and part_id = ?');
  // The figures of a part are asked for one after the other.
  let last: { readonly key: string; readonly record: ReadRecord | null } | null = null;
  const recordOf = ({ from, partId }: OriginQuery): ReadRecord | null => {
    const key = `${from.id} ${partId}`;
    if (last?.key !== key) last = { key, record: readRecord(records.get(from.id, partId)) };
    return last.record;
  };
  return (query) => {
    const record = recordOf(query);
    if (record === null) return null;
    const sheet = patchedCell(record, query.slot);
    if (sheet !== null) return sheet;
    const table = tableOf(query.from.id);
    const number = numberOf(record, query.slot, table);
    if (number === DECLARED) return { kind: 'assumption', text: `declared for the whole list: ${table.declared ?? ''}` };
    const column = table.all.find((one) => one.number === number);
    return column === undefined ? null : originOf(record, query, column);
  };
}

function numberOf({ figures }: ReadRecord, slot: string, { slots }: ColumnTable): number | undefined {
  return figures[slot] ?? slots.get(slot) ?? firstUnder(slots, slot);
}

/** A figure that is missing is asked for without condition: then the first of its columns, whose cell is empty. */
function firstUnder(slots: ReadonlyMap<string, number>, slot: string): number | undefined {
  return slot.includes('@') ? undefined : [...slots].find(([one, number]) => number !== DECLARED && one.startsWith(`${slot}@`))?.[1];
}

/** The cell of a look-up sheet the figure came from; null when it came from the list itself. */
function patchedCell({ patched }: ReadRecord, slot: string): Origin | null {
  return patched[slot] ?? null;
}

interface RecordRow {
  readonly line: number;
  readonly row: number;
  readonly cells: string;
  readonly figures?: string | null;
  readonly patched?: string | null;
}

interface ReadRecord extends Pick<RecordRow, 'line' | 'row'> {
  readonly cells: readonly string[];
  readonly figures: Readonly<Partial<Record<string, number>>>;
  readonly patched: Readonly<Partial<Record<string, PatchedCell>>>;
}

function readRecord(found: RecordRow | undefined): ReadRecord | null {
  if (found === undefined) return null;
  const { line, row, cells, figures, patched } = found;
  return { line, row, cells: JSON.parse(cells) as string[], figures: JSON.parse(figures ?? '{}') as ReadRecord['figures'], patched: JSON.parse(patched ?? '{}') as ReadRecord['patched'] };
}

function originOf({ line, row, cells }: ReadRecord, { tier, from, partId }: OriginQuery, { header, number, letter }: ListColumn): Origin {
  const cell = cells[number - 1] ?? '';
  if (tier === 'generic') return { kind: 'generic', id: partId, header, cell };
  return { kind: 'cell', file: from.file, sha256: from.sha256, line, row, column: number, columnLetter: letter, header, cell };
}
