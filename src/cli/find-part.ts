import type { Part } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { foldId, suggest } from '../quantities/suggest.js';
import { commandProblem } from './request-error.js';

/** A part by its id, exactly; look-alikes and near misses are offered, never acted on. */
export function findPart(parts: readonly Part[], id: string): { ok: true; part: Part } | { ok: false; problem: Problem } {
  const part = parts.find((one) => one.id === id);
  if (part !== undefined) return { ok: true, part };
  const ids = parts.map((one) => one.id);
  const alike = ids.filter((one) => foldId(one) === foldId(id));
  const near = [...new Set([...alike, ...suggest(id, ids)])].slice(0, 3);
  const fix = near.length === 0 ? 'railfit parts lists the catalog' : `did you mean ${near.join(', ')}?`;
  return { ok: false, problem: commandProblem('C108', `no part ${id} in the catalog`, { fix, path: 'PART' }) };
}
