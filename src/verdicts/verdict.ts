import type { Basis } from '../parts/basis.js';
import type { Cause, Missing, Remarks, Sense, Term, TurningPoint } from './finding.js';

export type Outcome = 'pass' | 'fail' | 'unknown';

/** Why a verdict is unknown. */
export type Reason = Cause | 'typical-only' | 'estimated' | 'assumed' | 'borrowed';

/**
 * One check of one part, decided on both readings. Numbers in SI units. `required` and `offered` show the pessimistic reading
 * for pass and unknown, the optimistic one for fail; `offeredBest` the other.
 */
export interface Verdict extends Remarks {
  readonly check: string;
  readonly title: string;
  readonly outcome: Outcome;
  readonly required: number | readonly string[] | null;
  readonly offered: number | string | null;
  readonly offeredBest: number | string | null;
  /** Checks over vertices only: the other reading at the vertex shown; `offeredBest` stands at the vertex worst for it. */
  readonly otherThere?: number | null;
  readonly unit: string | null;
  readonly sense: Sense | 'one-of' | null;
  /** Ratio to the limit, 1 = met exactly; null for head-rooms, temperatures and words. */
  readonly margin: number | null;
  /** What is left, in the unit of the check; negative when short. Null for words and when nothing is offered. */
  readonly spare: number | null;
  /** Null when unknown. */
  readonly basis: Basis | null;
  /** Basis of the numbers shown, also when unknown; for explanations. */
  readonly standsOn: Basis | null;
  readonly worstAt: Readonly<Record<string, number>> | null;
  readonly terms: readonly Term[];
  readonly rss: number | null;
  /** The part of the offered value that is known when the whole is not. */
  readonly known: number | null;
  readonly reason: Reason | null;
  readonly missing: readonly Missing[];
  readonly decidesAt: TurningPoint | null;
  /** Where the figure that decides would turn it, whatever the outcome; for confirmations. */
  readonly turnsAt: TurningPoint | null;
  readonly cautions: readonly string[];
  readonly slot: string | null;
  readonly how: string | null;
}
