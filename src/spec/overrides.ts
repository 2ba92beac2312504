import type { Draft } from './draft.js';
import { parseTree } from './document.js';
import { problemAt } from './problems.js';
import type { Override } from './spec.js';
import type { Flat } from './structure.js';
import { flatten } from './structure.js';
import type { Leaf, Node } from './tree.js';
import { isFromFile, isUnder, leafText, removeField } from './tree.js';
import { unknownPath } from './unknown-key.js';

/** Puts options over the file, in the order given; faults of what they replace are forgotten. */
export function applyOverrides(draft: Draft, overrides: readonly Override[]): void {
  for (const override of overrides) applyOverride(draft, override);
}

function applyOverride(draft: Draft, override: Override): void {
  const at = { option: override.option };
  const unknown = unknownPath(override.path);
  if (unknown !== null) {
    draft.problems.push(problemAt({ path: override.path, at }, unknown));
    return;
  }
  const node = valueOf(override, draft);
  if (node === null) return void draft.positions.set(override.path, at);
  const flat = flatten(node, { path: override.path, keyAt: at, file: undefined });
  forgetFaults(draft, override.path);
  tellReplaced(draft, override, flat);
  removeField(draft.fields, override.path);
  for (const path of [...draft.positions.keys()]) if (isUnder(path, override.path)) draft.positions.delete(path);
  for (const [path, written] of flat.fields) draft.fields.set(path, written);
  for (const [path, position] of flat.positions) draft.positions.set(path, position);
  draft.problems.push(...flat.problems);
  if (flat.problems.length > 0) draft.positions.set(override.path, at);
}

/** The text as one value; only maps, lists and quoted texts are read as YAML, so that `>5 mV` needs no quotes within quotes. */
function valueOf(override: Override, draft: Draft): Node | null {
  const leaf: Leaf = { kind: 'leaf', text: override.text.trim(), at: { option: override.option } };
  if (!/^[[{"']/.test(leaf.text)) return leaf;
  const parsed = parseTree({ text: leaf.text, option: override.option });
  draft.problems.push(...parsed.problems);
  return parsed.ok ? (parsed.root ?? leaf) : null;
}

function forgetFaults(draft: Draft, path: string): void {
  const kept = draft.problems.filter((problem) => !isUnder(problem.place?.path ?? '', path));
  draft.problems.splice(0, draft.problems.length, ...kept);
}

/** A map of the file that an option replaces as a whole: what it held besides is told. */
function tellReplaced(draft: Draft, override: Override, flat: Flat): void {
  const inside = [...draft.fields.keys()].filter((path) => path !== override.path && isUnder(path, override.path));
  const lost = inside.filter((path) => !flat.fields.has(path) && isFromFile(draft.fields, path));
  const told = lost.flatMap((path) => {
    const text = leafText(draft.fields, path);
    return text === undefined ? [] : [`${path} ${text}`];
  });
  if (told.length > 0) draft.notes.push(`${asTyped(override.option, override.text)} replaces ${override.path}: ${told.join(', ')} dropped`);
}

/** `--gain 6`, `--set gain=6`. */
export function asTyped(option: string, text: string): string {
  return option.startsWith('--set ') ? `${option}=${text}` : `${option} ${text}`;
}
