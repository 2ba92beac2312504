import type { ScreenView } from '../parts/screen-view.js';
import type { Buffers } from './buffers.js';
import { costOf } from './cost.js';
import { COUNTS } from './digest.js';
import type { CheckQuestion } from './question.js';
import type { SurveyedFit } from './survey.js';

/** The order in which a stage's questions are asked where one failure settles a part: places among the questions. */
export interface OpenPlan {
  /** Asked of this view for the stage before as well. */
  readonly same: readonly number[];
  readonly others: readonly number[];
  /** Who is left after those asked before; kept from then where exactly these were asked. */
  readonly kept: KeptOpen;
  readonly isKnown: boolean;
}

/** The parts that fail none of some questions, segment by segment. */
interface KeptOpen {
  readonly questions: readonly CheckQuestion[];
  readonly segments: OpenSegment[];
}

/** Parts of a segment that are open after the questions asked before; by place among them. */
export interface OpenSegment {
  readonly open: Int32Array;
  readonly sums: Int32Array;
  /** By question, in the order these were asked. */
  readonly answers: readonly Int32Array[];
  /** What is known of a part that fits, but for the digests of other questions; made when it first fits. */
  readonly fits: (SurveyedFit | undefined)[];
  /** Answers of the question asked next: one that differs by its limit alone has the same. */
  next: { readonly numbering: object; readonly answers: Int32Array } | null;
}

/** What a view was last asked, and who was left open by a part of it. */
const ASKED = new WeakMap<ScreenView, { readonly questions: readonly CheckQuestion[]; readonly kept: KeptOpen }>();

/** Questions the stage before asked too come first, then the cheap ones: a changed limit finds the parts it decides about ready. */
export function openPlan(view: ScreenView, questions: readonly CheckQuestion[]): OpenPlan {
  const before = ASKED.get(view);
  const asked = new Set<CheckQuestion | undefined>(before?.questions ?? []);
  const places = questions.map((_, at) => at).sort((a, b) => costOf(questions[a]?.check) - costOf(questions[b]?.check));
  const wasAsked = (at: number): boolean => asked.has(questions[at]);
  const [same, others] = [places.filter(wasAsked), places.filter((at) => !wasAsked(at))];
  const these = same.flatMap((at) => questions[at] ?? []);
  const isKnown = before !== undefined && these.length > 0 && these.length === before.kept.questions.length && these.every((one, at) => one === before.kept.questions[at]);
  const kept = isKnown ? before.kept : { questions: these, segments: [] };
  ASKED.set(view, { questions, kept });
  return { same, others, kept, isKnown };
}

interface Asking {
  readonly segment: number;
  readonly count: number;
  readonly buffers: Buffers;
  /** Finds the answers of these parts. */
  readonly classify: (at: number, only: Int32Array) => void;
  /** Adds what the answers make of these parts to their sums. */
  readonly add: (at: number, only: Int32Array) => void;
  readonly numbering: (at: number) => object | undefined;
}

/** How many parts have not failed, their places at the front of `open`; and what was known of them before, if anything. */
export interface LeftOpen {
  readonly left: number;
  readonly known: OpenSegment | null;
}

/** Asks the parts of a segment until they fail. */
export function askWhileOpen({ same, others, kept, isKnown }: OpenPlan, asking: Asking): LeftOpen {
  const known = isKnown ? kept.segments[asking.segment] : undefined;
  if (known !== undefined) return { left: askKnown(known, others, asking), known };
  const left = askAfresh(same, asking);
  // The first stage of all has asked nothing before.
  if (same.length > 0) kept.segments[asking.segment] = laidBy(same, left, asking.buffers);
  return { left: askOpen(others, left, asking), known: null };
}

function askAfresh(places: readonly number[], asking: Asking): number {
  const { open, sums } = asking.buffers;
  sums.fill(0);
  for (let part = 0; part < asking.count; part += 1) open[part] = part;
  return askOpen(places, asking.count, asking);
}

function askOpen(places: readonly number[], count: number, { buffers: { open, sums }, classify, add }: Asking): number {
  let left = count;
  for (const at of places) {
    const only = open.subarray(0, left);
    classify(at, only);
    add(at, only);
    left = keepOpen(open, left, sums);
  }
  return left;
}

/** Closes up to the front what has not failed yet, and says how many that are. */
function keepOpen(open: Int32Array, count: number, sums: Int32Array): number {
  let left = 0;
  for (let place = 0; place < count; place += 1) {
    const part = open[place] ?? 0;
    if (((sums[part] ?? 0) & (COUNTS.weak - 1)) === 0) open[left++] = part;
  }
  return left;
}

function laidBy(places: readonly number[], left: number, { open, sums, answers }: Buffers): OpenSegment {
  const parts = open.slice(0, left);
  const of = (column: Int32Array | undefined): Int32Array => parts.map((part) => column?.[part] ?? 0);
  return { open: parts, sums: of(sums), answers: places.map((at) => of(answers[at])), fits: [], next: null };
}

/** Takes up the parts that were laid by and asks them the other questions. */
function askKnown(known: OpenSegment, [first, ...others]: readonly number[], asking: Asking): number {
  const { open, places, sums } = asking.buffers;
  open.set(known.open);
  known.open.forEach((part, place) => {
    sums[part] = known.sums[place] ?? 0;
    places[part] = place;
  });
  if (first === undefined) return known.open.length;
  answerNext(known, first, asking);
  asking.add(first, known.open);
  return askOpen(others, keepOpen(open, known.open.length, sums), asking);
}

function answerNext(known: OpenSegment, at: number, { buffers, classify, numbering: numberingOf }: Asking): void {
  const [numbering, column] = [numberingOf(at), buffers.answers[at]];
  if (numbering === undefined || column === undefined) return;
  if (known.next?.numbering === numbering) {
    const { answers } = known.next;
    known.open.forEach((part, place) => void (column[part] = answers[place] ?? 0));
    return;
  }
  classify(at, known.open);
  known.next = { numbering, answers: known.open.map((part) => column[part] ?? 0) };
}
