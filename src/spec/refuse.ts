import type { Draft } from './draft.js';
import type { Complaint } from './problems.js';
import { problemAt, problemIn } from './problems.js';
import { field, howToWrite } from './schema.js';
import type { Position } from './spec.js';
import { isUnder, removeField, type Leaf } from './tree.js';

/** Notes a problem at a field, with its text when it has one; always undefined, so that a reader can return it. */
export function refuse(draft: Draft, path: string, complaint: Complaint & { readonly span?: readonly [number, number] }): undefined {
  const leaf = leafAt(draft, path);
  const spot = { path, at: positionOf(draft, path), file: draft.file };
  draft.problems.push(leaf === undefined ? problemAt(spot, complaint) : problemIn(leaf, spot, complaint));
  return undefined;
}

/** Notes S102 for a field that is not there, at the map that should hold it; the fix is a line, or an option when options do the talking. */
export function refuseAbsent(draft: Draft, path: string, example?: string): undefined {
  if (isOffered(draft, path)) return undefined;
  const asLine = draft.hasFile && positionOf(draft, path).option === undefined;
  return refuse(draft, path, { code: 'S102', message: `${path} is missing; accepted: ${field(path).accepted}`, fix: howToWrite(path, asLine, example) });
}

/** True for what a misspelt key was told to be, and for all under it: it is not missing besides. */
export function isOffered(draft: Draft, path: string): boolean {
  return draft.problems.some(({ code, fix, place }) => {
    if (code !== 'S101' || fix === undefined || place?.path === undefined) return false;
    const level = place.path.slice(0, place.path.lastIndexOf('.') + 1);
    return isUnder(path, fix.includes('.') ? fix : level + fix);
  });
}

/** Notes S108 at a field that is written, and takes it out of the draft. */
export function stranger(draft: Draft, path: string, reason: { readonly message: string; readonly fix: string }): void {
  if (!draft.fields.has(path)) return;
  refuse(draft, path, { code: 'S108', ...reason });
  removeField(draft.fields, path);
}

/** Where a field is written; a missing one stands where the map around it does. */
function positionOf(draft: Draft, path: string): Position {
  const at = draft.positions.get(path);
  if (at !== undefined || !path.includes('.')) return at ?? {};
  return positionOf(draft, path.slice(0, path.lastIndexOf('.')));
}

export function leafAt(draft: Draft, path: string): Leaf | undefined {
  const node = draft.fields.get(path);
  return node?.kind === 'leaf' ? node : undefined;
}
