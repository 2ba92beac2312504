import type { Part } from '../parts/part.js';
import type { Digest, JudgedPart } from '../screening/index.js';
import type { Merit } from './merit.js';

/** What a merit is made of; a judged part has it, and so has one of which only the digests are known. */
export interface Weighed {
  readonly part: Pick<Part, 'price'>;
  readonly current: number | null;
  readonly verdicts: readonly Digest[];
}

/** What a place in the order depends on. */
export interface Placed extends Weighed {
  readonly part: Pick<Part, 'id' | 'tier' | 'price' | 'family'>;
  readonly proof: JudgedPart['proof'];
  readonly confirm: { readonly length: number };
  readonly merit: Pick<Merit, 'total'>;
}
