import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { mappingDocument, readMappingDocument } from '../intake/csvw.js';
import type { ListMapping } from '../intake/mapping.js';
import { catalogFile } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import type { CommonOptions, Session } from './session.js';

/** Where mappings are kept: `--mapping FILE`, else a folder beside the catalog, one file for each set of headers. */
export interface MappingOptions extends CommonOptions {
  readonly mapping?: string;
}

/** The folder of saved mappings, beside the catalog. */
export function mappingFolder(session: Session, options: MappingOptions): string {
  return join(dirname(catalogFile(options, session.env)), 'mappings');
}

/** Every saved mapping that applies; a file that cannot be used ends the command with what is wrong in it. */
export function savedMappings(session: Session, options: MappingOptions): readonly ListMapping[] {
  if (options.mapping !== undefined) return existsSync(options.mapping) ? [readOne(options.mapping)] : [];
  const folder = mappingFolder(session, options);
  if (!existsSync(folder)) return [];
  return namesIn(folder).filter((name) => name.endsWith('.json')).sort().map((name) => readOne(join(folder, name)));
}

function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder);
  } catch {
    throw new RequestError([commandProblem('E502', `${folder}, where mappings are kept, cannot be read`, { fix: 'a folder you may read there, or name the mapping of this list with --mapping FILE' })], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
  }
}

function readOne(path: string): ListMapping {
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch {
    throw new RequestError([commandProblem('E502', `${path}: cannot be read`, { fix: 'the path and its permissions', path: '--mapping' })], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
  }
  const read = readMappingDocument(text, path);
  if (!read.ok) throw new RequestError([commandProblem(read.code, read.reason, { fix: 'correct the file, or delete it and answer the questions again' })], EXIT.data, `Nothing was imported. (exit ${EXIT.data})`);
  return read.mapping;
}

/**
 * Keeps how a list was read for its next issue. Written beside its place and moved there, so that it is whole or not there.
 *
 * @returns the file, or null when it says the same already.
 */
export function saveMapping(mapping: ListMapping, session: Session, options: MappingOptions): string | null {
  const path = options.mapping ?? join(mappingFolder(session, options), `${mapping.fingerprint}.json`);
  const text = mappingDocument(mapping);
  try {
    if (existsSync(path) && readFileSync(path, 'utf8') === text) return null;
    mkdirSync(dirname(path), { recursive: true });
    writeFileSync(`${path}.new`, text);
    renameSync(`${path}.new`, path);
    return path;
  } catch {
    throw new RequestError([commandProblem('E503', `${path}: cannot be written`, { fix: 'name another file with --mapping FILE', path: '--mapping' })], EXIT.surroundings);
  }
}
