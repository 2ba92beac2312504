import type { Placed } from './placed.js';

/** What tells whether two parts share a line. */
interface Member {
  readonly part: Pick<Placed['part'], 'tier' | 'family'>;
  readonly proof: Placed['proof'];
}

/** A line of the shortlist: the first of a family in the order, and its other packages and channel counts behind it. */
export interface Line<P extends Member> {
  readonly first: P;
  readonly variants: readonly P[];
}

/** Package and channel variants of one die stand in one line, at the place of the first; parts without a family stand alone. */
export function linesOf<P extends Member>(ordered: readonly P[]): Line<P>[] {
  const lines = new Map<string, { first: P; variants: P[] }>();
  for (const [at, one] of ordered.entries()) {
    const key = familyKey(one) ?? `alone ${at}`;
    const line = lines.get(key);
    if (line === undefined) lines.set(key, { first: one, variants: [] });
    else line.variants.push(one);
  }
  return [...lines.values()];
}

/** A family holds within a tier and a proof: a variant that is only typical must not hide behind one that is proven. */
export function familyKey({ part, proof }: Member): string | null {
  return part.family === null ? null : JSON.stringify([part.tier, proof, part.family]);
}
