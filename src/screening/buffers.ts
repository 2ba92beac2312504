import type { ScreenView } from '../parts/screen-view.js';
import { TRAITS } from '../parts/traits.js';
import type { Segment, Step } from './decision-tree.js';
import type { Question } from './question.js';

/** One small set for all segments of a view: new memory costs more than the work done in it. */
export interface Buffers {
  /** The answer of each question, part by part. */
  readonly answers: readonly Int32Array[];
  readonly sums: Int32Array;
  /** Places of the parts still asked about. */
  readonly open: Int32Array;
  readonly distances: Float64Array;
  readonly current: Int32Array;
  readonly codes: Map<number, Int32Array>;
}

export function buffersFor(view: ScreenView, questions: number): Buffers {
  const size = Math.min(view.segment, view.size);
  const numbers = (): Int32Array => new Int32Array(size);
  return { answers: Array.from({ length: questions }, numbers), sums: numbers(), open: numbers(), distances: new Float64Array(size), current: numbers(), codes: new Map() };
}

/** Codes of one trait in this segment, read when first asked for. */
export function codesOf(view: ScreenView, segment: number, { codes }: Buffers): (trait: number) => Int32Array {
  const here = new Map<number, Int32Array>();
  return (trait) => {
    const known = here.get(trait);
    if (known !== undefined) return known;
    const buffer = codes.get(trait) ?? new Int32Array(Math.min(view.segment, view.size));
    codes.set(trait, buffer);
    view.codes(TRAITS[trait] ?? 'class', segment, buffer);
    here.set(trait, buffer);
    return buffer;
  };
}

/** What a question's tree is asked about one segment. */
export function segmentOf(one: Question, { count, codes, only = null }: Pick<Segment, 'count' | 'codes'> & { readonly only?: Int32Array | null }): Segment {
  return {
    count, codes, only,
    grow(at) {
      const path: Step[] = [];
      const leaf = one.answer((trait) => codes(trait)[at] ?? 0, path);
      return { path, leaf };
    },
  };
}
