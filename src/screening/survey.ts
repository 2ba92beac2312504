import type { ScreenView } from '../parts/screen-view.js';
import { buffersFor, codesOf, type Buffers } from './buffers.js';
import { COUNTS, type Digest } from './digest.js';
import type { Judging } from './judge.js';
import { nearestKeeper, type Near } from './near.js';
import { askWhileOpen, openPlan, type LeftOpen, type OpenPlan } from './open-parts.js';
import { checkQuestions, currentQuestion, type CheckQuestion } from './question.js';
import { fitsIn } from './survey-fits.js';

/** A part that fits, with what its place in the order depends on. */
export interface SurveyedFit {
  readonly view: ScreenView;
  readonly position: number;
  /** One a check asked; null where it does not apply. */
  readonly digests: readonly (Digest | null)[];
  readonly isGuaranteed: boolean;
  /** Pessimistic quiescent current, A. */
  readonly current: number | null;
  /** Codes of price and family in the view. */
  readonly price: number;
  readonly family: number;
}

/** The parts of one view judged, none of them read. */
export interface Survey {
  readonly view: ScreenView;
  /** By position. */
  readonly outcomes: Uint8Array;
  readonly fits: readonly SurveyedFit[];
  /** Positions that cannot be decided. */
  readonly undecided: readonly number[];
  /** Parts that fail a check, by check. */
  readonly failing: ReadonlyMap<string, number>;
  /** The rejected parts nearest to fitting. */
  readonly nearest: readonly Near[];
}

export const OUTCOME = { fits: 0, undecided: 1, rejected: 2 } as const;

/** What a survey is made for. */
export interface SurveyRequest {
  /** Mark of the circuit the demands belong to (`circuitMark`). */
  readonly circuit: string;
  /** Only what becomes of each part is wanted: one that fails is asked nothing more, and no check is tallied. */
  readonly outcomesOnly?: boolean;
}

/** The last survey of a view in which everything was asked, with the questions it answers. */
const LAST = new WeakMap<ScreenView, { readonly questions: readonly object[]; readonly survey: Survey }>();

/** Judges every part of a view: each check once per distinct combination of the pieces it looks at; then codes are added up. Asked the same again, it has the same answer. */
export function survey(run: Judging, view: ScreenView, { circuit, outcomesOnly = false }: SurveyRequest): Survey {
  const questions = checkQuestions(run, view, { circuit, outcomesOnly });
  const current = currentQuestion(run, view);
  if (outcomesOnly) return surveyed({ run, view, questions, current, outcomesOnly });
  const before = LAST.get(view);
  if (before !== undefined && isSame(before.questions, [...questions, current])) return before.survey;
  const made = surveyed({ run, view, questions, current, outcomesOnly });
  LAST.set(view, { questions: [...questions, current], survey: made });
  return made;
}

/** A question is the same object where the stage asks the same in the same surroundings. */
const isSame = (some: readonly object[], others: readonly object[]): boolean => some.length === others.length && some.every((one, at) => one === others[at]);

type Surveying = Pick<Counting, 'run' | 'view' | 'questions' | 'current'> & { readonly outcomesOnly: boolean };

function surveyed({ run, view, questions, current, outcomesOnly }: Surveying): Survey {
  const counting: Counting = {
    run, view, questions, current,
    outcomes: new Uint8Array(view.size), fits: [], undecided: [], nearest: nearestKeeper(),
    fails: new Float64Array(questions.length),
    buffers: buffersFor(view, questions.length),
    plan: outcomesOnly ? openPlan(view, questions) : null,
  };
  for (let segment = 0; segment * view.segment < view.size; segment += 1) surveySegment(counting, segment);
  const failing = new Map(questions.map(({ check }, at) => [check, counting.fails[at] ?? 0]));
  return { view, outcomes: counting.outcomes, fits: counting.fits, undecided: counting.undecided, failing, nearest: counting.nearest.found() };
}

/** A survey while it is made. */
export interface Counting {
  readonly run: Judging;
  readonly view: ScreenView;
  readonly questions: readonly CheckQuestion[];
  readonly current: ReturnType<typeof currentQuestion>;
  readonly outcomes: Uint8Array;
  readonly fits: SurveyedFit[];
  readonly undecided: number[];
  readonly nearest: ReturnType<typeof nearestKeeper>;
  readonly fails: Float64Array;
  readonly buffers: Buffers;
  /** In which order outcomes alone are asked for; null: everything is. */
  readonly plan: OpenPlan | null;
}

