import type Database from 'better-sqlite3';
import type { Part, Tier } from '../parts/part.js';
import type { Cell } from './part-row.js';
import { rowToPart } from './part-row.js';
import { readableColumns } from './readable-columns.js';

/** The parts of a tier in force, by id. */
export function partsInForce(database: Database.Database, tier: Tier): Part[] {
  const query = database.prepare<[Tier], Cell[]>(
    `select ${readableColumns(database)} from part where tier = ? and withdrawn_at is null`,
  );
  // Row by row: all rows at once would take as much memory again as the parts.
  const parts: Part[] = [];
  for (const row of query.raw().iterate(tier)) parts.push(rowToPart(row));
  return parts.sort((a, b) => (a.id < b.id ? -1 : Number(a.id > b.id)));
}

/** One part of a tier in force; null when there is none with this id. */
export function partInForce(database: Database.Database, tier: Tier, id: string): Part | null {
  const query = database.prepare<[Tier, string], Cell[]>(`select ${readableColumns(database)} from part where tier = ? and id = ? and withdrawn_at is null`);
  const row = query.raw().get(tier, id);
  return row === undefined ? null : rowToPart(row);
}

/** Whether a part of a tier is in force, by its id; the query is made once. */
export function isInForce(database: Database.Database, tier: Tier): (id: string) => boolean {
  const query = database.prepare<[Tier, string], number>('select 1 from part where tier = ? and id = ? and withdrawn_at is null').pluck();
  return (id) => query.get(tier, id) !== undefined;
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

/** How many parts of a tier are in force. */
export function countInForce(database: Database.Database, tier: Tier): number {
  return database.prepare<[Tier], number>('select count(*) from part where tier = ? and withdrawn_at is null').pluck().get(tier) ?? 0;
}
