import type { Position } from './spec.js';

/** One written value: its text exactly as typed (quotes and escapes resolved). */
export interface Leaf {
  readonly kind: 'leaf';
  readonly text: string;
  readonly at: Position;
  /** When this is a piece of a longer value (`10 kΩ to ground, 100 pF`): the whole value and where the piece starts in it. */
  readonly whole?: { readonly text: string; readonly offset: number };
}

export interface List {
  readonly kind: 'list';
  readonly items: readonly Node[];
  readonly at: Position;
}

export interface Entry {
  readonly key: string;
  readonly keyAt: Position;
  readonly node: Node;
}

export interface Branch {
  readonly kind: 'branch';
  readonly entries: readonly Entry[];
  readonly at: Position;
}

/** A stage file, or the value of an option, as read: maps, lists and texts, each with its position. */
export type Node = Leaf | List | Branch;

/** Written fields by dotted path; maps are kept beside what they hold. */
export type Fields = Map<string, Node>;

export function isEmpty(node: Node): boolean {
  return node.kind === 'leaf' && node.text.trim() === '';
}

/** Removes a field and everything under it; tells whether anything was there. */
export function removeField(fields: Fields, path: string): boolean {
  const gone = [...fields.keys()].filter((key) => isUnder(key, path));
  for (const key of gone) fields.delete(key);
  return gone.length > 0;
}

/** True for the path itself and for everything under it. */
export function isUnder(path: string, ancestor: string): boolean {
  return path === ancestor || path.startsWith(`${ancestor}.`);
}

export function leafText(fields: Fields, path: string): string | undefined {
  const node = fields.get(path);
  return node?.kind === 'leaf' ? node.text : undefined;
}

/** True when the field stands in the file, not in an option. */
export function isFromFile(fields: Fields, path: string): boolean {
  const node = fields.get(path);
  return node !== undefined && node.at.option === undefined;
}
