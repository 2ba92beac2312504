/** What a number stands on, strongest first. */
export const BASES = ['guaranteed', 'derated', 'estimated', 'assumed', 'borrowed'] as const;
export type Basis = (typeof BASES)[number];

/** The weakest of several bases; `guaranteed` for none. */
export function weakest(bases: readonly Basis[]): Basis {
  let weak = 0;
  for (const basis of bases) weak = Math.max(weak, BASES.indexOf(basis));
  return BASES[weak] ?? 'guaranteed';
}
