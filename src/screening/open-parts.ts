import type { ScreenView } from '../parts/screen-view.js';
import type { Buffers } from './buffers.js';
import { costOf } from './cost.js';
import { COUNTS } from './digest.js';
import type { CheckQuestion } from './question.js';

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

interface OpenSegment {
  readonly open: Int32Array;
  readonly sums: Int32Array;
  /** By question. */
  readonly answers: readonly Int32Array[];
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
  readonly ask: (at: number, only: Int32Array) => void;
}

/** Asks the parts of a segment until they fail; says how many have not, and leaves their places at the front of `open`. */
export function askWhileOpen({ same, others, kept, isKnown }: OpenPlan, asking: Asking): number {
  const known = isKnown ? kept.segments[asking.segment] : undefined;
  const left = known === undefined ? askAfresh(same, asking) : takeUp(known, same, asking);
  if (known === undefined) kept.segments[asking.segment] = laidBy(same, left, asking.buffers);
  return askOpen(others, left, asking);
}

function askAfresh(places: readonly number[], asking: Asking): number {
  const { open, sums } = asking.buffers;
  sums.fill(0);
  for (let part = 0; part < asking.count; part += 1) open[part] = part;
  return askOpen(places, asking.count, asking);
}

function askOpen(places: readonly number[], count: number, { buffers: { open, sums }, ask }: Asking): number {
  let left = count;
  for (const at of places) {
    ask(at, open.subarray(0, left));
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
  return { open: parts, sums: of(sums), answers: places.map((at) => of(answers[at])) };
}

function takeUp({ open, sums, answers }: OpenSegment, places: readonly number[], { buffers }: Asking): number {
  buffers.open.set(open);
  open.forEach((part, place) => void (buffers.sums[part] = sums[place] ?? 0));
  places.forEach((at, number) => {
    const [column, known] = [buffers.answers[at], answers[number]];
    if (column !== undefined && known !== undefined) open.forEach((part, place) => void (column[part] = known[place] ?? 0));
  });
  return open.length;
}
