import type { Corner, DcErrorDemand } from '../demands/index.js';
import { formatQuantity } from '../quantities/format.js';
import { addWorstCase, rootSumSquare } from '../formulas/dc-error.js';
import { BASES, weaknessOf } from '../parts/basis.js';
import { DOUBLING } from '../parts/currents.js';
import type { OffsetReading } from '../parts/offset.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { BoundFinding, Finding, NumberFinding, Term } from '../verdicts/finding.js';
import { composed, type Known } from './check.js';
import { biasTerm, commonModeTerm, currentTerms, driftTerm, offsetCurrentTerm, offsetTerm, outputTerm, supplyTerm, type CurrentTerm, type ErrorQuestion, type ErrorTerm } from './dc-error-terms.js';

/** Sum of the magnitudes of all DC errors at the output, worst corner, against its limit (M5). */
export const dcError = composed<DcErrorDemand, DcErrorFound, DcErrorSum>({
  id: 'dc-error',
  title: 'DC error',
  unit: 'V',
  reads: ['offsetVoltage', 'offsetDrift', 'biasCurrent', 'offsetCurrent', 'commonModeRejection', 'supplyRejection', 'openLoopGain'],
  hasMargin: true,
  asks: (demands) => demands['dc-error'],
  terms: {
    offset: offsetOf,
    drift: driftTerm,
    bias: biasTerm,
    offsetCurrent: (asked, readings) => offsetCurrentTerm(asked, readings.figure('offsetCurrent'), readings),
    offsetCurrentOfClass: (asked, readings) => offsetCurrentTerm(asked, readings.ofClass('offsetCurrent'), readings),
    bounded: (_, readings) => (worst, best) => readings.bounded(worst, best),
    commonMode: commonModeTerm,
    supply: (_, readings) => readings.figureOrClass('supplyRejection'),
    output: outputTerm,
  },
  whole: summed,
  finding: againstLimit,
});

/** What the sum is put together from. */
interface DcErrorFound {
  readonly offset: { readonly reading: OffsetReading | null; readonly term: ErrorTerm };
  readonly drift: ErrorTerm;
  readonly bias: CurrentTerm;
  readonly offsetCurrent: CurrentTerm;
  readonly offsetCurrentOfClass: CurrentTerm;
  readonly bounded: Readings['bounded'];
  readonly commonMode: ErrorTerm;
  /** What it adds depends on the supply the offset is rated at. */
  readonly supply: Reading | null;
  readonly output: ErrorTerm;
}

type Told = Pick<Readings, 'brief'>;

function offsetOf(asked: ErrorQuestion, readings: Readings): DcErrorFound['offset'] {
  const reading = readings.offset();
  return { reading, term: offsetTerm(asked, reading, readings) };
}

/** The sum itself, whatever is allowed, V. */
interface DcErrorSum extends Pick<NumberFinding, 'terms' | 'corner' | 'cautions' | 'basis' | 'rss' | 'borrowed'> {
  readonly known: number;
  readonly missing: readonly MissingTerm[];
}

type MissingTerm = Extract<ErrorTerm, { readonly kind: 'missing' }>;

function summed(asked: ErrorQuestion, found: Known<DcErrorFound>, told: Told): DcErrorSum {
  const sum: Sum = { known: 0, borrowed: 0, weakness: 0, missing: [], terms: told.brief ? null : [] };
  addAll(sum, asked, { found, told });
  const { known, borrowed, missing, terms } = sum;
  const basis = BASES[sum.weakness] ?? 'guaranteed';
  if (terms === null) return { known, missing, basis, borrowed };
  const { reading: offset } = found.offset();
  const corner = cornerOf(asked, fartherEnd(asked, offset?.ratedSupply ?? asked.supply.nominal), terms);
  return { known, missing, basis, borrowed, terms, corner, cautions: sourceCaution(asked, found.bias().reading), rss: rootSumSquare(terms.map(({ value }) => value)) };
}

