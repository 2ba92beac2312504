import type { BriefVerdict } from '../verdicts/decide.js';
import { shortness } from './nearest.js';

/** What the tally and the order need of a verdict; it holds for every part with the same pieces. */
export type Digest = Pick<BriefVerdict, 'check' | 'outcome' | 'basis' | 'standsOn' | 'margin' | 'spare'>;

/** How an answer counts in a part's sum: unknowns above, then what is not guaranteed, then failures. A check that does not apply adds nothing. */
export const COUNTS = { fail: 1, weak: 1 << 10, unknown: 1 << 20 } as const;

/** Verdicts of one check, by the number of the answer. */
export interface Digests {
  /** Null: the check does not apply. */
  add(verdict: BriefVerdict | null): number;
  /** The same for an answer whose number is known, unless it has its verdict already. */
  settle(answer: number, verdict: () => BriefVerdict | null): void;
  /** By answer: what it adds to the part's sum, and to its distance from fitting. */
  readonly counts: readonly number[];
  readonly distances: readonly number[];
  /** Passes only: nothing else is ranked. */
  readonly passes: readonly (Digest | null)[];
}

export function digests(nominalSupply: number): Digests {
  const counts: number[] = [];
  const distances: number[] = [];
  const passes: (Digest | null)[] = [];
  const put = (answer: number, verdict: BriefVerdict | null): number => {
    counts[answer] = verdict === null ? 0 : countOf(verdict);
    distances[answer] = verdict?.outcome === 'fail' ? shortness(verdict, nominalSupply) : 0;
    passes[answer] = verdict?.outcome === 'pass' ? digestOf(verdict) : null;
    return answer;
  };
  return {
    counts, distances, passes,
    add: (verdict) => put(counts.length, verdict),
    settle(answer, verdict) {
      if (counts[answer] === undefined) put(answer, verdict());
    },
  };
}

function countOf({ outcome, basis }: BriefVerdict): number {
  if (outcome === 'fail') return COUNTS.fail;
  if (outcome === 'unknown') return COUNTS.unknown;
  return basis === 'guaranteed' ? 0 : COUNTS.weak;
}

function digestOf({ check, outcome, basis, standsOn, margin, spare }: BriefVerdict): Digest {
  return { check, outcome, basis, standsOn, margin, spare };
}
