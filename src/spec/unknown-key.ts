import { fold, nearest, shown } from './nearest.js';
import { ownersOf } from './ownership.js';
import type { Complaint } from './problems.js';
import { nameComplaint } from './leg-names.js';
import { acceptedKeys, fieldAt, howToWrite, knownPaths, takesOwnNames } from './schema.js';
import { TOPOLOGIES } from './spec.js';

/** S101 for a key: what was probably meant, and all keys accepted at that level. */
export function unknownKey(key: string, level: string): Complaint {
  if (key.includes('.') && fieldAt(key) !== undefined) {
    return { code: 'S101', message: `${key} is written as one map in the other`, fix: howToWrite(key, true) };
  }
  const keys = acceptedKeys(level);
  const meant = nearest(key, keys) ?? endingIn(key, keys) ?? ofKind(key, level) ?? elsewhere(key);
  const where = level === '' ? 'a stage' : level;
  return { code: 'S101', message: `${shown(key)} is not a key of ${where}${hint(meant)} accepted: ${keys.join(', ')}`, fix: meant ?? spacedColon(key) ?? 'leave it out' };
}

/** S101 for a dotted path given in an option or in a list; null when it is a field. */
export function unknownPath(path: string): Complaint | null {
  const name = ownName(path);
  if (name !== null) return nameComplaint(name) ?? unknownInside(path);
  if (fieldAt(path) !== undefined) return null;
  const meant = nearest(path, writtenPaths()) ?? elsewhere(path);
  const above = path.slice(0, Math.max(path.lastIndexOf('.'), 0));
  const level = acceptedKeys(above).length > 0 ? above : '';
  const under = level === '' ? '' : ` under ${level}`;
  return { code: 'S101', message: `${shown(path)} is not a field of the stage file${hint(meant)} accepted${under}: ${acceptedKeys(level).join(', ')}`, fix: meant ?? 'limits.dcError' };
}

/** The name in a path under a map of own names: `trim` of `legs.trim.resistance`. */
function ownName(path: string): string | null {
  const [first = '', name] = path.split('.');
  return name !== undefined && takesOwnNames(first) ? name : null;
}

function unknownInside(path: string): Complaint | null {
  const [level = '', name = '', ...rest] = path.split('.');
  if (fieldAt(path) !== undefined) return null;
  const leg = `${level}.${name}`;
  const { message, fix = '' } = unknownKey(rest.join('.'), leg);
  return { code: 'S101', message, fix: acceptedKeys(leg).includes(fix) ? `${leg}.${fix}` : fix };
}

/** Paths without a name of the user's own in them: what can be offered as it stands. */
const writtenPaths = (): readonly string[] => knownPaths().filter((path) => !path.split('.').includes('NAME'));

function hint(meant: string | undefined): string {
  return meant === undefined ? ';' : `, did you mean ${meant}?`;
}

/** The only key of this level that ends in what was typed as its last word: `current` among the limits is `supplyCurrent`. */
function endingIn(key: string, keys: readonly string[]): string | undefined {
  const word = fold(key);
  const [found, ...more] = keys.filter((one) => /[A-Z][a-z]*$/u.exec(one)?.[0].toLowerCase() === word);
  return more.length === 0 ? found : undefined;
}

/** The only key of this level that takes what was typed as its name: the `voltage` of a reference is its `value`. */
function ofKind(key: string, level: string): string | undefined {
  const [found, ...more] = acceptedKeys(level).filter((one) => fieldAt(level === '' ? one : `${level}.${one}`)?.kind === fold(key));
  return more.length === 0 ? found : undefined;
}

/** The same last word at another level: `dcError` is `limits.dcError`; where several maps have it, the one that most topologies have. */
function elsewhere(key: string): string | undefined {
  const last = (path: string): string => fold(path.slice(path.lastIndexOf('.') + 1));
  const owners = (path: string): number => ownersOf(path.split('.')[0] ?? '')?.length ?? TOPOLOGIES.length;
  const same = writtenPaths().filter((path) => last(path) === last(key));
  return same.sort((a, b) => owners(b) - owners(a))[0];
}

/** `{gain:8}` is one key to YAML. */
function spacedColon(key: string): string | undefined {
  return /^\w+:\S/.test(key) ? shown(key.replace(':', ': ')) : undefined;
}