/** What was added up so far. */
interface Sum {
  /** V. */
  known: number;
  /** V of it that is borrowed. */
  borrowed: number;
  /** Of the weakest basis in it. */
  weakness: number;
  readonly missing: MissingTerm[];
  /** Null where they are not told: a survey adds up as many sums as there are parts. */
  readonly terms: Term[] | null;
}

/** No drift beside an offset rated over temperature. */
function addAll(sum: Sum, asked: ErrorQuestion, { found, told }: { readonly found: Known<DcErrorFound>; readonly told: Told }): void {
  const { reading: offset, term } = found.offset();
  add(sum, term);
  if (offset?.overTemperature !== true) add(sum, found.drift());
  for (const one of currentTerms(asked, { bias: found.bias, offset: found.offsetCurrent, ofClass: found.offsetCurrentOfClass, bounded: found.bounded }, told)) add(sum, one);
  add(sum, found.commonMode());
  add(sum, supplyTerm(asked, { offset, rejection: found.supply() }, told));
  add(sum, found.output());
}

function add(sum: Sum, one: ErrorTerm): void {
  if (one.kind === 'missing') sum.missing.push(one);
  if (one.kind !== 'value') return;
  const { value, basis } = one.term;
  sum.known = addWorstCase(sum.known, value);
  if (basis === 'borrowed') sum.borrowed = addWorstCase(sum.borrowed, value);
  sum.weakness = Math.max(sum.weakness, weaknessOf(basis));
  sum.terms?.push(one.term);
}

function againstLimit(asked: DcErrorDemand, sum: DcErrorSum, { brief }: Told): Finding {
  if (brief) return brieflyAgainst(asked, sum);
  const { required, unit, sense } = asked;
  const { known, missing, rss, borrowed, ...told } = sum;
  const common = { required, unit, sense, ...told };
  const [first] = missing;
  if (first !== undefined) {
    const turnsAt = missing.length === 1 && known < required ? first.turnsAt(required - known) : null;
    return { kind: 'bound', ...common, known, missing: missing.map((one) => one.missing), cause: 'missing-figure', turnsAt } satisfies BoundFinding;
  }
  return { kind: 'numbers', ...common, offered: known, ...(rss === undefined ? {} : { rss }), ...(borrowed === undefined ? {} : { borrowed }) };
}

/** The same numbers, and nothing spread: a sweep holds every part of a catalog against one limit after the other. */
function brieflyAgainst({ required, unit, sense }: DcErrorDemand, { known, missing, basis, borrowed = 0 }: DcErrorSum): NumberFinding | BoundFinding {
  if (missing.length > 0) return { kind: 'bound', required, unit, sense, basis, known, missing: [], cause: 'missing-figure' };
  return { kind: 'numbers', required, unit, sense, basis, offered: known, borrowed };
}

/** One temperature, unless the offset stands at the cold end and currents that double at the hot one. */
function cornerOf({ temperature, hottest }: ErrorQuestion, supply: number, terms: readonly Term[]): Corner {
  const doubled = terms.some(({ how }) => how?.includes(DOUBLING) === true);
  return doubled && temperature !== hottest ? { supply, temperature, currentTemperature: hottest } : { temperature, supply };
}

/** The tolerance of the source is not among the terms of the sum; what it could add is told. */
function sourceCaution(asked: ErrorQuestion, bias: Reading | null): string[] {
  if (asked.sourceSpread === 0 || bias === null) return [];
  const added = asked.noiseGain * bias.value * asked.sourceSpread;
  return [`the tolerance of the source resistance may add ${formatQuantity(added, 'V', { round: 'up' })} of bias-current error, not charged`];
}

/** The supply end farther from the one the offset is rated at. */
function fartherEnd(asked: ErrorQuestion, rated: number): number {
  const { min, max } = asked.supply;
  return Math.abs(min - rated) > Math.abs(max - rated) ? min : max;
}
