import type { Part } from '../parts/part.js';
import type { ScreenView } from '../parts/screen-view.js';
import type { Trait } from '../parts/traits.js';
import { lazyList, surveyedPart, type JudgedPart, type SurveyedCatalog, type SurveyedFit } from '../screening/index.js';
import { dominatorFinder } from './dominance.js';
import { type Line, linesOf } from './family.js';
import { meritOf, type Merit } from './merit.js';
import type { Placed } from './placed.js';
import { compareIn, tightestOf, type Order, type RankedPart } from './rank.js';

/** The order of `rank` for parts that were surveyed: made of digests; a part is read when its line is looked at, or to break a tie. */
export function rankSurveyed({ places, judgedAt }: Pick<SurveyedCatalog, 'places' | 'judgedAt'>, order: Order = 'merit'): readonly RankedPart[] {
  const lines = surveyedLines({ places, judgedAt }, order);
  const dominator = dominatorFinder(lines.map(({ first }) => first));
  return lazyList(lines.length, (at) => {
    const line = lines[at];
    if (line === undefined) throw new RangeError(`no line ${at} of ${lines.length}`);
    const { first, variants } = line;
    const ranked: Pick<RankedPart, 'merit' | 'tightest' | 'rank' | 'dominatedBy' | 'variants'> = {
      merit: first.merit,
      get tightest() { return tightestOf(judgedAt(first.fit)); },
      rank: at + 1,
      get dominatedBy() { return dominator(first)?.part.id ?? null; },
      variants: variants.map((one) => fitting(one, judgedAt)),
    };
    return withMore(fitting(first, judgedAt), ranked);
  });
}

/** A part that fits, as its digests tell of it. */
function fitting({ fit, proof, current }: PlacedFit, judgedAt: SurveyedCatalog['judgedAt']): JudgedPart {
  return surveyedPart({ get part() { return fit.view.part(fit.position); }, outcome: 'fits', proof, current, deciding: [] }, () => judgedAt(fit));
}

/** Both in one, with nothing looked at yet: a spread would ask every getter. */
function withMore<Part extends object, More extends object>(part: Part, more: More): Part & More {
  return Object.defineProperties(part, Object.getOwnPropertyDescriptors(more)) as Part & More;
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
  readonly merit: Merit;
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
