import type { Problem } from '../quantities/problem.js';
import { problemAt, type Complaint } from './problems.js';
import { acceptedKeys, field, fieldAt, takesOwnNames } from './schema.js';
import { expandShortForm } from './short-forms.js';
import type { Shape } from './field.js';
import type { Position } from './spec.js';
import type { Branch, Entry, Fields, Leaf, List, Node } from './tree.js';
import { isEmpty } from './tree.js';
import { nameComplaint } from './leg-names.js';
import { unknownKey } from './unknown-key.js';

export interface Flat {
  readonly fields: Fields;
  readonly positions: Map<string, Position>;
  readonly problems: Problem[];
}

export interface Wanted {
  readonly path: string;
  readonly keyAt: Position;
  readonly file: string | undefined;
}

/** The known fields of a tree by dotted path; unknown keys, keys written twice and wrong structure become problems. */
export function flatten(node: Node, wanted: Wanted): Flat {
  const flat: Flat = { fields: new Map(), positions: new Map(), problems: [] };
  visit(expandShortForm(wanted.path, node), wanted, flat);
  return flat;
}

function visit(node: Node, wanted: Wanted, flat: Flat): void {
  const row = fieldAt(wanted.path);
  const shape = wanted.path === '' ? 'map' : row?.shape;
  if (shape === 'map') return visitMap(node, wanted, flat);
  if (node.kind === 'leaf' || (node.kind === 'list' && isListShape(row?.shape))) return keep(node, wanted, flat);
  flat.problems.push(misshapen(node, wanted));
}

function isListShape(shape: Shape | undefined): boolean {
  return shape === 'choices' || shape === 'texts' || shape === 'paths';
}

function keep(node: Node, wanted: Wanted, flat: Flat): void {
  if (node.kind === 'list' && !node.items.every((item) => item.kind === 'leaf')) {
    flat.problems.push(misshapen(node, wanted));
    return;
  }
  flat.fields.set(wanted.path, node);
  flat.positions.set(wanted.path, node.kind === 'branch' || isEmpty(node) ? wanted.keyAt : node.at);
}

function visitMap(node: Node, wanted: Wanted, flat: Flat): void {
  const branch: Node = isEmpty(node) ? { kind: 'branch', entries: [], at: wanted.keyAt } : node;
  if (branch.kind !== 'branch') {
    flat.problems.push(misshapen(branch, wanted));
    return;
  }
  if (wanted.path !== '') keep(branch, wanted, flat);
  const seen = new Map<string, Position>();
  for (const item of branch.entries) visitEntry(item, { wanted, flat, seen });
}

function visitEntry(item: Entry, around: { wanted: Wanted; flat: Flat; seen: Map<string, Position> }): void {
  const { wanted, flat, seen } = around;
  const path = wanted.path === '' ? item.key : `${wanted.path}.${item.key}`;
  const spot = { path, at: item.keyAt, file: wanted.file };
  const first = seen.get(item.key);
  if (first !== undefined) {
    const where = first.line === undefined ? '' : `, first in line ${String(first.line)}`;
    flat.problems.push(problemAt(spot, { code: 'S109', message: `${path} is written twice${where}`, fix: 'keep one of the two' }));
    return;
  }
  seen.set(item.key, item.keyAt);
  const complaint = keyComplaint(item.key, wanted.path);
  if (complaint !== null) {
    flat.problems.push(problemAt(spot, complaint));
    return;
  }
  visit(expandShortForm(path, item.node), { path, keyAt: item.keyAt, file: wanted.file }, flat);
}

function keyComplaint(key: string, level: string): Complaint | null {
  if (takesOwnNames(level)) return nameComplaint(key);
  return acceptedKeys(level).includes(key) ? null : unknownKey(key, level);
}

const NAMES = { leaf: 'one value', list: 'a list', branch: 'a map' } as const;

function misshapen(node: Leaf | List | Branch, { path, keyAt, file }: Wanted): Problem {
  const at = node.kind === 'leaf' ? node.at : keyAt;
  if (path === '') return problemAt({ path, at, file }, notAStage(node));
  const row = field(path);
  const complaint = { code: 'S103', message: `${path} is ${NAMES[node.kind]} here; accepted: ${row.accepted}`, fix: row.example };
  return problemAt({ path, at, file }, complaint);
}

function notAStage(node: Leaf | List | Branch): { code: string; message: string; fix: string } {
  const keys = `accepted keys: ${acceptedKeys('').join(', ')}`;
  if (node.kind === 'leaf' && /^[\w-]+:\S/.test(node.text)) {
    return { code: 'S103', message: `${node.text.slice(0, 60)} has no space after the colon, so it is one word to YAML; ${keys}`, fix: node.text.slice(0, 60).replace(':', ': ') };
  }
  return { code: 'S103', message: `the file is ${NAMES[node.kind]}, not a map of fields; ${keys}`, fix: 'topology: non-inverting' };
}
