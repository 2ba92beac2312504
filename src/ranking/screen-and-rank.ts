import type { PartSource } from '../parts/part.js';
import { type Judging, judgePart, judgingOf, type Marked, outlining, type Outlined, screen, type Screened, screenViews } from '../screening/index.js';
import { type Order, rank, type RankedPart } from './rank.js';
import { rankSurveyed } from './rank-survey.js';

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
  readonly counts: Outlined['counts'];
  readonly fit: readonly RankedPart[];
}

/** Counts and order of `screenAndRank`; a part that fails a cheap check is not asked the dear ones. */
export function outlineAndRank({ demands, circuit }: Marked, source: PartSource, { strict, order }: RankRequest): OutlinedAndRanked {
  const run = judgingOf(demands, source, strict);
  if (source.screening === undefined) {
    const { counts, fit } = outlining(source.parts, strict)({ demands, circuit });
    return { run, counts, fit: rank(fit.map(({ part }) => judgePart(run, part)), order) };
  }
  const { views } = source.screening;
  const screened = screenViews(run, views, { circuit, outcomesOnly: true });
  const { fit, undecided, rejected } = screened;
  const parts = views.reduce((sum, { size }) => sum + size, 0);
  return { run, counts: { parts, fit: fit.length, undecided: undecided.length, rejected: rejected.length }, fit: rankSurveyed(screened, order) };
}
