import type { PartSource } from '../parts/part.js';
import { type ScreenView, viewsOf } from '../parts/screen-view.js';
import { type Judging, judgingOf, type Marked, type OutcomeCounts, screen, type Screened, screenViews, type SurveyedCatalog } from '../screening/index.js';
import { type Order, rank, type RankedPart } from './rank.js';
import { type RankedSurvey, rankSurveyed, surveyedAmong, surveyedFirst, surveyedIds } from './rank-survey.js';

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
  return { run, screened, fit: rankSurveyed(screened, order).lines };
}

/** What became of the parts, in numbers, and those that fit in order. */
export interface OutlinedAndRanked {
  readonly run: Judging;
  readonly counts: OutcomeCounts;
  readonly fit: readonly RankedPart[];
  /** The line of a part that fits; null of any other. */
  readonly lineOf: RankedSurvey['lineOf'];
}

/** Counts and order of `screenAndRank`; a part that fails a cheap check is not asked the dear ones. */
export function outlineAndRank({ demands, circuit }: Marked, source: PartSource, { strict, order }: RankRequest): OutlinedAndRanked {
  const run = judgingOf(demands, source, strict);
  const views = viewsIn(source);
  const screened = screenViews(run, views, { circuit, outcomesOnly: true });
  const ranked = rankSurveyed(screened, order);
  return { run, counts: countsIn(screened, views), fit: ranked.lines, lineOf: (judged) => ranked.lineOf(judged) };
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
  /** By view, the positions of what fits, rising. */
  readonly fitting: readonly Int32Array[];
  /** Ids, in order, of what fits here and not in another answer from the same parts. */
  readonly beyond: (other: Pick<OutlinedIds, 'fitting'>) => readonly string[];
}

/**
 * The short answer to many stages in a row: what was found out for one serves the next where it asks the same. Of each answer only counts
 * and places are kept; who asks for more has the stage surveyed again.
 */
export function outlinesIn(source: PartSource, { strict, order }: RankRequest): (of: Marked) => OutlinedIds {
  const views = viewsIn(source);
  return ({ demands, circuit }) => {
    const surveyed = (): SurveyedCatalog => screenViews(judgingOf(demands, source, strict), views, { circuit, outcomesOnly: true });
    const { counts, first, fitting } = inShort(surveyed(), views, order);
    let ids: readonly string[] | null = null;
    return {
      counts,
      first,
      fitting,
      get ids() { return (ids ??= surveyedIds(surveyed(), order)); },
      beyond: (other) => beyond({ views, fitting }, other, (isAmong) => surveyedAmong(surveyed(), order, isAmong)),
    };
  };
}

/** A function of its own, so that nothing of the survey lives on with what is asked of the answer later. */
function inShort(screened: SurveyedCatalog, views: readonly ScreenView[], order: Order): Pick<OutlinedIds, 'counts' | 'first' | 'fitting'> {
  const fitting = views.map((view) => Int32Array.from(screened.places.filter((fit) => fit.view === view), ({ position }) => position));
  return { counts: countsIn(screened, views), first: surveyedFirst(screened, order), fitting };
}

type IsAmong = Parameters<typeof surveyedAmong>[2];

/** One alone needs no order. */
function beyond({ views, fitting }: { readonly views: readonly ScreenView[]; readonly fitting: OutlinedIds['fitting'] }, other: Pick<OutlinedIds, 'fitting'>, ordered: (isAmong: IsAmong) => readonly string[]): readonly string[] {
  const alone = views.map((view, at) => {
    const there = new Set(other.fitting[at]);
    return { view, positions: [...(fitting[at] ?? [])].filter((position) => !there.has(position)) };
  });
  const ids = alone.flatMap(({ view, positions }) => positions.slice(0, 2).map((position) => ({ view, position })));
  if (ids.length < 2) return ids.map(({ view, position }) => view.id(position));
  const among = new Map(alone.map(({ view, positions }) => [view, new Set(positions)]));
  return ordered(({ view, position }) => among.get(view)?.has(position) === true);
}
