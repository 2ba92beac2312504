import { createHash } from 'node:crypto';
import type { Part } from '../parts/part.js';
import { partToRow } from './part-row.js';

/** Everything of a part that can change an answer, as text: equal texts are equal parts. Independent of file, line and time. */
export function partContent(part: Part): string {
  return JSON.stringify(partToRow(part));
}

/** SHA-256 over the content of the parts of one tier, whatever their order. */
export function contentHash(contents: readonly string[]): string {
  const hash = createHash('sha256');
  for (const content of [...contents].sort()) hash.update(content).update('\n');
  return hash.digest('hex');
}

/** SHA-256 over what is in force: the content of both tiers. */
export function catalogHash(approved: string | null, generic: string | null): string {
  return createHash('sha256').update(`approved ${approved ?? 'none'}\ngeneric ${generic ?? 'none'}\n`).digest('hex');
}