function surveySegment(counting: Counting, segment: number): void {
  const { view, questions, buffers, plan } = counting;
  const count = Math.min(view.segment, view.size - segment * view.segment);
  const codes = codesOf(view, segment, buffers);
  const classify = (at: number, only: Int32Array | null): void => {
    const [one, answers] = [questions[at], buffers.answers[at]];
    if (one !== undefined && answers !== undefined) one.classify({ first: segment * view.segment, count, codes, only }, answers);
  };
  const add = (at: number, only: Int32Array | null): void => {
    const [one, answers] = [questions[at], buffers.answers[at]];
    if (one === undefined || answers === undefined) return;
    settle(one, { answers, count, only });
    addUp(counting, { one, at, answers, count, only });
  };
  if (plan !== null) {
    const left = askWhileOpen(plan, { segment, count, buffers, classify, add, numbering: (at) => questions[at]?.numbering });
    sortOutOpen(counting, { segment, count, codes, left });
    return;
  }
  buffers.sums.fill(0);
  buffers.distances.fill(0);
  questions.forEach((_, at) => {
    classify(at, null);
    add(at, null);
  });
  sortOut(counting, { segment, count, codes });
}

interface Answered {
  readonly one: CheckQuestion;
  readonly at: number;
  readonly answers: Int32Array;
  readonly count: number;
  readonly only: Int32Array | null;
}

function settle(one: CheckQuestion, { answers, count, only }: Pick<Answered, 'answers' | 'count' | 'only'>): void {
  if (one.settle === null) return;
  const asked = only?.length ?? count;
  for (let place = 0; place < asked; place += 1) one.settle(answers[only === null ? place : (only[place] ?? 0)] ?? 0);
}

/** Of the distances what is known by answer: the rest is added for the parts that can be among the nearest. */
function addUp({ buffers: { sums, distances }, fails }: Counting, { one, at, answers, count, only }: Answered): void {
  const { counts: adds, distances: far } = one.digests;
  let failed = 0;
  const asked = only?.length ?? count;
  for (let place = 0; place < asked; place += 1) {
    const part = only === null ? place : (only[place] ?? 0);
    const answer = answers[part] ?? 0;
    const add = adds[answer] ?? 0;
    if (add === 0) continue;
    sums[part] = (sums[part] ?? 0) + add;
    if (add !== COUNTS.fail) continue;
    failed += 1;
    if (far !== null) distances[part] = (distances[part] ?? 0) + (far[answer] ?? 0);
  }
  fails[at] = (fails[at] ?? 0) + failed;
}

interface Place {
  readonly segment: number;
  readonly count: number;
  readonly codes: (trait: number) => Int32Array;
}

/** All but those left open have failed. */
function sortOutOpen(counting: Counting, { segment, count, codes, left: { left, known } }: Place & { readonly left: LeftOpen }): void {
  const { view, outcomes, undecided, buffers } = counting;
  const first = segment * view.segment;
  const fitting: number[] = [];
  outcomes.fill(OUTCOME.rejected, first, first + count);
  for (const at of buffers.open.subarray(0, left)) {
    const isUndecided = (buffers.sums[at] ?? 0) >= COUNTS.unknown;
    outcomes[first + at] = isUndecided ? OUTCOME.undecided : OUTCOME.fits;
    if (isUndecided) undecided.push(first + at);
    else fitting.push(at);
  }
  for (const fit of fitsIn(counting, { first, fitting, count, codes, known })) counting.fits.push(fit);
}

/** Added in the order of the verdicts, as for a part judged alone: the sums agree to the last bit. */
function distanceOf({ questions, buffers }: Counting, part: number): number {
  let distance = 0;
  for (const [at, { digests }] of questions.entries()) distance += digests.distance(buffers.answers[at]?.[part] ?? 0);
  return distance;
}

function sortOut(counting: Counting, { segment, count, codes }: Place): void {
  const { view, outcomes, undecided, nearest, buffers } = counting;
  const first = segment * view.segment;
  const fitting: number[] = [];
  for (let at = 0; at < count; at += 1) {
    const sum = buffers.sums[at] ?? 0;
    if ((sum & (COUNTS.weak - 1)) !== 0) {
      outcomes[first + at] = OUTCOME.rejected;
      if (nearest.wants(buffers.distances[at] ?? 0)) nearest.see(first + at, distanceOf(counting, at));
    } else if (sum >= COUNTS.unknown) {
      outcomes[first + at] = OUTCOME.undecided;
      undecided.push(first + at);
    } else fitting.push(at);
  }
  for (const fit of fitsIn(counting, { first, fitting, count, codes, known: null })) counting.fits.push(fit);
}
