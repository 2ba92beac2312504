import type { Part } from '../parts/part.js';

/** The part with every figure it lacks taken from its class: one whole part per generic set of the class. */
export function completions(part: Part, sets: readonly Part[]): Part[] {
  const known = new Set(part.figures.map((figure) => figure.parameter));
  return sets.map((set) => ({ ...part, figures: [...part.figures, ...set.figures.filter((figure) => !known.has(figure.parameter))] }));
}
