import { currentOf, currentsIn, hasDrift, wholeBiasIn, type DcErrorFound } from './dc-error-sum.js';
import { supplyTerm, wholeBiasTerm, type ErrorQuestion, type ErrorTerm } from './dc-error-terms.js';
import type { Known } from './check.js';
import type { Row } from './in-numbers.js';

/** The terms that were added up, in words and in the same order. */
export function countedTerms(asked: ErrorQuestion, found: Known<DcErrorFound>, row: Row): ErrorTerm[] {
  const { reading: offset, term } = found.offset();
  const drift = hasDrift(row) ? [found.drift()] : [];
  return [term, ...drift, ...currentTerms(asked, found, row), found.commonMode(), supplyTerm(asked, { offset, rejection: found.supply() }), found.output()];
}

/** Those that stand for the currents. */
export function currentTerms(asked: ErrorQuestion, found: Known<DcErrorFound>, row: Row): ErrorTerm[] {
  const { reading, term } = currentOf(found, 'bias');
  switch (currentsIn(asked, row)) {
    case 'none': return [];
    case 'both': return [term, currentOf(found, 'offsetCurrent').term];
    case 'bias': return [term];
    case 'of-class': return [found.offsetCurrentOfClass().term];
    case 'bias-and-class': return [term, found.offsetCurrentOfClass().term];
    case 'whole-bias': return reading === null ? [] : [wholeBiasTerm(asked, reading, wholeBiasIn(asked, row))];
  }
}
