import { PARAMETERS } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { judgePart, verdictsOf, type JudgedPart, type Judging } from '../screening/index.js';
import { candidatesOf, isBeyondLists, type Candidate } from './candidates.js';
import { endsOf, isMoreBetter, spanOf } from './span.js';
import { isIdentity, supposed, type Answer } from './supposed.js';

/** A figure with an answer that would do. */
export interface Answered {
  readonly candidate: Candidate;
  readonly answer: Answer;
}

/** The smallest set of figures found that closes every check a list can close. */
export interface Settled {
  /** With answers with which, together, every check but `remains` passes; empty when no answers were found. */
  readonly answers: readonly Answered[];
  /** Checks that stay open whatever is looked up. */
  readonly remains: readonly string[];
  /** What open checks name, when no answers were found. */
  readonly named: readonly Candidate[];
}

/** What a search over one undecided part needs. */
export interface Settling {
  readonly run: Judging;
  /** The whole catalog, for the spans. */
  readonly parts: readonly Part[];
}

/**
 * Which figures to look up: all candidates at good values first, then each is left out again while the part still passes. What
 * checks name themselves is left out last.
 */
export function settle(settling: Settling, judged: JudgedPart): Settled {
  const { run } = settling;
  const remains = judged.verdicts.filter(isBeyondLists).map(({ check }) => check);
  const candidates = candidatesOf(judged, run.demands);
  const lowest = candidatesOf(judged, run.demands, 'lowest');
  const passes = (answers: readonly Answered[]): boolean => passesWith(run, told(judged.part, answers), { remains });
  const start = [candidates, lowest].flatMap((all) => [...attempts(all.filter(({ named }) => named), settling, judged.part), ...attempts(all, settling, judged.part)]).find(passes);
  if (start === undefined) return { answers: [], remains, named: candidates.filter(({ named }) => named) };
  let kept = start;
  for (const one of [...start].reverse()) {
    const without = kept.filter((other) => other !== one);
    if (passes(without)) kept = without;
  }
  return { answers: kept, remains, named: [] };
}

/** The part with these answers in its list. */
export function told(part: Part, answers: readonly Answered[]): Part {
  return answers.reduce((known, { candidate, answer }) => supposed(known, candidate, answer), part);
}

export interface PassingChecks {
  readonly remains: readonly string[];
  readonly only?: ReadonlySet<string>;
}

/** Every check passes but those that nothing closes; `only` these checks where given. */
export function passesWith(run: Judging, part: Part, { remains, only }: PassingChecks): boolean {
  return verdictsOf(run, part, only).every(({ check, outcome }) => outcome === 'pass' || remains.includes(check));
}

/** The part judged with these answers. */
export const judgedWith = (run: Judging, part: Part, answers: readonly Answered[]): JudgedPart => judgePart(run, told(part, answers));

/** Good values in three strengths: near what the checks ask, the best of the class or catalog, and far better than what they ask. */
function attempts(candidates: readonly Candidate[], settling: Settling, part: Part): Answered[][] {
  const all = (value: (candidate: Candidate) => Answer | null): Answered[] =>
    candidates.flatMap((candidate) => {
      const answer = candidate.wanted !== null && isIdentity(candidate.figure) ? candidate.wanted : value(candidate);
      return answer === null ? [] : [{ candidate, answer }];
    });
  const best = (candidate: Candidate): number | null => bestOf(candidate, settling, part);
  return [all((candidate) => nearGuess(candidate) ?? best(candidate)), all((candidate) => best(candidate) ?? nearGuess(candidate)), all((candidate) => nearGuess(candidate, FAR) ?? best(candidate))];
}

const NEAR = 0.8;
const FAR = 0.1;

/** Somewhat better than where the check turns. */
function nearGuess({ figure, kind, guess }: Candidate, share = NEAR): number | null {
  if (guess === null || isIdentity(figure)) return null;
  const step = Math.abs(guess) * (1 - share);
  if (isMoreBetter(figure, kind)) return guess >= 0 && PARAMETERS[figure].unit !== '°C' ? guess / share : guess + step;
  return guess - step;
}

function bestOf({ figure, kind }: Candidate, { parts }: Settling, part: Part): number | null {
  if (isIdentity(figure)) return null;
  const span = spanOf(figure, kind, { part, parts });
  return span === null ? null : endsOf(span, isMoreBetter(figure, kind)).best;
}
