import type Database from 'better-sqlite3';
import { figureSlot } from '../parts/figures.js';
import type { Origin, Part, PartSource, Tier } from '../parts/part.js';
import type { ListColumn } from '../intake/list.js';
import { guarded } from './catalog-error.js';
import { catalogHash } from './content.js';
import type { CurrentImport } from './imports.js';
import { currentImport, importColumns } from './imports.js';
import { partsInForce } from './store.js';

/** The parts in force, approved before generic, each tier by id. Read once; origins are looked up when asked for. */
export function partSource(database: Database.Database, file: string): PartSource {
  return guarded(file, () => database.transaction(() => readSource(database, file))());
}

interface KeptTier {
  readonly tier: Tier;
  readonly current: CurrentImport | null;
  readonly parts: readonly Part[];
}

function readSource(database: Database.Database, file: string): PartSource {
  const approved = readTier(database, 'approved');
  const generic = readTier(database, 'generic');
  const tierOf = new Map([generic, approved].flatMap((kept) => kept.parts.map((part): [string, KeptTier] => [part.id, kept])));
  const columnsOf = slotColumns(database);
  return {
    parts: [...approved.parts, ...generic.parts],
    sha256: catalogHash(approved.current?.contentSha256 ?? null, generic.current?.contentSha256 ?? null),
    origin(partId, slot) {
      const kept = tierOf.get(partId);
      if (kept === undefined || kept.current === null) return null;
      const { tier, current } = kept;
      return guarded(file, () => {
        const column = columnOf(columnsOf(current.id), slot);
        return column === undefined ? null : originOf(database, partId, { tier, current, column });
      });
    },
  };
}

function readTier(database: Database.Database, tier: Tier): KeptTier {
  return { tier, current: currentImport(database, tier), parts: partsInForce(database, tier) };
}

/** The column of a slot. A figure that is missing is asked for without condition: then the first of its columns, whose cell is empty. */
function columnOf(columns: ReadonlyMap<string, ListColumn>, slot: string): ListColumn | undefined {
  const exact = columns.get(slot);
  if (exact !== undefined || slot.includes('@')) return exact;
  return [...columns].find(([one]) => one.startsWith(`${slot}@`))?.[1];
}

interface RecordRow {
  readonly line: number;
  readonly row: number;
  readonly cells: string;
}

interface OriginQuery {
  readonly tier: Tier;
  readonly current: CurrentImport;
  readonly column: ListColumn;
}

function originOf(database: Database.Database, partId: string, { tier, current, column }: OriginQuery): Origin | null {
  const query = database.prepare<[number, string], RecordRow>('select line, row, cells from record where import_id = ? and part_id = ?');
  const record = query.get(current.id, partId);
  if (record === undefined) return null;
  const cell = (JSON.parse(record.cells) as string[])[column.number - 1] ?? '';
  const { header, number, letter } = column;
  if (tier === 'generic') return { kind: 'generic', id: partId, header, cell };
  const { line, row } = record;
  return { kind: 'cell', file: current.file, sha256: current.sha256, line, row, column: number, columnLetter: letter, header, cell };
}

/** The column of each slot of an import, from its column table; read once per import. */
function slotColumns(database: Database.Database): (importId: number) => ReadonlyMap<string, ListColumn> {
  const known = new Map<number, ReadonlyMap<string, ListColumn>>();
  return (importId) => {
    const earlier = known.get(importId);
    if (earlier !== undefined) return earlier;
    const columns = new Map(importColumns(database, importId).flatMap((column) => slotOf(column)));
    known.set(importId, columns);
    return columns;
  };
}

function slotOf(column: ListColumn): [string, ListColumn][] {
  const { reading } = column;
  if (reading.kind !== 'figure') return [];
  return [[figureSlot({ parameter: reading.parameter, kind: reading.limit, condition: reading.condition }), column]];
}
