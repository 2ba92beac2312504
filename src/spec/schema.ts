import { FIELDS } from './fields.js';
import type { FieldRow } from './field.js';

export { FIELDS } from './fields.js';
export type { FieldRow } from './field.js';

const BY_PATH: ReadonlyMap<string, FieldRow> = new Map(FIELDS.map((row) => [row.path, row]));

/** The row of a field by its dotted path; undefined when there is no such field. */
export function fieldAt(path: string): FieldRow | undefined {
  return BY_PATH.get(path);
}

/** The row of a field that is known to exist; a RangeError names a path the table lacks. */
export function field(path: string): FieldRow {
  const row = BY_PATH.get(path);
  if (row === undefined) throw new RangeError(`no field ${path} in the table of the stage file`);
  return row;
}

/** Keys accepted in one map of the stage file, in table order: '' is the top level, then `signal`, `limits.settling`, … */
export function acceptedKeys(level: string): readonly string[] {
  const prefix = level === '' ? '' : `${level}.`;
  return FIELDS.filter((row) => row.path.startsWith(prefix) && !row.path.slice(prefix.length).includes('.')).map((row) => row.path.slice(prefix.length));
}

/** Every map of the stage file with its accepted keys. */
export function keysPerLevel(): Readonly<Record<string, readonly string[]>> {
  const levels = ['', ...FIELDS.filter((row) => row.shape === 'map').map((row) => row.path)];
  return Object.fromEntries(levels.map((level) => [level, acceptedKeys(level)]));
}

/** What `--set path=value`, `mayChange` and overrides may name. */
export function knownPaths(): readonly string[] {
  return FIELDS.map((row) => row.path);
}

export interface FieldHelp {
  readonly path: string;
  /** The forms it takes, in words. */
  readonly accepted: string;
  readonly example: string;
  readonly meaning: string;
  /** The option that sets it: its own, else `--set path=…`. */
  readonly option: string;
}

/** One line of help for every field, in the order of the stage file. */
export function renderStageHelp(): readonly FieldHelp[] {
  return FIELDS.map((row) => ({
    path: row.path,
    accepted: row.accepted,
    example: row.example,
    meaning: row.meaning,
    option: row.option ?? `--set ${row.path}=`,
  }));
}

/** How to write a field that is missing: a line of the file, or the option when there is no file. */
export function howToWrite(path: string, hasFile: boolean): string {
  const row = field(path);
  if (!hasFile) return row.option === undefined ? `--set "${path}=${row.example}"` : `${row.option} "${row.example}"`;
  const keys = path.split('.');
  const last = keys.pop() ?? path;
  return keys.reduceRight((inner, key) => `${key}: {${inner}}`, `${last}: ${row.example}`);
}
