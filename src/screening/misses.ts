import type { PartSource } from '../parts/part.js';
import type { BriefVerdict } from '../verdicts/decide.js';
import { answersIn, type Answers, type AskedOf, countAt } from './deciding.js';
import { COUNTS } from './digest.js';
import { judgePart, type Judging, judgingOf } from './judge.js';
import type { JudgedPart } from './judged-part.js';
import { checkQuestions, currentQuestion } from './question.js';
import type { Marked } from './screen-views.js';
import { OUTCOME, survey } from './survey.js';

/** A part that does not fit or cannot be decided, by what it does not pass. */
export interface Miss {
  /** Checks that fail; none of a part that cannot be decided. */
  readonly fails: readonly string[];
  /** Checks that fail or are open. */
  readonly unmet: readonly string[];
  /** In numbers, one of these, until the next miss is come to; null: it is none of them. */
  verdict(check: string): BriefVerdict | null;
  /** In words; of few of a long list. */
  judged(): JudgedPart;
}

/** Parts judged in words already. */
export function judgedMisses(judged: readonly JudgedPart[]): Miss[] {
  return judged.map((one) => {
    const open = one.verdicts.filter(({ outcome }) => outcome !== 'pass');
    return {
      fails: open.filter(({ outcome }) => outcome === 'fail').map(({ check }) => check),
      unmet: open.map(({ check }) => check),
      verdict: (check) => open.find((verdict) => verdict.check === check) ?? null,
      judged: () => one,
    };
  });
}

/**
 * The parts of a source with views that do not fit, then those that cannot be decided, each in the order of the catalog: told from what the survey
 * knows, without reading them. Can be gone through again and again, whatever other stage is asked in between; nothing of a part is kept.
 */
export function surveyedMisses({ demands, circuit }: Marked, source: PartSource, strict: boolean): Iterable<Miss> {
  const run = judgingOf(demands, source, strict);
  const views = (source.screening?.views ?? []).filter(({ size }) => size > 0);
  const surveyed = views.map((view): Surveyed => ({
    run,
    outcomes: survey(run, view, { circuit }).outcomes,
    asked: { view, questions: checkQuestions(run, view, { circuit }), current: currentQuestion(run, view) },
  }));
  return {
    * [Symbol.iterator]() {
      for (const outcome of [OUTCOME.rejected, OUTCOME.undecided]) for (const one of surveyed) yield* missesIn(one, outcome);
    },
  };
}

interface Surveyed {
  readonly run: Judging;
  readonly outcomes: Uint8Array;
  readonly asked: AskedOf;
}

function* missesIn({ run, outcomes, asked }: Surveyed, wanted: number): Generator<Miss> {
  const { view, questions } = asked;
  const namesOf = namesIn(questions.map(({ check }) => check));
  let answers: Answers | null = null;
  for (let position = 0; position < view.size; position += 1) {
    if (outcomes[position] !== wanted) continue;
    const segment = Math.floor(position / view.segment);
    if (answers?.segment !== segment) answers = answersIn(asked, segment, answers?.buffers ?? null);
    yield missAt({ run, asked, namesOf }, answers, position);
  }
}

interface Telling {
  readonly run: Judging;
  readonly asked: AskedOf;
  readonly namesOf: (places: number) => readonly string[];
}

function missAt({ run, asked: { view, questions }, namesOf }: Telling, { segment, buffers }: Answers, position: number): Miss {
  const at = position - segment * view.segment;
  const answerOf = (question: number): number => buffers.answers[question]?.[at] ?? 0;
  let [fails, unmet] = [0, 0];
  questions.forEach((one, question) => {
    const count = countAt(one, answerOf(question));
    if (count === COUNTS.fail) fails += 2 ** question;
    if (count === COUNTS.fail || count === COUNTS.unknown) unmet += 2 ** question;
  });
  return {
    fails: namesOf(fails),
    unmet: namesOf(unmet),
    verdict(check) {
      const question = questions.findIndex((one) => one.check === check);
      return questions[question]?.digests.miss(answerOf(question)) ?? null;
    },
    judged: () => judgePart(run, view.part(position)),
  };
}

/** The checks at these places, as a sum of powers of two; one and the same list for the same places. */
function namesIn(checks: readonly string[]): (places: number) => readonly string[] {
  const known = new Map<number, readonly string[]>();
  return (places) => {
    const found = known.get(places) ?? checks.filter((_, at) => Math.floor(places / 2 ** at) % 2 === 1);
    known.set(places, found);
    return found;
  };
}
