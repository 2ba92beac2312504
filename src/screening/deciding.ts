import type { ScreenView } from '../parts/screen-view.js';
import { codesOf, newBuffers, segmentOf, type Buffers } from './buffers.js';
import { COUNTS } from './digest.js';
import type { Judging } from './judge.js';
import type { JudgedPart } from './judged-part.js';
import { checkQuestions, currentQuestion, type CheckQuestion } from './question.js';

/** What a survey knows of a part that does not fit or is open, without judging it in words. */
export type Decided = Pick<JudgedPart, 'deciding' | 'current'>;

/** What keeps a part out, or leaves it open. */
export type Decisive = 'fail' | 'unknown';

/**
 * Which checks keep the parts of a view out or leave them open. Asks the questions of the survey, so that what it found out serves again; a segment is gone
 * through when a part of it is first asked about. Made right after the survey, while its questions are kept.
 */
export function decidingIn(run: Judging, view: ScreenView, circuit: string): (position: number, decisive: Decisive) => Decided {
  const questions = checkQuestions(run, view, { circuit });
  const current = currentQuestion(run, view);
  const asked: AskedOf = { view, questions, current };
  let last: Answers | null = null;
  return (position, decisive) => {
    const segment = Math.floor(position / view.segment);
    if (last?.segment !== segment) last = answersIn(asked, segment, last?.buffers ?? null);
    return decidedAt(asked, last.buffers, { at: position - segment * view.segment, decisive });
  };
}

/** What the parts of a view are asked. */
export interface AskedOf {
  readonly view: ScreenView;
  readonly questions: readonly CheckQuestion[];
  readonly current: ReturnType<typeof currentQuestion>;
}

/** The answers in one segment, until another is asked about with the same buffers. */
export interface Answers {
  readonly segment: number;
  readonly buffers: Buffers;
}

/** `before`: buffers that need not hold what they hold; null: there are none yet. */
export function answersIn({ view, questions, current }: AskedOf, segment: number, before: Buffers | null): Answers {
  const buffers = before ?? newBuffers(view, questions.length);
  const count = Math.min(view.segment, view.size - segment * view.segment);
  const codes = codesOf(view, segment, buffers);
  for (const [at, one] of questions.entries()) {
    const answers = buffers.answers[at];
    if (answers !== undefined) one.classify({ first: segment * view.segment, count, codes }, answers);
  }
  current.tree.classify(segmentOf(current, { count, codes }), buffers.current);
  return { segment, buffers };
}

/** How an answer counts, of a segment that was asked about last. */
export function countAt({ settle, digests }: CheckQuestion, answer: number): number {
  settle?.(answer);
  return digests.counts[answer] ?? 0;
}

function decidedAt({ questions, current }: AskedOf, { answers, current: values }: Buffers, { at, decisive }: { readonly at: number; readonly decisive: Decisive }): Decided {
  const deciding = questions.filter((one, question) => {
    return countAt(one, answers[question]?.[at] ?? 0) === COUNTS[decisive];
  });
  return { deciding: deciding.map(({ check }) => check), current: current.values[values[at] ?? 0] ?? null };
}
