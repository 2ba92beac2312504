import { CHECKS, type AnyCheck } from '../checks/index.js';
import { CHECK_IDS, markOf, type Demands } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import { readingsOf, type Readings } from '../parts/readings.js';
import { decide } from '../verdicts/decide.js';
import type { Verdict } from '../verdicts/verdict.js';
import { confirmations } from './confirm.js';
import { costOf, isDear } from './cost.js';
import { hearing, hearsTheSame, type Heard } from './hearing.js';
import { judging, notBuilt, outcomeOf, rulesFor, type Judging } from './judge.js';
import type { JudgedPart, PartOutcome } from './judged-part.js';

/** The answer to one stage in short: how many parts fit, and those with what their order needs. */
export interface Outlined {
  readonly counts: { readonly parts: number; readonly fit: number; readonly undecided: number; readonly rejected: number };
  /** Without hazards, dynamic range and battery life, which no order asks for. */
  readonly fit: readonly JudgedPart[];
}

/** Demands with the mark of the circuit they belong to (`circuitMark`). */
export interface Marked {
  readonly demands: Demands;
  readonly circuit: string;
}

/**
 * Judges the same parts for many stages in a row, with the verdicts of `judgePart`: a part that fails is left at its first failing
 * check, and what a check asked of a part before, in the same surroundings, is not asked again.
 */
export function outlining(parts: readonly Part[], strict: boolean): (of: Marked) => Outlined {
  const memories = parts.map((part): Memory => ({ part, known: new Map(), failed: null }));
  let before: Run | null = null;
  return ({ demands, circuit }) => {
    const surroundings = markOf(demands.operating, '');
    const run: Run = before?.surroundings === surroundings ? { ...before, demands } : { ...judging(demands, parts, strict), surroundings };
    before = run;
    return outlined(run, memories, asks(demands, circuit));
  };
}

/** With a mark of what figures are read for. */
type Run = Judging & { readonly surroundings: string };

/** What is known of a part from the stages before. */
interface Memory {
  readonly part: Part;
  readonly known: Map<string, Known>;
  /** The check it failed last: asked first. */
  failed: string | null;
}

/** The answer of one check: what was asked, in which surroundings, what it read (slow checks only), and its verdict. */
interface Known {
  readonly mark: string;
  readonly surroundings: string;
  readonly heard: readonly [worst: readonly Heard[], best: readonly Heard[]] | null;
  readonly verdict: Verdict | null;
}

/** A check with the mark of what the stage asks. */
interface Asked {
  readonly check: AnyCheck;
  readonly mark: string;
}

const QUICK_FIRST: readonly AnyCheck[] = [...CHECKS].sort((a, b) => costOf(a.id) - costOf(b.id));

function asks(demands: Demands, circuit: string): Asked[] {
  return QUICK_FIRST.filter((check) => check.isAsked(demands)).map((check) => ({ check, mark: markOf(check.asked(demands), circuit) }));
}

function outlined(run: Run, memories: readonly Memory[], asked: readonly Asked[]): Outlined {
  const judged = memories.map((memory) => outline(run, memory, asked));
  const number = (outcome: PartOutcome): number => judged.filter((one) => one.outcome === outcome).length;
  const counts = { parts: memories.length, fit: number('fits'), undecided: number('undecided'), rejected: number('does-not-fit') };
  return { counts, fit: judged.flatMap(({ outcome, part }) => (outcome === 'fits' && part !== null ? [part] : [])) };
}

interface Outline {
  readonly outcome: PartOutcome;
  /** Fits only. */
  readonly part: JudgedPart | null;
}

function outline(run: Run, memory: Memory, asked: readonly Asked[]): Outline {
  const ask = answers(run, memory);
  const verdicts: Verdict[] = [];
  for (const one of failedFirst(asked, memory.failed)) {
    const verdict = ask(one);
    if (verdict?.outcome === 'fail') {
      memory.failed = verdict.check;
      return { outcome: 'does-not-fit', part: null };
    }
    if (verdict !== null) verdicts.push(verdict);
  }
  const all = [...verdicts, ...run.demands.unbuilt.map(notBuilt)];
  const outcome = outcomeOf(all);
  return { outcome, part: outcome === 'fits' ? forTheOrder(run, memory.part, inOrder(all)) : null };
}

function failedFirst(asked: readonly Asked[], failed: string | null): readonly Asked[] {
  if (failed === null) return asked;
  const isIt = ({ check }: Asked): boolean => check.id === failed;
  return [...asked.filter(isIt), ...asked.filter((one) => !isIt(one))];
}

/** Asks one check of one part, or remembers; null: the check does not apply to it. */
function answers(run: Run, { part, known }: Memory): (one: Asked) => Verdict | null {
  let both: Both | null = null;
  const readings = (): Both => (both ??= [readingsOf({ part, ...rulesFor(run, part), outlook: 'pessimistic' }), readingsOf({ part, ...rulesFor(run, part), outlook: 'optimistic' })]);
  return ({ check, mark }) => {
    const before = known.get(check.id);
    if (before?.mark === mark && (before.surroundings === run.surroundings || isHeardAgain(before, readings()))) return before.verdict;
    const answer = judged(check, run, readings());
    known.set(check.id, { mark, surroundings: run.surroundings, ...answer });
    return answer.verdict;
  };
}

type Both = readonly [worst: Readings, best: Readings];

const isHeardAgain = ({ heard }: Known, [worst, best]: Both): boolean => heard !== null && hearsTheSame(heard[0], worst) && hearsTheSame(heard[1], best);

/** A slow check is listened to: where it would read the same again, it would find the same again. */
function judged(check: AnyCheck, { demands }: Run, [worst, best]: Both): Pick<Known, 'heard' | 'verdict'> {
  const heard: [Heard[], Heard[]] | null = isDear(check.id) ? [[], []] : null;
  const pessimistic = check.judge(demands, heard === null ? worst : hearing(worst, heard[0]));
  const optimistic = check.judge(demands, heard === null ? best : hearing(best, heard[1]));
  return { heard, verdict: pessimistic === null || optimistic === null ? null : decide(check, pessimistic, optimistic) };
}

function inOrder(verdicts: readonly Verdict[]): Verdict[] {
  const place = ({ check }: Verdict): number => (CHECK_IDS as readonly string[]).indexOf(check);
  return [...verdicts].sort((a, b) => place(a) - place(b));
}

function forTheOrder(run: Judging, part: Part, verdicts: readonly Verdict[]): JudgedPart {
  const worst = readingsOf({ part, ...rulesFor(run, part), outlook: 'pessimistic' });
  return {
    part,
    outcome: 'fits',
    proof: verdicts.every(({ basis }) => basis === 'guaranteed') ? 'limits' : 'typical',
    likely: false,
    verdicts,
    confirm: confirmations(verdicts),
    hazards: [],
    current: worst.figure('quiescentCurrent')?.value ?? null,
    dynamicRange: null,
    batteryHours: null,
  };
}
