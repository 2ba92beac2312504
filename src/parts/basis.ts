/** What a number stands on, strongest first. */
export const BASES = ['guaranteed', 'derated', 'estimated', 'assumed', 'borrowed'] as const;
export type Basis = (typeof BASES)[number];

/** The weakest of several bases; `guaranteed` for none. */
export function weakest(bases: readonly Basis[]): Basis {
  return BASES[Math.max(0, ...bases.map((basis) => BASES.indexOf(basis)))] ?? 'guaranteed';
}
