import { FIELDS } from './fields.js';
import type { FieldRow } from './field.js';
import { belongsTo } from './ownership.js';
import { TOPOLOGIES, type Topology } from './spec.js';

export { FIELDS } from './fields.js';
export type { FieldRow } from './field.js';

const BY_PATH: ReadonlyMap<string, FieldRow> = new Map(FIELDS.map((row) => [row.path, row]));

/** The row of a field by its dotted path; undefined when there is no such field. */
export function fieldAt(path: string): FieldRow | undefined {
  return BY_PATH.get(path) ?? BY_PATH.get(rowPath(path));
}

/** The path as the table has it: a name of the user's own choosing becomes `NAME`. */
export function rowPath(path: string): string {
  return path.replace(/^legs\.[^.]*/, 'legs.NAME');
}

/** True for the map whose keys are names of the user's own choosing. */
export function takesOwnNames(level: string): boolean {
  return BY_PATH.has(`${level}.NAME`);
}

/** The row of a field that is known to exist; a RangeError names a path the table lacks. */
export function field(path: string): FieldRow {
  const row = fieldAt(path);
  if (row === undefined) throw new RangeError(`no field ${path} in the table of the stage file`);
  return row;
}

const KEYS: ReadonlyMap<string, readonly string[]> = keysByLevel();

function keysByLevel(): Map<string, string[]> {
  const found = new Map<string, string[]>();
  for (const { path } of FIELDS) {
    const end = path.lastIndexOf('.');
    const level = path.slice(0, Math.max(end, 0));
    found.set(level, [...(found.get(level) ?? []), path.slice(end + 1)]);
  }
  return found;
}

/** Keys accepted in one map of the stage file, in table order: '' is the top level, then `signal`, `limits.settling`, `legs.trim`, … */
export function acceptedKeys(level: string): readonly string[] {
  return KEYS.get(rowPath(level)) ?? [];
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
  /** Topologies that have it. */
  readonly topologies: readonly Topology[];
}

/** One line of help for every field, in the order of the stage file. */
export function renderStageHelp(): readonly FieldHelp[] {
  return FIELDS.map((row) => ({
    path: row.path,
    accepted: row.accepted,
    example: row.example,
    meaning: row.meaning,
    option: row.option ?? `--set ${row.path}=`,
    topologies: TOPOLOGIES.filter((topology) => belongsTo(row.path, topology)),
  }));
}

/** How to write a field that is missing: a line of the file, or the option when there is no file; `example` in place of the one of the table. */
export function howToWrite(path: string, hasFile: boolean, example = field(path).example): string {
  const { option } = field(path);
  if (!hasFile) return option === undefined ? `--set "${path}=${example}"` : `${option} "${example}"`;
  const keys = path.split('.');
  const last = keys.pop() ?? path;
  return keys.reduceRight((inner, key) => `${key}: {${inner}}`, `${last}: ${example}`);
}
