import { plainCommand, type Part, type PartSource } from '../index.js';
import type { WithdrawnPart } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { foldId, suggest } from '../quantities/suggest.js';
import { commandProblem } from './request-error.js';

export type FoundPart = { readonly ok: true; readonly part: Part } | { readonly ok: false; readonly problem: Problem };

/** A part by its id, exactly; look-alikes and near misses are offered, never acted on. One that was withdrawn is told as such. */
export function findPart(source: Pick<PartSource, 'parts' | 'screening'>, id: string, withdrawn: (id: string) => WithdrawnPart | null = () => null): FoundPart {
  const part = source.screening === undefined ? source.parts.find((one) => one.id === id) : source.screening.find(id);
  if (part != null) return { ok: true, part };
  const was = withdrawn(id);
  if (was !== null) return { ok: false, problem: commandProblem('C113', `${id} ${withdrawnWords(was)}`, { fix: `${plainCommand('part', id)} shows it as it was last`, path: 'PART' }) };
  const ids = source.parts.map((one) => one.id);
  const alike = ids.filter((one) => foldId(one) === foldId(id));
  const near = [...new Set([...alike, ...suggest(id, ids)])].slice(0, 3);
  const fix = near.length === 0 ? 'railfit parts lists the catalog' : `did you mean ${near.join(', ')}?`;
  return { ok: false, problem: commandProblem('C108', `no part ${id} in the catalog`, { fix, path: 'PART' }) };
}

/** Why a part is on the list no more. */
export function withdrawnWords({ by, takenBack }: WithdrawnPart): string {
  return takenBack ? `was on ${by.file}, an import that was taken back` : `was withdrawn: ${by.file} no longer has it`;
}
