import type { Missing, Term } from '../verdicts/finding.js';

/** One cause of distortion: its terms as fractions of the fundamental, what is missing to know it, and what is to be said. */
export interface DistortionPart {
  readonly terms: readonly Term[];
  readonly missing: readonly Missing[];
  readonly cautions: readonly string[];
}

export const NONE: DistortionPart = { terms: [], missing: [], cautions: [] };

/** Several causes as one. */
export function together(parts: readonly DistortionPart[]): DistortionPart {
  return {
    terms: parts.flatMap(({ terms }) => terms),
    missing: parts.flatMap(({ missing }) => missing),
    cautions: parts.flatMap(({ cautions }) => cautions),
  };
}
