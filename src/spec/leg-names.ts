import type { Draft } from './draft.js';
import { shown } from './nearest.js';
import type { Complaint } from './problems.js';

/** Names that stand for something else wherever a stage is told. */
const TAKEN: readonly string[] = ['supply', 'reference', 'current', 'bus', 'load', 'input', 'temperature'];
const LONGEST = 40;
export const MOST_LEGS = 12;

/** S113 for a name that a leg cannot have; null when it can. */
export function nameComplaint(name: string): Complaint | null {
  if (TAKEN.includes(name)) return { code: 'S113', message: `${name} is no name for a leg, since it means something else in a stage; taken: ${TAKEN.join(', ')}`, fix: `${name}-leg` };
  if (/^[\w-]+$/.test(name) && name.length <= LONGEST) return null;
  const bare = name.replace(/[^\w-]+/g, '-').replace(/^-+|-+$/g, '').slice(0, LONGEST);
  return { code: 'S113', message: `${shown(name)} is no name for a leg: letters, digits, - and _, at most ${String(LONGEST)} of them`, fix: bare === '' ? 'trim' : bare };
}

/** Names of the legs that are written, in the order of the file; legs that only options name come last. */
export function legNames(draft: Draft): readonly string[] {
  const map = draft.fields.get('legs');
  const first = map?.kind === 'branch' ? map.entries.map(({ key }) => key) : [];
  const written = [...draft.fields.keys()].filter((path) => path.startsWith('legs.')).map((path) => path.split('.')[1] ?? '');
  return [...new Set([...first, ...written])].filter((name) => written.includes(name));
}
