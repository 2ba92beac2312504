import { TRAIT_NUMBER } from '../parts/screen-view.js';
import type { Trait } from '../parts/traits.js';
import { segmentOf } from './buffers.js';
import { COUNTS, type Digest } from './digest.js';
import type { OpenSegment } from './open-parts.js';
import type { Counting, SurveyedFit } from './survey.js';

/** Parts of one segment that fit. */
interface Fitting {
  readonly first: number;
  readonly fitting: readonly number[];
  readonly count: number;
  readonly codes: (trait: number) => Int32Array;
  /** What was known of them before; null: everything was asked now. */
  readonly known: OpenSegment | null;
}

/** The parts that fit, with what their place in the order depends on. */
export function fitsIn(counting: Counting, fitting: Fitting): SurveyedFit[] {
  const { known, fitting: parts } = fitting;
  if (known === null) return madeFits(counting, { ...fitting, digestsOf: askedNow(counting) });
  const { places } = counting.buffers;
  const fresh = parts.filter((part) => known.fits[places[part] ?? 0] === undefined);
  const made = madeFits(counting, { ...fitting, fitting: fresh, digestsOf: laidBy(counting, known) });
  fresh.forEach((part, at) => void (known.fits[places[part] ?? 0] = made[at]));
  return parts.flatMap((part) => withOthers(counting, known.fits[places[part] ?? 0], part) ?? []);
}

type DigestsOf = (part: number) => (Digest | null)[];

function askedNow({ questions, buffers }: Counting): DigestsOf {
  return (part) => questions.map(({ digests }, at) => digests.pass(buffers.answers[at]?.[part] ?? 0));
}

/** In the order these questions were asked: where they stand among all of a stage differs from stage to stage. */
function laidBy({ questions, plan, buffers: { places } }: Counting, { answers }: OpenSegment): DigestsOf {
  return (part) => (plan?.same ?? []).map((at, number) => questions[at]?.digests.pass(answers[number]?.[places[part] ?? 0] ?? 0) ?? null);
}

function withOthers({ questions, plan, buffers }: Counting, kept: SurveyedFit | undefined, part: number): SurveyedFit | undefined {
  if (kept === undefined || plan === null) return kept;
  const digests = new Array<Digest | null>(questions.length).fill(null);
  plan.same.forEach((at, number) => void (digests[at] = kept.digests[number] ?? null));
  for (const at of plan.others) digests[at] = questions[at]?.digests.pass(buffers.answers[at]?.[part] ?? 0) ?? null;
  const { view, position, current, price, family } = kept;
  return { view, position, digests, isGuaranteed: isGuaranteed(buffers.sums[part]), current, price, family };
}

/** All that passes on limits alone. */
const isGuaranteed = (sum = 0): boolean => (sum & (COUNTS.unknown - COUNTS.weak)) === 0;

function madeFits({ view, current, buffers }: Counting, { first, fitting, count, codes, digestsOf }: Fitting & { readonly digestsOf: DigestsOf }): SurveyedFit[] {
  if (fitting.length === 0) return [];
  current.tree.classify(segmentOf(current, { count, codes, only: Int32Array.from(fitting) }), buffers.current);
  const [prices, families] = [codes(numberOf('price')), codes(numberOf('family'))];
  return fitting.map((part) => ({
    view,
    position: first + part,
    digests: digestsOf(part),
    isGuaranteed: isGuaranteed(buffers.sums[part]),
    current: current.values[buffers.current[part] ?? 0] ?? null,
    price: prices[part] ?? 0,
    family: families[part] ?? 0,
  }));
}

const numberOf = (trait: Trait): number => TRAIT_NUMBER.get(trait) ?? 0;
