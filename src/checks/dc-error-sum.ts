import type { DcErrorDemand } from '../demands/index.js';
import { addWorstCase } from '../formulas/dc-error.js';
import { BASES, weaknessOf, type Basis } from '../parts/basis.js';
import type { OffsetReading } from '../parts/offset.js';
import type { Reading } from '../parts/reading.js';
import type { Known } from './check.js';
import { isNothing, resistancesOf, supplyMultiplier, type ByDoubling, type CurrentTerm, type ErrorQuestion, type ErrorTerm } from './dc-error-terms.js';
import { numberAt, writeReading, type InNumbers, type NumbersOf, type Row } from './in-numbers.js';

/** What the sum is put together from. */
export interface DcErrorFound {
  readonly offset: { readonly reading: OffsetReading | null; readonly term: ErrorTerm };
  readonly drift: ErrorTerm;
  /** Whether currents of this input double over temperature. */
  readonly doubles: boolean;
  readonly bias: ByDoubling;
  readonly offsetCurrent: ByDoubling;
  readonly offsetCurrentOfClass: CurrentTerm;
  /** Whether what is not known counts as its worst. */
  readonly isWorst: boolean;
  readonly commonMode: ErrorTerm;
  /** What it adds depends on the supply the offset is rated at. */
  readonly supply: Reading | null;
  readonly output: ErrorTerm;
}

/** Where the numbers of the terms stand in a row: volts at the output, amperes or V/V (not a number: missing), each with the weakness of its basis behind it. */
const AT = {
  offset: 0, isOver: 2, supplyMultiplier: 3,
  drift: 4,
  doubles: 6,
  bias: 7, offsetCurrent: 15, ofClass: 23,
  isWorst: 27,
  commonMode: 28,
  rejection: 30, rejectionWeakness: 31,
  output: 32,
} as const;

/** Where the numbers of a current stand from its own place on: A as read, and V at the output. Of an input that doubles they stand behind those of one that does not. */
const [WEAKNESS, ERROR, DOUBLING] = [1, 2, 4] as const;

type Asked = DcErrorDemand;

const ADDEND: NumbersOf<Asked, ErrorTerm> = { width: 2, write: (_, one, { row, at }) => writeAddend(one, row, at) };

const CURRENT: NumbersOf<Asked, CurrentTerm> = { width: 4, write: (_, one, { row, at }) => writeCurrent(one, row, at) };

const BY_DOUBLING: NumbersOf<Asked, ByDoubling> = {
  width: 8,
  write(_, { steady, doubling }, { row, at }) {
    writeCurrent(steady, row, at);
    writeCurrent(doubling, row, at + DOUBLING);
  },
};

function writeCurrent({ reading, term }: CurrentTerm, row: Row, at: number): void {
  writeReading(reading, { row, at });
  writeAddend(term, row, at + ERROR);
}

/** The terms in numbers, in the order of `AT`. */
export const SUM_TERMS: InNumbers<Asked, DcErrorFound>['terms'] = {
  offset: {
    width: 4,
    write(asked, { reading, term }, { row, at }) {
      writeAddend(term, row, at);
      row[at + 2] = reading?.overTemperature === true ? 1 : 0;
      row[at + 3] = supplyMultiplier(asked, reading);
    },
  },
  drift: ADDEND,
  doubles: { width: 1, write: (_, doubles, { row, at }) => void (row[at] = doubles ? 1 : 0) },
  bias: BY_DOUBLING,
  offsetCurrent: BY_DOUBLING,
  offsetCurrentOfClass: CURRENT,
  isWorst: { width: 1, write: (_, isWorst, { row, at }) => void (row[at] = isWorst ? 1 : 0) },
  commonMode: ADDEND,
  supply: { width: 2, write: (_, reading, to) => writeReading(reading, to) },
  output: ADDEND,
};

function writeAddend(one: ErrorTerm, row: Row, at: number): void {
  row[at] = one.kind === 'value' ? one.term.value : one.kind === 'missing' ? NaN : 0;
  row[at + 1] = one.kind === 'value' ? weaknessOf(one.term.basis) : 0;
}

