import type { ScreenView } from '../parts/screen-view.js';
import { TRAITS } from '../parts/traits.js';
import type { Segment, Step } from './decision-tree.js';
import type { CheckQuestion, CodeAt, Question } from './question.js';

/** One small set for all segments of a view, whatever is asked of it: new memory costs more than the work done in it. */
export interface Buffers {
  /** The answer of each question, part by part. */
  readonly answers: readonly Int32Array[];
  readonly sums: Int32Array;
  /** Places of the parts still asked about. */
  readonly open: Int32Array;
  /** By part: where it stands among those laid by. */
  readonly places: Int32Array;
  readonly distances: Float64Array;
  readonly current: Int32Array;
  /** By trait. */
  readonly codes: (Column | undefined)[];
}

interface Column {
  readonly codes: Int32Array;
  /** Whose codes they are now. */
  segment: number;
}

const BUFFERS = new WeakMap<ScreenView, Buffers>();

/** Another survey of the view writes over them. */
export function buffersFor(view: ScreenView, questions: number): Buffers {
  const before = BUFFERS.get(view) ?? newBuffers(view, 0);
  const buffers = { ...before, answers: Array.from({ length: questions }, (_, at) => before.answers[at] ?? new Int32Array(sizeIn(view))) };
  BUFFERS.set(view, buffers);
  return buffers;
}

/** A set that no other survey writes over. */
export function newBuffers(view: ScreenView, questions: number): Buffers {
  const numbers = (): Int32Array => new Int32Array(sizeIn(view));
  return { answers: Array.from({ length: questions }, numbers), sums: numbers(), open: numbers(), places: numbers(), distances: new Float64Array(sizeIn(view)), current: numbers(), codes: [] };
}

/** How the parts of a view come. */
type Sized = Pick<ScreenView, 'size' | 'segment'>;

const sizeIn = (view: Sized): number => Math.min(view.segment, view.size);

/** Codes of one trait in this segment, read when first asked for. */
export function codesOf(view: Sized & Pick<ScreenView, 'codes'>, segment: number, { codes }: Pick<Buffers, 'codes'>): (trait: number) => Int32Array {
  return (trait) => {
    const column = (codes[trait] ??= { codes: new Int32Array(sizeIn(view)), segment: -1 });
    if (column.segment !== segment) {
      view.codes(TRAITS[trait] ?? 'class', segment, column.codes);
      column.segment = segment;
    }
    return column.codes;
  };
}

/** Parts of one segment that are asked about. */
export interface AskedParts {
  /** Position in the view of the segment's first part. */
  readonly first: number;
  readonly count: number;
  readonly codes: (trait: number) => Int32Array;
  /** Places in the segment; null: all of them. */
  readonly only?: Int32Array | null;
}

/** What a question's tree is asked about one segment. */
export function segmentOf(one: Question, { count, codes, only = null }: Pick<AskedParts, 'count' | 'codes' | 'only'>): Segment {
  const code = one.codes((trait, at) => codes(trait)[at] ?? 0);
  return { count, only, code, columns: one.looksAtTraits ? codes : null, grow: growing(one, code) };
}

/** Answers for a part of whose combination nothing is known yet. */
export function growing(one: Question, code: CodeAt): Segment['grow'] {
  return (at) => {
    const path: Step[] = [];
    const leaf = one.answer((trait) => code(trait, at), path);
    return { path, leaf };
  };
}

/** The answers of a tree, as a check's. */
export function byTree(question: Question): Pick<CheckQuestion, 'classify' | 'numbering'> {
  return { classify: (parts, into) => question.tree.classify(segmentOf(question, parts), into), numbering: question.tree };
}
