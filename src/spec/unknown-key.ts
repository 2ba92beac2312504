import { fold, nearest, shown } from './nearest.js';
import type { Complaint } from './problems.js';
import { acceptedKeys, fieldAt, howToWrite, knownPaths } from './schema.js';

/** S101 for a key: what was probably meant, and all keys accepted at that level. */
export function unknownKey(key: string, level: string): Complaint {
  if (key.includes('.') && fieldAt(key) !== undefined) {
    return { code: 'S101', message: `${key} is written as one map in the other`, fix: howToWrite(key, true) };
  }
  const keys = acceptedKeys(level);
  const meant = nearest(key, keys) ?? elsewhere(key);
  const where = level === '' ? 'a stage' : level;
  return { code: 'S101', message: `${shown(key)} is not a key of ${where}${hint(meant)} accepted: ${keys.join(', ')}`, fix: meant ?? spacedColon(key) ?? 'leave it out' };
}

/** S101 for a dotted path given in an option or in a list; null when it is a field. */
export function unknownPath(path: string): Complaint | null {
  if (fieldAt(path) !== undefined) return null;
  const meant = nearest(path, knownPaths()) ?? elsewhere(path);
  const above = path.slice(0, Math.max(path.lastIndexOf('.'), 0));
  const level = acceptedKeys(above).length > 0 ? above : '';
  const under = level === '' ? '' : ` under ${level}`;
  return { code: 'S101', message: `${shown(path)} is not a field of the stage file${hint(meant)} accepted${under}: ${acceptedKeys(level).join(', ')}`, fix: meant ?? 'limits.dcError' };
}

function hint(meant: string | undefined): string {
  return meant === undefined ? ';' : `, did you mean ${meant}?`;
}

/** The same last word at another level: `dcError` is `limits.dcError`. */
function elsewhere(key: string): string | undefined {
  const last = (path: string): string => fold(path.slice(path.lastIndexOf('.') + 1));
  return knownPaths().find((path) => last(path) === last(key));
}

/** `{gain:8}` is one key to YAML. */
function spacedColon(key: string): string | undefined {
  return /^\w+:\S/.test(key) ? shown(key.replace(':', ': ')) : undefined;
}
