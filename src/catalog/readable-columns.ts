import type Database from 'better-sqlite3';
import { PART_COLUMNS } from './part-columns.js';

/**
 * The columns of a part as a query asks for them, in the order of `PART_COLUMNS`. Tables of an earlier version that may not be brought
 * up to date lack some: those are not known.
 */
export function readableColumns(database: Database.Database): string {
  const there = new Set(database.prepare<[], string>("select name from pragma_table_info('part')").pluck().all());
  return PART_COLUMNS.map((name) => (there.has(name) ? `part.${name}` : `null as ${name}`)).join(', ');
}
