import type { Demands } from '../demands/index.js';
import type { Parameter } from '../parts/figures.js';
import type { Identity, Readings } from '../parts/readings.js';
import type { Finding } from '../verdicts/finding.js';

/**
 * The contract of a check. It says what the stage asks, reads figures that are already resolved into one outlook, and hands
 * back numbers side by side. It never says pass or fail, and never knows which outlook it is judging.
 */
export interface Check<Asked> {
  /** File name and id. */
  readonly id: string;
  /** The trade's term, as a line of text begins with it. */
  readonly title: string;
  readonly unit: string | null;
  /** Figures whose values decide it: a finding depends on nothing else of the part. */
  readonly reads: readonly (Parameter | keyof Identity)[];
  readonly hasMargin: boolean;
  /** What the stage asks; null: nothing. */
  asks(demands: Demands): Asked | null;
  /** Null when the check does not apply to this part (generic sets have no status). */
  judge(asked: Asked, readings: Readings): Finding | null;
}

/** A check with its question bound inside, so that all checks have one type. */
export interface AnyCheck {
  readonly id: string;
  readonly title: string;
  readonly unit: string | null;
  readonly reads: readonly string[];
  readonly hasMargin: boolean;
  isAsked(demands: Demands): boolean;
  /** What the stage asks, to be held against what another stage asks; null: nothing. */
  asked(demands: Demands): unknown;
  judge(demands: Demands, readings: Readings): Finding | null;
}

export function seal<Asked>(check: Check<Asked>): AnyCheck {
  const { id, title, unit, reads, hasMargin } = check;
  return {
    id, title, unit, reads, hasMargin,
    isAsked: (demands) => check.asks(demands) !== null,
    asked: (demands) => check.asks(demands),
    judge: (demands, readings) => {
      const asked = check.asks(demands);
      return asked === null ? null : check.judge(asked, readings);
    },
  };
}
