import type { Demands } from '../demands/index.js';
import type { ScreenView } from '../parts/screen-view.js';
import { decidingIn } from './deciding.js';
import { isLikely, judgePart, type Judging } from './judge.js';
import type { JudgedPart } from './judged-part.js';
import { lazyList } from './lazy-list.js';
import { nearestOf } from './nearest.js';
import { byFrequency, type Screened } from './screen.js';
import { OUTCOME, survey, type Survey, type SurveyedFit, type SurveyRequest } from './survey.js';
import { surveyedPart } from './surveyed-part.js';

/** Demands with the mark of the circuit they belong to (`circuitMark`). */
export interface Marked {
  readonly demands: Demands;
  readonly circuit: string;
}

/** What became of how many parts. */
export interface OutcomeCounts {
  readonly parts: number;
  readonly fit: number;
  readonly undecided: number;
  readonly rejected: number;
}

/** A catalog judged through its views: complete counts, and lists whose parts are read and judged in words when they are looked at. */
export interface SurveyedCatalog extends Screened {
  readonly places: readonly SurveyedFit[];
  /** A part that fits, judged as a whole. */
  judgedAt(fit: Pick<SurveyedFit, 'view' | 'position'>): JudgedPart;
}

/** The same answer as `screen` over all parts of the views, in their order. */
export function screenViews(run: Judging, views: readonly ScreenView[], request: SurveyRequest): SurveyedCatalog {
  const surveys = views.filter(({ size }) => size > 0).map((view) => survey(run, view, request));
  const once = judgeOnce(run);
  const { judgedAt } = once;
  const places = surveys.flatMap(({ fits }) => fits);
  const near = surveys.flatMap(({ view, nearest }) => nearest.map(({ position }) => judgedAt({ view, position })));
  const listed = request.outcomesOnly === true ? () => judgedAt : listedAt(run, { views, ...once, circuit: request.circuit });
  return {
    places,
    judgedAt,
    fit: lazyList(places.length, (at) => judgedAt(member(places, at))),
    undecided: joined(surveys, { count: ({ undecided }) => undecided.length, positions: ({ undecided }) => undecided }, listed('undecided')),
    rejected: joined(surveys, { count: rejectedCount, positions: rejectedIn }, listed('does-not-fit')),
    rejections: byFrequency(totals(surveys)),
    nearest: nearestOf(near, run.demands.operating.nominalSupply),
  };
}

/** A part at a place, read and judged in words once, however many lists show it. */
interface JudgedOnce {
  readonly judgedAt: SurveyedCatalog['judgedAt'];
  /** Whether an undecided part is likely to fit: no words are made for that. */
  readonly likelyAt: (place: Parameters<SurveyedCatalog['judgedAt']>[0]) => boolean;
}

/** What was found out so far. */
interface Found {
  judged: JudgedPart | null;
  likely?: boolean;
}

function judgeOnce(run: Judging): JudgedOnce {
  const known = new Map<ScreenView, Map<number, Found>>();
  const found = ({ view, position }: Parameters<SurveyedCatalog['judgedAt']>[0]): Found => {
    const ofView = known.get(view) ?? new Map<number, Found>();
    known.set(view, ofView);
    const one = ofView.get(position) ?? { judged: null };
    ofView.set(position, one);
    return one;
  };
  return {
    judgedAt(place) {
      const one = found(place);
      return (one.judged ??= judgePart(run, place.view.part(place.position), one));
    },
    likelyAt(place) {
      const one = found(place);
      return (one.likely ??= one.judged?.likely ?? isLikely(run, place.view.part(place.position)));
    },
  };
}

interface Positions {
  readonly count: (one: Survey) => number;
  readonly positions: (one: Survey) => ArrayLike<number>;
}

interface Listing extends JudgedOnce {
  readonly views: readonly ScreenView[];
  readonly circuit: string;
}

/** A part that does not fit or is open, as the survey knows it: most lists tell of it only which checks it fails or leaves open. */
function listedAt(run: Judging, { views, judgedAt, likelyAt, circuit }: Listing): (outcome: 'undecided' | 'does-not-fit') => SurveyedCatalog['judgedAt'] {
  const known = new Map(views.filter(({ size }) => size > 0).map((view) => [view, decidingIn(run, view, circuit)]));
  return (outcome) => ({ view, position }) => {
    const decided = known.get(view)?.(position, outcome === 'undecided' ? 'unknown' : 'fail');
    if (decided === undefined) return judgedAt({ view, position });
    const found = { get part() { return view.part(position); }, get likely() { return outcome === 'undecided' && likelyAt({ view, position }); }, outcome, proof: null, ...decided };
    return surveyedPart(found, () => judgedAt({ view, position }));
  };
}

/** The positions of all surveys one after another. Where they stand is found out when the list is first looked into. */
function joined(surveys: readonly Survey[], { count, positions }: Positions, judgedAt: SurveyedCatalog['judgedAt']): readonly JudgedPart[] {
  const length = surveys.reduce((sum, one) => sum + count(one), 0);
  let found: readonly ArrayLike<number>[] | null = null;
  return lazyList(length, (at) => {
    found ??= surveys.map(positions);
    let left = at;
    for (const [number, { view }] of surveys.entries()) {
      const places = found[number] ?? [];
      if (left < places.length) return judgedAt({ view, position: member(places, left) });
      left -= places.length;
    }
    throw new RangeError(`no part at ${at} of ${length}`);
  });
}

const rejectedCount = ({ outcomes, fits, undecided }: Survey): number => outcomes.length - fits.length - undecided.length;

function rejectedIn(one: Survey): Uint32Array {
  const rejected = new Uint32Array(rejectedCount(one));
  let filled = 0;
  one.outcomes.forEach((outcome, position) => {
    if (outcome === OUTCOME.rejected) rejected[filled++] = position;
  });
  return rejected;
}

function totals(surveys: readonly Survey[]): Map<string, number> {
  const sums = new Map<string, number>();
  for (const { failing } of surveys) {
    for (const [check, parts] of failing) if (parts > 0) sums.set(check, (sums.get(check) ?? 0) + parts);
  }
  return sums;
}

function member<Member>(list: ArrayLike<Member>, at: number): Member {
  const found = list[at];
  if (found === undefined) throw new RangeError(`nothing at ${at} of ${list.length}`);
  return found;
}

