import { existsSync, readFileSync } from 'node:fs';
import { homedir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { createHash } from 'node:crypto';
import { CatalogError, openCatalog, type Catalog } from '../catalog/index.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import type { CommonOptions, Session } from './session.js';

/** The catalog file: `--catalog`, else RAILFIT_CATALOG, else the user data folder per the XDG base directories. */
export function catalogFile(options: CommonOptions, env: Session['env']): string {
  if (options.catalog === '') throw new RequestError([commandProblem('C104', '--catalog names no file', { fix: '--catalog team.sqlite', path: '--catalog' })], EXIT.request);
  if (options.catalog !== undefined) return options.catalog;
  if ((env['RAILFIT_CATALOG'] ?? '') !== '') return env['RAILFIT_CATALOG'] ?? '';
  const data = env['XDG_DATA_HOME'] || join(env['HOME'] || homedir(), '.local', 'share');
  return join(data, 'railfit', 'catalog.sqlite');
}

/** Opens the catalog, fills a new one with the generic sets that ship, runs the work, and closes it. */
export async function withCatalog<R>(session: Session, options: CommonOptions, work: (catalog: Catalog) => R | Promise<R>): Promise<R> {
  const file = catalogFile(options, session.env);
  try {
    const catalog = await openCatalog(file);
    try {
      await seed(catalog, session);
      return await work(catalog);
    } finally {
      catalog.close();
    }
  } catch (error) {
    throw error instanceof CatalogError ? surroundings(error) : error;
  }
}

/** The generic sets ship as a file; another file than the one stored replaces them. A catalog that may not be written is used as it is. */
async function seed(catalog: Catalog, session: Session): Promise<void> {
  const path = shippedFile('generic.csv');
  const bytes = readFileSync(path);
  if (createHash('sha256').update(bytes).digest('hex') === catalog.genericSha256) return;
  const { readList } = await import('../intake/read-list.js');
  const list = readList(bytes, { file: 'generic.csv', tier: 'generic' });
  if (!list.ok) throw new Error(`the generic sets that ship are refused: ${list.problems[0]?.message ?? ''}`);
  try {
    catalog.seedGeneric(list);
  } catch (error) {
    if (catalog.isNew || !(error instanceof CatalogError && error.code === 'readOnly')) throw error;
    session.tell(`note: ${catalog.file} cannot be written; its generic sets are those of an earlier version`);
    return;
  }
  if (catalog.isNew) session.tell(`note: new catalog ${catalog.file}, filled with ${list.parts.length} generic sets (classes of parts, not something to order)`);
}

/** A file of the `catalog` folder that ships with the program, wherever the program was built to. */
export function shippedFile(name: string): string {
  let folder = dirname(fileURLToPath(import.meta.url));
  while (!existsSync(join(folder, 'catalog', 'generic.csv'))) {
    const parent = dirname(folder);
    if (parent === folder) throw new Error('the catalog folder that ships with railfit is missing');
    folder = parent;
  }
  return join(folder, 'catalog', name);
}

function surroundings(error: CatalogError): RequestError {
  const problem = commandProblem('E501', error.message, { fix: FIXES[error.code] });
  return new RequestError([problem], EXIT.surroundings, `The catalog could not be used. (exit ${EXIT.surroundings})`);
}

const FIXES: Readonly<Record<CatalogError['code'], string>> = {
  locked: 'wait until the other railfit has finished, then run it again',
  unreadable: 'check the path and its permissions, or name another file with --catalog FILE',
  notADatabase: 'name another file with --catalog FILE; this one was left as it is',
  newerSchema: 'use the railfit version that wrote it, or another file with --catalog FILE',
  readOnly: 'name a file in a folder that can be written: --catalog FILE',
  diskFull: 'free some space, then run it again; the catalog was left as it was',
};
