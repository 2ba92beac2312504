import { type JudgedPart, lazyList, surveyedPart, type SurveyedCatalog, type SurveyedFit } from '../screening/index.js';
import { dominatorFinder } from './dominance.js';
import { type PlacedFit, placedFit } from './placed-fit.js';
import { firstIn, tightestOf, type Order, type RankedPart } from './rank.js';
import { type SurveyOrder, surveyOrder } from './survey-order.js';

type Surveyed = Pick<SurveyedCatalog, 'places' | 'judgedAt'>;

/** Lines in order, and where a part of them stands. */
export interface RankedSurvey {
  readonly lines: readonly RankedPart[];
  /** The line of a part that fits; null where it is not among them. */
  lineOf(judged: JudgedPart): RankedPart | null;
}

/** The order of `rank` for parts that were surveyed: made of digests; a part is read when its line is looked at, or to break a tie. */
export function rankSurveyed(survey: Surveyed, order: Order = 'merit'): RankedSurvey {
  const ordered = orderOf(survey, order);
  const dominator = dominatorFinder(ordered.ties);
  const lines = lazyList(ordered.length, (at) => {
    const { first, variants } = ordered.line(at);
    const ranked: Pick<RankedPart, 'merit' | 'tightest' | 'rank' | 'dominatedBy' | 'variants'> = {
      get merit() { return first.merit; },
      get tightest() { return tightestOf(survey.judgedAt(first.fit)); },
      rank: at + 1,
      get dominatedBy() { return dominator(first)?.part.id ?? null; },
      variants: variants.map((one) => fitting(one, survey.judgedAt)),
    };
    return withMore(fitting(first, survey.judgedAt), ranked);
  });
  const lineOf = ({ part: { id, tier }, current }: JudgedPart): RankedPart | null => {
    // The id last: it has to be read.
    const at = ordered.lineWith((one) => one.current === current && one.part.tier === tier && one.part.id === id);
    return at === null ? null : (lines[at] ?? null);
  };
  return { lines, lineOf };
}

/** A part that fits, as its digests tell of it. */
function fitting({ fit, proof, current }: PlacedFit, judgedAt: SurveyedCatalog['judgedAt']): JudgedPart {
  return surveyedPart({ get part() { return fit.view.part(fit.position); }, outcome: 'fits', proof, current, deciding: [], likely: false }, () => judgedAt(fit));
}

/** Both in one, with nothing looked at yet: a spread would ask every getter. */
function withMore<Part extends object, More extends object>(part: Part, more: More): Part & More {
  return Object.defineProperties(part, Object.getOwnPropertyDescriptors(more)) as Part & More;
}

/** Ids in that order, each variant a place of its own. */
export function surveyedIds(survey: Surveyed, order: Order): string[] {
  const ordered = orderOf(survey, order);
  return Array.from({ length: ordered.length }, (_, at) => ordered.line(at)).flatMap(({ first, variants }) => [first, ...variants].map(({ part }) => part.id));
}

/** The id that stands first in that order, without ordering the others; null when nothing fits. */
export function surveyedFirst(survey: Surveyed, order: Order): string | null {
  return firstIn(order, placed(survey))?.part.id ?? null;
}

/** Ids of some of the parts that fit, in that order. */
export function surveyedAmong(survey: Surveyed, order: Order, isAmong: (fit: Pick<SurveyedFit, 'view' | 'position'>) => boolean): string[] {
  const ordered = orderOf(survey, order);
  return ordered.sorted(ordered.all.filter(({ fit }) => isAmong(fit))).map(({ part }) => part.id);
}

const placed = ({ places, judgedAt }: Surveyed): PlacedFit[] => places.map((fit) => placedFit(fit, judgedAt));

const orderOf = (survey: Surveyed, order: Order): SurveyOrder => surveyOrder(placed(survey), order);
