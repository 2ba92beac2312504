import type { Draft } from './draft.js';
import { asTyped } from './overrides.js';
import { isFromFile, leafText, removeField } from './tree.js';

/** Drops fields of the file that an option makes pointless, and tells. */
export function giveWay(draft: Draft, by: string, rivals: readonly string[]): void {
  const gone = rivals.filter((path) => isFromFile(draft.fields, path));
  if (gone.length === 0) return;
  const told = gone.map((path) => `${path} ${leafText(draft.fields, path) ?? ''}`).join(' and ');
  draft.notes.push(`${by}: ${told} of the file dropped`);
  for (const path of gone) drop(draft, path);
}

/** The option that set a field, as typed; undefined when the file did. */
export function optionAt(draft: Draft, path: string): string | undefined {
  const node = draft.fields.get(path);
  if (node?.at.option === undefined) return undefined;
  return node.kind === 'leaf' ? asTyped(node.at.option, node.whole?.text ?? node.text) : node.at.option;
}

export function drop(draft: Draft, path: string): void {
  removeField(draft.fields, path);
  draft.positions.delete(path);
}
