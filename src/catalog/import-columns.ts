import type Database from 'better-sqlite3';
import { plainSlot, type ListSources } from '../intake/list-sources.js';
import type { ListColumn } from '../intake/list.js';

/** The columns of an import, and which of them fills which slot. */
export interface ColumnTable {
  readonly all: readonly ListColumn[];
  /** Slot → number of its column; 0 where the figure was declared for the whole list. */
  readonly slots: ReadonlyMap<string, number>;
  /** What was declared for the whole list; null when nothing was. */
  readonly declared: string | null;
}

/** What an import keeps of its sources; null when its headers tell everything. */
export function sourcesText({ usual, declared }: ListSources): string | null {
  return usual.size === 0 && declared === null ? null : JSON.stringify({ slots: Object.fromEntries(usual), declared });
}

/** Reads column tables, each once. */
export function columnTables(database: Database.Database): (importId: number) => ColumnTable {
  // Everything of the row, since `sources` came with a later version of the tables.
  const query = database.prepare<[number], Row>('select * from list_import where id = ?');
  const known = new Map<number, ColumnTable>();
  return (importId) => {
    const earlier = known.get(importId);
    if (earlier !== undefined) return earlier;
    const table = tableOf(query.get(importId));
    known.set(importId, table);
    return table;
  };
}

interface Row {
  readonly columns: string;
  readonly sources?: string | null;
}

function tableOf(row: Row | undefined): ColumnTable {
  const all = JSON.parse(row?.columns ?? '[]') as ListColumn[];
  const { slots = {}, declared = null } = JSON.parse(row?.sources ?? '{}') as { slots?: Readonly<Record<string, number>>; declared?: string | null };
  return { all, declared, slots: new Map([...all.flatMap((column) => plainSlot(column)), ...Object.entries(slots)]) };
}

/** The column that fills a slot where a part does not say otherwise; null when none does. */
export function columnOf({ all, slots }: ColumnTable, slot: string): ListColumn | null {
  const number = slots.get(slot);
  return all.find((column) => column.number === number) ?? null;
}