/** A current as this input has it. */
export function currentOf(found: Known<Pick<DcErrorFound, 'doubles' | 'bias' | 'offsetCurrent'>>, name: 'bias' | 'offsetCurrent'): CurrentTerm {
  const { steady, doubling } = found[name]();
  return found.doubles() ? doubling : steady;
}

/** The same in numbers: where it stands. */
const placeOf = (row: Row, place: number): number => (numberAt(row, AT.doubles) === 1 ? place + DOUBLING : place);

/** Which terms stand for the currents: the two of the part, or what is known of them. */
export type CurrentsCounted = 'none' | 'both' | 'bias' | 'of-class' | 'bias-and-class' | 'whole-bias';

/**
 * Bias and offset current through the series resistances. With the offset current unknown the two pins may differ by the whole bias
 * current, unless the class's offset current says less: then Ib·(Rp+Rn) stands for both, at best the offset current is nothing.
 */
export function currentsIn(asked: ErrorQuestion, row: Row): CurrentsCounted {
  const { sum, matched, half } = resistancesOf(asked);
  if (sum === 0) return 'none';
  if (!Number.isNaN(numberAt(row, placeOf(row, AT.offsetCurrent)))) return 'both';
  const bias = numberAt(row, placeOf(row, AT.bias));
  // Matched pins leave nothing of the bias current to charge, but what they differ by is not known then.
  if (Number.isNaN(bias)) return isNothing(matched) ? 'of-class' : 'bias';
  const withClass = matched * bias + half * numberAt(row, AT.ofClass);
  return withClass < asked.noiseGain * sum * bias ? 'bias-and-class' : 'whole-bias';
}

/** What the bias current adds where it stands for the offset current too, V. */
export function wholeBiasIn(asked: ErrorQuestion, row: Row): number {
  const { sum, matched } = resistancesOf(asked);
  const bias = numberAt(row, placeOf(row, AT.bias));
  return numberAt(row, AT.isWorst) === 1 ? asked.noiseGain * sum * bias : matched * bias;
}

/** No drift is charged beside an offset rated over temperature. */
export const hasDrift = (row: Row): boolean => numberAt(row, AT.isOver) === 0;

/** The sum in numbers, V. */
export interface Total {
  known: number;
  /** How much of it is borrowed. */
  borrowed: number;
  weakness: number;
  /** How many terms are missing. */
  missing: number;
}

export const basisOf = ({ weakness }: Total): Basis => BASES[weakness] ?? 'guaranteed';

/** Adds up the terms that count, in the order they are told. */
export function totalOf(asked: ErrorQuestion, row: Row): Total {
  const total: Total = { known: 0, borrowed: 0, weakness: 0, missing: 0 };
  addAt(total, row, AT.offset);
  if (hasDrift(row)) addAt(total, row, AT.drift);
  addCurrents(total, asked, row);
  addAt(total, row, AT.commonMode);
  const move = numberAt(row, AT.supplyMultiplier);
  if (!isNothing(move)) add(total, move / numberAt(row, AT.rejection), numberAt(row, AT.rejectionWeakness));
  addAt(total, row, AT.output);
  return total;
}

function addCurrents(total: Total, asked: ErrorQuestion, row: Row): void {
  const counted = currentsIn(asked, row);
  if (counted === 'none') return;
  const bias = placeOf(row, AT.bias);
  if (counted === 'whole-bias') {
    add(total, wholeBiasIn(asked, row), numberAt(row, bias + WEAKNESS));
    return;
  }
  if (counted !== 'of-class') addAt(total, row, bias + ERROR);
  if (counted === 'both') addAt(total, row, placeOf(row, AT.offsetCurrent) + ERROR);
  else if (counted !== 'bias') addAt(total, row, AT.ofClass + ERROR);
}

const BORROWED = weaknessOf('borrowed');

/** A volt figure with its weakness beside it. */
const addAt = (total: Total, row: Row, place: number): void => add(total, numberAt(row, place), numberAt(row, place + 1));

function add(total: Total, value: number, weakness: number): void {
  if (Number.isNaN(value)) {
    total.missing += 1;
    return;
  }
  total.known = addWorstCase(total.known, value);
  if (weakness === BORROWED) total.borrowed = addWorstCase(total.borrowed, value);
  if (weakness > total.weakness) total.weakness = weakness;
}
