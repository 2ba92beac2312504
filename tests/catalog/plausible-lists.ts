import type { GuardName } from '../../src/catalog/index.js';
import type { ReadList } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { writeList } from '../../src/intake/write-list.js';
import type { Part } from '../../src/parts/part.js';
import { plausibleParts } from '../bench/plausible-part.js';
import { dice } from '../simulate/random.js';

/** Every guard let pass: these lists change what they like. */
export const ANY = { accept: new Set<GuardName>(['removed', 'scaled', 'lifecycle', 'older']) };

export function plausible(seed: number, count: number): Part[] {
  const parts = plausibleParts(dice(seed, 0));
  return Array.from({ length: count }, () => parts.next().value as Part);
}

/** The parts as a list somebody sends. */
export function listOf(parts: readonly Part[], file: string): ReadList {
  const read = readList(new TextEncoder().encode(writeList(parts, { raw: true })), { file, tier: 'approved' });
  if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join('\n'));
  return read;
}

/** The next list of the same team: the first `kept` as they were, up to `changed` with the figures of another, the others gone, and those beyond `fresh` new. */
export function nextList(first: readonly Part[], others: readonly Part[], { kept, changed, fresh }: { readonly kept: number; readonly changed: number; readonly fresh: number }): Part[] {
  return [
    ...first.slice(0, kept),
    ...first.slice(kept, changed).map((part, at) => ({ ...part, figures: others[at]!.figures })),
    ...others.slice(fresh).map((part) => ({ ...part, id: `NEW-${part.id}` })),
  ];
}
