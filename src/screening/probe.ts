import { CHECKS, type AnyCheck } from '../checks/index.js';
import { CHECK_IDS } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import { readingsOf } from '../parts/readings.js';
import { decide } from '../verdicts/decide.js';
import type { Finding } from '../verdicts/finding.js';
import type { Outcome } from '../verdicts/verdict.js';
import { costOf } from './cost.js';
import { rulesFor, type Judging } from './judge.js';

/** One check of one part as both readings find it. */
export interface Probed {
  readonly outcome: Outcome;
  /** The pessimistic reading: what a pass must stand on. */
  readonly worst: Finding;
}

/** One part on one stage, each check judged when it is first asked for. */
export interface Probe {
  /** Null when the check is not asked of this stage or this part. */
  check(id: string): Probed | null;
  /** Ids of the checks that do not pass, in their order; a limit without a check of its own never does. */
  notPassing(): string[];
  fits(): boolean;
}

const CHEAP_FIRST: readonly string[] = CHECKS.map(({ id }) => id).sort((a, b) => costOf(a) - costOf(b));

/** Judges as `judgePart` does, check by check. */
export function probePart(run: Judging, part: Part): Probe {
  const rules = rulesFor(run, part);
  const worst = readingsOf({ part, ...rules, outlook: 'pessimistic' });
  const best = readingsOf({ part, ...rules, outlook: 'optimistic' });
  const known = new Map<string, Probed | null>();
  const judge = (check: AnyCheck): Probed | null => {
    const pessimistic = check.judge(run.demands, worst);
    const optimistic = check.judge(run.demands, best);
    return pessimistic === null || optimistic === null ? null : { outcome: decide(check, pessimistic, optimistic).outcome, worst: pessimistic };
  };
  const check = (id: string): Probed | null => {
    const found = CHECKS.find((one) => one.id === id);
    if (!known.has(id)) known.set(id, found === undefined ? null : judge(found));
    return known.get(id) ?? null;
  };
  const passes = (id: string): boolean => (check(id)?.outcome ?? 'pass') === 'pass';
  const unbuilt = run.demands.unbuilt.map((demand) => demand.check);
  return {
    check,
    notPassing: () => CHECK_IDS.filter((id) => unbuilt.includes(id) || !passes(id)),
    fits: () => unbuilt.length === 0 && CHEAP_FIRST.every(passes),
  };
}
