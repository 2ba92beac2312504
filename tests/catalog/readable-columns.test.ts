import Database from 'better-sqlite3';
import { expect, it } from 'vitest';
import { PART_COLUMNS } from '../../src/catalog/part-columns.js';
import { readableColumns } from '../../src/catalog/readable-columns.js';

it('columns an earlier version lacks are not known, in the order of the others', () => {
  const database = new Database(':memory:');
  database.exec("create table part (id text, tier text, slew_rate_min real); insert into part values ('A', 'approved', 5e5)");
  const row = database.prepare<[], Record<string, unknown>>(`select ${readableColumns(database)} from part`).get() ?? {};
  expect(Object.keys(row)).toEqual(PART_COLUMNS);
  expect(Object.entries(row).filter(([, value]) => value !== null)).toEqual([['tier', 'approved'], ['id', 'A'], ['slew_rate_min', 5e5]]);
});
