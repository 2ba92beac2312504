/** What a number stands on, strongest first. */
export const BASES = ['guaranteed', 'derated', 'estimated', 'assumed', 'borrowed'] as const;
export type Basis = (typeof BASES)[number];

/** Place of a basis in that order: the larger, the weaker. */
export function weaknessOf(basis: Basis): number {
  return WEAKNESS[basis];
}

const WEAKNESS = Object.fromEntries(BASES.map((basis, place) => [basis, place])) as Record<Basis, number>;

/** The weaker of two. */
export function weaker(one: Basis, other: Basis): Basis {
  return weaknessOf(other) > weaknessOf(one) ? other : one;
}

/** The weakest of several bases; `guaranteed` for none. */
export function weakest(bases: readonly Basis[]): Basis {
  let weak = 0;
  for (const basis of bases) weak = Math.max(weak, weaknessOf(basis));
  return BASES[weak] ?? 'guaranteed';
}
