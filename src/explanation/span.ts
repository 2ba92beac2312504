import type { LimitKind, Parameter } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { bestPossible } from '../parts/select.js';

/** Least and most of one figure as the catalog prints it, over a class or the whole catalog. SI. */
export interface Span {
  readonly least: number;
  readonly most: number;
  /** Parts that have it. */
  readonly parts: number;
  /** Null: no part of the class has it, or the part has no class; then of all parts of its tier, else of all. */
  readonly class: string | null;
}

/** Whether more of a figure is better: an end a part endures, a rate, a gain; less of a burden. */
export const isMoreBetter = (parameter: Parameter, kind: LimitKind | null): boolean => bestPossible({ parameter, kind: kind ?? 'typ' }) > 0;

/** Where a figure lies among the parts: those of the class first, else those of the tier, else all. Null when none has it. */
export function spanOf(parameter: Parameter, kind: LimitKind | null, { part, parts }: { readonly part: Part; readonly parts: readonly Part[] }): Span | null {
  const others = parts.filter(({ id }) => id !== part.id);
  const alike = part.class === null ? [] : others.filter((one) => one.class === part.class);
  return (
    within(alike, { parameter, kind }, part.class) ??
    within(others.filter(({ tier }) => tier === part.tier), { parameter, kind }, null) ??
    within(others, { parameter, kind }, null)
  );
}

interface Wanted {
  readonly parameter: Parameter;
  readonly kind: LimitKind | null;
}

/** Figures of the same kind where any part has one; what was assumed was not printed. */
function within(parts: readonly Part[], { parameter, kind }: Wanted, name: string | null): Span | null {
  const figuresOf = (same: boolean): number[][] =>
    parts.map(({ figures }) => figures.filter((one) => one.parameter === parameter && one.assumed !== true && (!same || one.kind === kind)).map(({ value }) => value)).filter((values) => values.length > 0);
  const same = figuresOf(true);
  const counted = same.length > 0 ? same : figuresOf(false);
  if (counted.length === 0) return null;
  const values = counted.flat();
  return { least: Math.min(...values), most: Math.max(...values), parts: counted.length, class: name };
}

/** The end of a span that suits the stage most, and the one that suits it least. */
export function endsOf({ least, most }: Span, moreIsBetter: boolean): { readonly best: number; readonly worst: number } {
  return moreIsBetter ? { best: most, worst: least } : { best: least, worst: most };
}
