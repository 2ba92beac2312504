import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import Database from 'better-sqlite3';
import { COUNT10 } from './queries.js';

const VERSION = '1.5.6-r.1';

/** A node script that asks COUNT10 of the same parts in DuckDB; null when the package cannot be had. Kept in `folder`. */
export function duckDbScript(folder: string, file: string): string | null {
  const home = resolve(folder, 'duckdb');
  mkdirSync(home, { recursive: true });
  if (!existsSync(join(home, 'node_modules', '@duckdb', 'node-api'))) {
    writeFileSync(join(home, 'package.json'), '{"private":true}');
    if (spawnSync('npm', ['install', '--no-audit', '--no-fund', `@duckdb/node-api@${VERSION}`], { cwd: home, timeout: 300_000 }).status !== 0) return null;
  }
  const columns = [...new Set(COUNT10.match(/\b[a-z]+(?:_[a-z]+)+\b/gu))].filter((name) => name !== 'withdrawn_at');
  const table = join(home, 'parts.duckdb');
  const csv = join(home, 'parts.csv');
  const rows = new Database(file, { readonly: true }).prepare(`select ${columns.join(', ')} from part where tier = 'approved' and withdrawn_at is null`).raw().all() as (number | null)[][];
  writeFileSync(csv, [columns.join(), ...rows.map((row) => row.join())].join('\n'));
  rmSync(table, { force: true });
  const script = join(home, 'count.mjs');
  const query = COUNT10.replace("tier = 'approved' and withdrawn_at is null\n and ", '');
  writeFileSync(script, `import { DuckDBInstance } from '@duckdb/node-api';
const db = await (await DuckDBInstance.create(${JSON.stringify(table)})).connect();
if (process.argv[2] === 'load') await db.run("create table part as select * from read_csv('${csv}', header = true)");
else console.log(String((await db.runAndReadAll(${JSON.stringify(query)})).getRows()[0][0]));
`);
  return spawnSync(process.execPath, [script, 'load'], { timeout: 300_000 }).status === 0 ? script : null;
}
