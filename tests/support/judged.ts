import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { judgePart, judging, type JudgedPart } from '../../src/screening/index.js';
import type { StageSpec } from '../../src/spec/spec.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { partOf } from './parts.js';
import { demandsOf } from './stages.js';

/** How a run differs from the ordinary one: `--strict`, generic sets to borrow from, and more of the part than figures. */
export interface Run {
  readonly strict?: boolean;
  readonly sets?: readonly Part[];
  readonly identity?: Partial<Part>;
}

export function judged(spec: StageSpec, figures: readonly Figure[], run: Run = {}): JudgedPart {
  return judgePart(judging(demandsOf(spec), run.sets ?? [], run.strict ?? false), partOf(figures, run.identity));
}

/** One verdict; null when the check is not asked of this stage or this part. */
export function verdictOrNull(check: string, spec: StageSpec, figures: readonly Figure[], run: Run = {}): Verdict | null {
  return judged(spec, figures, run).verdicts.find((verdict) => verdict.check === check) ?? null;
}

/** One check as a function of stage and figures: what most tests of a check ask. */
export function judgingBy(check: string): (spec: StageSpec, figures: readonly Figure[], run?: Run) => Verdict {
  return (spec, figures, run) => {
    const verdict = verdictOrNull(check, spec, figures, run);
    if (verdict === null) throw new Error(`${check} has no verdict here`);
    return verdict;
  };
}
