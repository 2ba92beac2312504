import type { Part } from '../parts/part.js';
import type { ScreenView } from '../parts/screen-view.js';
import type { Trait } from '../parts/traits.js';
import { lazyList, type JudgedPart, type SurveyedCatalog, type SurveyedFit } from '../screening/index.js';
import { dominatorFinder } from './dominance.js';
import { type Line, linesOf } from './family.js';
import { meritOf } from './merit.js';
import type { Placed } from './placed.js';
import { compareIn, tightestOf, type Order, type RankedPart } from './rank.js';

/** The order of `rank` for parts that were surveyed: made of digests; a part is read when its line is looked at, or to break a tie. */
export function rankSurveyed({ places, judgedAt }: Pick<SurveyedCatalog, 'places' | 'judgedAt'>, order: Order = 'merit'): readonly RankedPart[] {
  const lines = surveyedLines({ places, judgedAt }, order);
  const dominator = dominatorFinder(lines.map(({ first }) => first));
  return lazyList(lines.length, (at) => {
    const line = lines[at];
    if (line === undefined) throw new RangeError(`no line ${at} of ${lines.length}`);
    const judged = judgedAt(line.first.fit);
    return {
      ...judged,
      merit: meritOf(judged),
      tightest: tightestOf(judged),
      rank: at + 1,
      dominatedBy: dominator(line.first)?.part.id ?? null,
      variants: line.variants.map(({ fit }) => judgedAt(fit)),
    };
  });
}

/** Ids in that order, each variant a place of its own. */
export function surveyedIds(survey: Pick<SurveyedCatalog, 'places' | 'judgedAt'>, order: Order): string[] {
  return surveyedLines(survey, order).flatMap(({ first, variants }) => [first, ...variants].map(({ part }) => part.id));
}

/** The id that stands first in that order, without ordering the others; null when nothing fits. */
export function surveyedFirst({ places, judgedAt }: Pick<SurveyedCatalog, 'places' | 'judgedAt'>, order: Order): string | null {
  const [first, ...others] = places.map((fit) => placedOf(fit, judgedAt));
  return first === undefined ? null : others.reduce((best, one) => (compareIn(order, one, best) < 0 ? one : best), first).part.id;
}

function surveyedLines({ places, judgedAt }: Pick<SurveyedCatalog, 'places' | 'judgedAt'>, order: Order): Line<PlacedFit>[] {
  return linesOf(places.map((fit) => placedOf(fit, judgedAt)).sort((a, b) => compareIn(order, a, b)));
}

interface PlacedFit extends Placed {
  readonly fit: SurveyedFit;
}

function placedOf(fit: SurveyedFit, judgedAt: (fit: SurveyedFit) => JudgedPart): PlacedFit {
  const { view, current } = fit;
  const verdicts = fit.digests.filter((digest) => digest !== null);
  const { price } = piece(view, 'price', fit.price);
  const { family } = piece(view, 'family', fit.family);
  return {
    fit, current, verdicts,
    proof: fit.isGuaranteed ? 'limits' : 'typical',
    merit: meritOf({ part: { price }, current, verdicts }),
    part: { tier: view.tier, price, family, get id() { return view.id(fit.position); } },
    // With nothing but limits behind it there is nothing to confirm.
    get confirm() { return fit.isGuaranteed ? [] : judgedAt(fit).confirm; },
  };
}

function piece<Name extends 'price' | 'family'>(view: ScreenView, trait: Name & Trait, code: number): Pick<Part, Name> {
  return view.piece(trait, code) as Pick<Part, Name>;
}
