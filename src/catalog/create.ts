import { randomUUID } from 'node:crypto';
import { closeSync, constants, copyFileSync, existsSync, linkSync, mkdirSync, openSync, rmSync } from 'node:fs';
import { dirname } from 'node:path';
import Database from 'better-sqlite3';
import type { Migration } from 'kysely';
import { asCatalogError, CatalogError } from './catalog-error.js';

/**
 * Makes an empty catalog. It is built beside its place and linked there when it is complete, so a failure leaves nothing behind
 * and of two processes creating it at once, one does.
 *
 * @returns false when another process was first.
 */
export async function createCatalog(file: string, migrations?: Readonly<Record<string, Migration>>): Promise<boolean> {
  const draft = `${file}.new-${randomUUID()}`;
  try {
    prepare(file, draft);
    await build(draft, migrations);
    return settle(draft, file);
  } catch (error) {
    throw asCatalogError(error, file);
  } finally {
    for (const suffix of ['', '-journal', '-wal', '-shm']) rmSync(draft + suffix, { force: true });
  }
}

function prepare(file: string, draft: string): void {
  try {
    makeFolder(dirname(file));
    closeSync(openSync(draft, 'wx'));
  } catch (error) {
    const { code } = error as { code?: string };
    if (code !== 'EACCES' && code !== 'EPERM') throw error;
    throw new CatalogError('readOnly', file, { message: 'the folder cannot be written', cause: error });
  }
}

/** Folder by folder: Node's own recursive form never returns where the system refuses a folder with ENOENT, as under /proc. */
function makeFolder(folder: string): void {
  if (existsSync(folder)) return;
  const parent = dirname(folder);
  if (parent !== folder) makeFolder(parent);
  try {
    mkdirSync(folder);
  } catch (error) {
    // Another process may have made it meanwhile.
    if ((error as { code?: string }).code !== 'EEXIST') throw error;
  }
}

async function build(draft: string, migrations?: Readonly<Record<string, Migration>>): Promise<void> {
  const { migrate } = await import('./migrate.js');
  const database = new Database(draft);
  try {
    await migrate(database, migrations);
  } finally {
    database.close();
  }
}

function settle(draft: string, file: string): boolean {
  try {
    linkSync(draft, file);
    return true;
  } catch {
    if (existsSync(file)) return false;
    // File systems without hard links; the copy refuses as well to replace a file.
    copyFileSync(draft, file, constants.COPYFILE_EXCL);
    return true;
  }
}
