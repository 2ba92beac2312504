import { CHECKS, type AnyCheck } from '../checks/index.js';
import { CHECK_IDS, type Demands, type UnbuiltDemand } from '../demands/index.js';
import { classesOf } from '../parts/classes.js';
import type { Part, PartSource } from '../parts/part.js';
import type { ClassWorst, ReadingRules } from '../parts/reading.js';
import { readingsOf, type Readings } from '../parts/readings.js';
import { type BriefVerdict, decide, decideBriefly } from '../verdicts/decide.js';
import { standingOf } from '../verdicts/standing.js';
import type { Verdict } from '../verdicts/verdict.js';
import { batteryHours } from './battery.js';
import { completions } from './completion.js';
import type { JudgedPart, PartOutcome } from './judged-part.js';
import { confirmations } from './confirm.js';
import { dynamicRange } from './dynamic-range.js';
import { hazardsOf } from './hazards.js';
import type { BothReadings } from './remembering.js';

/** What stays the same for all parts of one run. */
export interface Judging {
  readonly demands: Demands;
  readonly strict: boolean;
  readonly classes: ReadonlyMap<string, ClassWorst>;
  /** Generic sets by class, to complete an undecided part with. */
  readonly sets: ReadonlyMap<string, readonly Part[]>;
}

/** Prepares one run: what can be borrowed from the generic sets among the parts. */
export function judging(demands: Demands, parts: readonly Part[], strict: boolean): Judging {
  const sets = new Map<string, Part[]>();
  for (const part of parts) {
    if (part.tier === 'generic' && part.class !== null) sets.set(part.class, [...(sets.get(part.class) ?? []), part]);
  }
  return { demands, strict, classes: classesOf(parts, demands.operating), sets };
}

/** The same for the parts of a source: what can be borrowed stands in its generic sets. */
export function judgingOf(demands: Demands, source: Pick<PartSource, 'parts' | 'screening'>, strict: boolean): Judging {
  return judging(demands, lendersOf(source), strict);
}

/** Parts of a source among which the generic sets are: those alone where they are kept apart, so that the others need not be read. */
export function lendersOf(source: Pick<PartSource, 'parts' | 'screening'>): readonly Part[] {
  return source.screening?.generic ?? source.parts;
}

/** Every check of one part; none stops another. `known`: whether it is likely, where that was found out before. */
export function judgePart(run: Judging, part: Part, known: Partial<Pick<JudgedPart, 'likely'>> = {}): JudgedPart {
  const verdicts = verdictsOf(run, part);
  const outcome = outcomeOf(verdicts);
  const worst = readingsOf({ part, ...rulesFor(run, part), outlook: 'pessimistic' });
  return {
    part,
    outcome,
    proof: outcome === 'fits' ? (verdicts.every((verdict) => verdict.basis === 'guaranteed') ? 'limits' : 'typical') : null,
    likely: outcome === 'undecided' && (known.likely ?? isLikely(run, part)),
    verdicts,
    deciding: decidingOf(verdicts, outcome),
    confirm: outcome === 'fits' ? confirmations(verdicts) : [],
    hazards: hazardsOf(part, run.demands),
    current: worst.figure('quiescentCurrent')?.value ?? null,
    dynamicRange: dynamicRange(run.demands, worst),
    batteryHours: batteryHours(run.demands, worst),
  };
}

/** The verdicts of one part in the order of the checks; `only` these checks where given. */
export function verdictsOf(run: Judging, part: Part, only?: ReadonlySet<string>): Verdict[] {
  const worst = readingsOf({ part, ...rulesFor(run, part), outlook: 'pessimistic' });
  const best = readingsOf({ part, ...rulesFor(run, part), outlook: 'optimistic' });
  const built = CHECKS.flatMap((check) => (only !== undefined && !only.has(check.id) ? [] : (verdictOn(check, run.demands, [worst, best]) ?? [])));
  const order = (verdict: Verdict): number => (CHECK_IDS as readonly string[]).indexOf(verdict.check);
  return [...built, ...(only === undefined ? run.demands.unbuilt.map(notBuilt) : [])].sort((a, b) => order(a) - order(b));
}

/** One check on the pessimistic and the optimistic readings of a part; null where it does not apply. */
export function verdictOn(check: AnyCheck, demands: Demands, [worst, best]: readonly [Readings, Readings]): Verdict | null {
  const pessimistic = check.judge(demands, worst);
  const optimistic = check.judge(demands, best);
  return pessimistic === null || optimistic === null ? null : decide(check, pessimistic, optimistic);
}

/** The same decision in numbers only; the readings should be brief. */
export function briefVerdictOn(check: AnyCheck, demands: Demands, readings: BothReadings): BriefVerdict | null {
  const pessimistic = check.judge(demands, readings.pessimistic);
  const optimistic = readings.differ() ? check.judge(demands, readings.optimistic) : pessimistic;
  return pessimistic === null || optimistic === null ? null : decideBriefly(check, pessimistic, optimistic);
}

/** How the figures of a part are read in this run. */
export function rulesFor(run: Judging, part: Part): ReadingRules {
  const classWorst = part.class === null ? null : (run.classes.get(part.class) ?? null);
  return { operating: run.demands.operating, strict: run.strict, classWorst };
}

/** A limit whose check does not exist leaves every part open. */
export function notBuilt(demand: UnbuiltDemand): Verdict {
  const finding = { kind: 'undecided', required: demand.required, unit: demand.unit, sense: demand.sense, cause: 'not-built', missing: [] } as const;
  return decide({ id: demand.check, title: demand.check.replaceAll('-', ' '), hasMargin: true }, finding, finding);
}

/** One failing check is enough; unknown is never a pass. */
export function outcomeOf(verdicts: readonly Verdict[]): PartOutcome {
  if (verdicts.some((verdict) => verdict.outcome === 'fail')) return 'does-not-fit';
  return verdicts.some((verdict) => verdict.outcome === 'unknown') ? 'undecided' : 'fits';
}

function decidingOf(verdicts: readonly Verdict[], outcome: PartOutcome): string[] {
  const decisive = outcome === 'undecided' ? 'unknown' : 'fail';
  return verdicts.filter((verdict) => verdict.outcome === decisive).map(({ check }) => check);
}

/** Likely, of an undecided part: with every missing figure taken from its class, each generic set of the class in turn, all checks would pass. */
export function isLikely(run: Judging, part: Part): boolean {
  if (run.demands.unbuilt.length > 0 || run.strict) return false;
  const completed = completions(part, part.class === null ? [] : (run.sets.get(part.class) ?? []));
  return completed.length > 0 && completed.every((whole) => passes(run, readingsOf({ part: whole, ...rulesFor(run, whole), outlook: 'pessimistic', brief: true })));
}

function passes(run: Judging, readings: Readings): boolean {
  return CHECKS.every((check) => {
    const finding = check.judge(run.demands, readings);
    return finding === null || standingOf(finding) === 'pass';
  });
}
