import type { Corner, DcErrorDemand } from '../demands/index.js';
import { formatQuantity } from '../quantities/format.js';
import { rootSumSquare } from '../formulas/dc-error.js';
import { DOUBLING } from '../parts/currents.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { BriefBound, BriefNumbers } from '../verdicts/brief-finding.js';
import type { BoundFinding, Finding, NumberFinding, Term } from '../verdicts/finding.js';
import { composed, type Known } from './check.js';
import { countedTerms } from './dc-error-counted.js';
import { basisOf, currentOf, SUM_TERMS, totalOf, type DcErrorFound, type Total } from './dc-error-sum.js';
import { biasTerm, byDoubling, commonModeTerm, driftTerm, offsetCurrentTerm, offsetTerm, outputTerm, type ErrorQuestion, type ErrorTerm } from './dc-error-terms.js';
import { boundStands, numbersStand, rowOf, type InNumbers } from './in-numbers.js';

const NUMBERS: InNumbers<DcErrorDemand, DcErrorFound> = {
  terms: SUM_TERMS,
  finding: (asked, row) => decidedBy(asked, totalOf(asked, row)),
  stands(asked, row) {
    const { known, borrowed, weakness, missing } = totalOf(asked, row);
    return missing > 0 ? boundStands(asked, known) : numbersStand(asked, { offered: known, borrowed, weakness });
  },
};

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
    doubles: (_, readings) => readings.inputDoubles(),
    bias: (asked, readings) => byDoubling('biasCurrent', readings, (reading) => biasTerm(asked, reading, readings)),
    offsetCurrent: (asked, readings) => byDoubling('offsetCurrent', readings, (reading) => offsetCurrentTerm(asked, reading, readings)),
    offsetCurrentOfClass: (asked, readings) => offsetCurrentTerm(asked, readings.ofClass('offsetCurrent'), readings),
    isWorst: (_, readings) => readings.bounded(1, 0) === 1,
    commonMode: commonModeTerm,
    supply: (_, readings) => readings.figureOrClass('supplyRejection'),
    output: outputTerm,
  },
  whole: summed,
  finding: againstLimit,
  inNumbers: NUMBERS,
});

type Told = Pick<Readings, 'brief'>;

function offsetOf(asked: ErrorQuestion, readings: Readings): DcErrorFound['offset'] {
  const reading = readings.offset();
  return { reading, term: offsetTerm(asked, reading, readings) };
}

/** The sum itself, whatever is allowed, V. */
interface DcErrorSum {
  readonly total: Total;
  /** Null where only the decision is wanted. */
  readonly told: ToldSum | null;
}

interface ToldSum extends Pick<NumberFinding, 'corner' | 'cautions'> {
  readonly terms: readonly Term[];
  readonly missing: readonly Extract<ErrorTerm, { readonly kind: 'missing' }>[];
}

function summed(asked: ErrorQuestion, found: Known<DcErrorFound>, { brief }: Told): DcErrorSum {
  const row = rowOf(NUMBERS, asked, found);
  const total = totalOf(asked, row);
  if (brief) return { total, told: null };
  const counted = countedTerms(asked, found, row);
  const terms = counted.flatMap((one) => (one.kind === 'value' ? [one.term] : []));
  const missing = counted.flatMap((one) => (one.kind === 'missing' ? [one] : []));
  const corner = cornerOf(asked, fartherEnd(asked, found.offset().reading?.ratedSupply ?? asked.supply.nominal), terms);
  return { total, told: { terms, missing, corner, cautions: sourceCaution(asked, currentOf(found, 'bias').reading) } };
}

function againstLimit(asked: DcErrorDemand, { total, told }: DcErrorSum): Finding {
  const decided = decidedBy(asked, total);
  if (told === null) return decided;
  const { missing, ...words } = told;
  if (decided.kind === 'numbers') return { ...decided, ...words, rss: rootSumSquare(words.terms.map(({ value }) => value)) };
  const [first] = missing;
  const turnsAt = missing.length === 1 && total.known < asked.required ? (first?.turnsAt(asked.required - total.known) ?? null) : null;
  return { ...decided, ...words, missing: missing.map((one) => one.missing), turnsAt };
}

/** The numbers that decide: with a term missing the sum is only a bound. */
function decidedBy(asked: DcErrorDemand, total: Total): NumberFinding | BoundFinding {
  const basis = basisOf(total);
  return total.missing > 0 ? new BriefBound(asked, basis, total.known) : new BriefNumbers(asked, basis, { offered: total.known, borrowed: total.borrowed });
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
