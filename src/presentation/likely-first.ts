import type { JudgedPart } from '../screening/index.js';

/** The first few of the parts that cannot be decided, likely ones before others, each as they come: no more of them are looked at than tell. */
export function likelyFirst(undecided: readonly JudgedPart[], count: number): JudgedPart[] {
  const likely: JudgedPart[] = [];
  const others: JudgedPart[] = [];
  for (const one of undecided) {
    if (likely.length === count) break;
    if (one.likely) likely.push(one);
    else if (others.length < count) others.push(one);
  }
  return [...likely, ...others].slice(0, count);
}
