import type { Corner, DcErrorDemand } from '../demands/index.js';
import { formatQuantity } from '../quantities/format.js';
import { rootSumSquare, worstCaseSum } from '../formulas/dc-error.js';
import { weakest } from '../parts/basis.js';
import { DOUBLING } from '../parts/currents.js';
import type { OffsetReading } from '../parts/offset.js';
import type { Readings } from '../parts/readings.js';
import type { BoundFinding, Finding, Term } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { commonModeTerm, currentTerms, driftTerm, offsetTerm, outputTerm, supplyTerm, type ErrorTerm } from './dc-error-terms.js';

/** Sum of the magnitudes of all DC errors at the output, worst corner, against its limit (M5). */
export const dcError: Check<DcErrorDemand> = {
  id: 'dc-error',
  title: 'DC error',
  unit: 'V',
  reads: ['offsetVoltage', 'offsetDrift', 'biasCurrent', 'offsetCurrent', 'commonModeRejection', 'supplyRejection', 'openLoopGain'],
  hasMargin: true,
  asks: (demands) => demands['dc-error'],
  judge: judgeDcError,
};

function judgeDcError(asked: DcErrorDemand, readings: Readings): Finding {
  const offset = readings.offset();
  const all = termsOf(asked, offset, readings);
  const terms = all.flatMap((one) => (one.kind === 'value' ? [one.term] : []));
  const known = worstCaseSum(terms.map((term) => term.value));
  const missing = all.filter((one) => one.kind === 'missing');
  const { required, unit, sense } = asked;
  const corner = cornerOf(asked, fartherEnd(asked, offset?.ratedSupply ?? asked.supply.nominal), terms);
  const cautions = readings.brief ? [] : sourceCaution(asked, readings);
  const common = { required, unit, sense, terms, corner, cautions, basis: weakest(terms.map((term) => term.basis)) };
  const [first] = missing;
  if (first !== undefined) {
    const turnsAt = missing.length === 1 && known < required ? first.turnsAt(required - known) : null;
    return { kind: 'bound', ...common, known, missing: missing.map((one) => one.missing), cause: 'missing-figure', turnsAt } satisfies BoundFinding;
  }
  return { kind: 'numbers', ...common, offered: known, rss: rootSumSquare(terms.map((term) => term.value)), borrowed: borrowedSum(terms) };
}

/** One temperature, unless the offset stands at the cold end and currents that double at the hot one. */
function cornerOf({ temperature, hottest }: DcErrorDemand, supply: number, terms: readonly Term[]): Corner {
  const doubled = terms.some(({ how }) => how?.includes(DOUBLING) === true);
  return doubled && temperature !== hottest ? { supply, temperature, currentTemperature: hottest } : { temperature, supply };
}

/** The tolerance of the source is not among the terms of the sum; what it could add is told. */
function sourceCaution(asked: DcErrorDemand, readings: Readings): string[] {
  const bias = readings.figure('biasCurrent')?.value;
  if (asked.sourceSpread === 0 || bias === undefined) return [];
  const added = asked.noiseGain * bias * asked.sourceSpread;
  return [`the tolerance of the source resistance may add ${formatQuantity(added, 'V', { round: 'up' })} of bias-current error, not charged`];
}

/** The supply end farther from the one the offset is rated at. */
function fartherEnd(asked: DcErrorDemand, rated: number): number {
  const { min, max } = asked.supply;
  return Math.abs(min - rated) > Math.abs(max - rated) ? min : max;
}

function termsOf(asked: DcErrorDemand, offset: OffsetReading | null, readings: Readings): ErrorTerm[] {
  return [
    offsetTerm(asked, offset, readings),
    driftTerm(asked, offset, readings),
    ...currentTerms(asked, readings),
    commonModeTerm(asked, readings),
    supplyTerm(asked, offset, readings),
    outputTerm(asked, readings),
  ];
}

function borrowedSum(terms: readonly Term[]): number {
  return worstCaseSum(terms.filter((term) => term.basis === 'borrowed').map((term) => term.value));
}
