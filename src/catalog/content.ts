import { createHash } from 'node:crypto';
import type { Part } from '../parts/part.js';

/** SHA-256 over the content of the parts of one tier: rows of `partToRow` as JSON in `contentOrder`. Independent of file, line and time. */
export interface ContentHasher {
  add(content: string): void;
  digest(): string;
}

export function contentHasher(): ContentHasher {
  const hash = createHash('sha256');
  return {
    add: (content) => void hash.update(`${content}\n`),
    digest: () => hash.digest('hex'),
  };
}

/** Indices of the parts in the order their content is hashed in, whatever their order in the list: rows as JSON text, which start with tier and id. */
export function contentOrder(parts: readonly Pick<Part, 'id'>[]): number[] {
  const keys = parts.map(({ id }) => JSON.stringify(id));
  const keyOf = (index: number): string => keys[index] ?? '';
  return parts.map((_, index) => index).sort((a, b) => (keyOf(a) < keyOf(b) ? -1 : Number(keyOf(a) > keyOf(b))));
}

/** SHA-256 over what is in force: the content of both tiers. */
export function catalogHash(approved: string | null, generic: string | null): string {
  return createHash('sha256').update(`approved ${approved ?? 'none'}\ngeneric ${generic ?? 'none'}\n`).digest('hex');
}
