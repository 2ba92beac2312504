import type { PartSource } from '../parts/part.js';
import { type ScreenView, viewsOf } from '../parts/screen-view.js';
import { type Judging, judgingOf, type Marked, type OutcomeCounts, screen, type Screened, screenViews } from '../screening/index.js';
import { type Order, rank, type RankedPart } from './rank.js';
import { rankSurveyed, surveyedFirst, surveyedIds } from './rank-survey.js';

/** How the answer is asked for. */
export interface RankRequest {
  readonly strict: boolean;
  readonly order: Order;
}

/** All parts judged and those that fit in order, with the run they were judged in. */
export interface ScreenedAndRanked {
  readonly run: Judging;
  readonly screened: Screened;
  readonly fit: readonly RankedPart[];
}

/** Part by part, or through views when the source has them: the same answer, without reading what is not shown. */
export function screenAndRank({ demands, circuit }: Marked, source: PartSource, { strict, order }: RankRequest): ScreenedAndRanked {
  const run = judgingOf(demands, source, strict);
  if (source.screening === undefined) {
    const screened = screen(run, source.parts);
    return { run, screened, fit: rank(screened.fit, order) };
  }
  const screened = screenViews(run, source.screening.views, { circuit });
  return { run, screened, fit: rankSurveyed(screened, order) };
}

/** What became of the parts, in numbers, and those that fit in order. */
export interface OutlinedAndRanked {
  readonly run: Judging;
  readonly counts: OutcomeCounts;
  readonly fit: readonly RankedPart[];
}

/** Counts and order of `screenAndRank`; a part that fails a cheap check is not asked the dear ones. */
export function outlineAndRank({ demands, circuit }: Marked, source: PartSource, { strict, order }: RankRequest): OutlinedAndRanked {
  const run = judgingOf(demands, source, strict);
  const views = viewsIn(source);
  const screened = screenViews(run, views, { circuit, outcomesOnly: true });
  return { run, counts: countsIn(screened, views), fit: rankSurveyed(screened, order) };
}

/** Without views of its own the parts are looked at, and only then. */
const viewsIn = (source: PartSource): readonly ScreenView[] => source.screening?.views ?? viewsOf(source.parts);

function countsIn({ fit, undecided, rejected }: Screened, views: readonly ScreenView[]): OutcomeCounts {
  return { parts: views.reduce((sum, { size }) => sum + size, 0), fit: fit.length, undecided: undecided.length, rejected: rejected.length };
}

/** Counts, and the ids of what fits in order, each variant a place of its own. */
export interface OutlinedIds {
  readonly counts: OutcomeCounts;
  /** Null when nothing fits. */
  readonly first: string | null;
  /** Ordered when they are first asked for. */
  readonly ids: readonly string[];
}

/** The short answer to many stages in a row: what was found out for one serves the next where it asks the same. */
export function outlinesIn(source: PartSource, { strict, order }: RankRequest): (of: Marked) => OutlinedIds {
  const views = viewsIn(source);
  return ({ demands, circuit }) => {
    const screened = screenViews(judgingOf(demands, source, strict), views, { circuit, outcomesOnly: true });
    let ids: readonly string[] | null = null;
    return { counts: countsIn(screened, views), first: surveyedFirst(screened, order), get ids() { return (ids ??= surveyedIds(screened, order)); } };
  };
}
