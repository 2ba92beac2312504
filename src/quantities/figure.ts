import { formatQuantity } from './format.js';
import { readLetterCode, readToleranceLetter } from './letter-code.js';
import { readNumber, type DecimalText } from './number.js';
import { toNumber } from './decimal.js';
import type { Figure } from './syntax.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { unknownUnit } from './unit-refusals.js';
import type { UnitReading } from './unit-reading.js';
import { readUnit } from './units.js';

/** A figure with number and unit read, before units are shared and before anything is converted. */
export interface ReadFigure {
  readonly figure: Figure;
  readonly number: DecimalText;
  /** Null when none was written. */
  readonly unit: UnitReading | null;
  /** Percent, from a tolerance letter. */
  readonly letterTolerance?: number;
}

/** Reads number and unit of one figure. Throws Refusal. */
export function readFigure(figure: Figure, reading: Reading): ReadFigure {
  return figure.number.type === 'code' ? readCode(figure, reading) : readPlain(figure, reading);
}

function readPlain(figure: Figure, reading: Reading): ReadFigure {
  const { number: token, unit: unitToken } = figure;
  const place = { start: token.start, decimal: reading.context.decimal, unit: unitToken?.text };
  const number = readNumber(token.text, place);
  if (unitToken === null) return { figure, number, unit: null };
  const marked = reading.kind === 'resistance' ? /^R([A-QS-Z])$/.exec(unitToken.text) : null;
  if (marked !== null) {
    const plain = formatQuantity(toNumber(number.mantissa, number.exponent), 'Ω', { digits: 12 });
    const letterTolerance = readToleranceLetter(marked[1] ?? '', figure, { reading, plain });
    return { figure, number, unit: readUnit('Ω', reading.kind), letterTolerance };
  }
  // A farad is no temperature; F alone is what °F lost its sign from.
  if (reading.kind === 'temperature' && unitToken.text === 'F') unknownUnit(figure, reading);
  const unit = defaultDollar(unitToken.text, reading) ?? readUnit(unitToken.text, reading.kind) ?? unknownUnit(figure, reading);
  if (number.scaled && unit.prefix !== '' && unit.wrongCase === undefined) refuseTwoScales({ figure, number, unit }, reading);
  return { figure, number, unit };
}

/** `$` is whichever dollar has been set as the currency of the column, and no other. */
function defaultDollar(typed: string, { kind, header }: Reading): UnitReading | null {
  return kind === 'price' && typed === '$' && header !== null && /^(?:USD|AUD|CAD|HKD|NZD|SGD|TWD)$/.test(header.canonical) ? header : null;
}

function readCode(figure: Figure, reading: Reading): ReadFigure {
  const code = readLetterCode(figure, reading);
  const own = readUnit(code.unit, reading.kind) ?? unknownUnit(figure, reading);
  const typed = figure.unit?.text;
  if (typed === undefined) return { figure, number: code.number, unit: own };
  const plain = formatQuantity(toNumber(code.number.mantissa, code.number.exponent), code.unit, { digits: 12 });
  const isLetter = /^[A-Za-z]$/.test(typed) && typed !== code.unit && !(typed === 'R' && code.unit === 'Ω');
  if (isLetter) {
    const letterTolerance = readToleranceLetter(typed, figure, { reading, plain });
    return { figure, number: code.number, unit: own, letterTolerance };
  }
  const unit = readUnit(typed, reading.kind) ?? unknownUnit(figure, reading);
  if (unit.prefix !== '') refuseTwoScales({ figure, number: code.number, unit }, reading);
  return { figure, number: code.number, unit };
}

function refuseTwoScales(read: Required<Omit<ReadFigure, 'letterTolerance'>> & { unit: UnitReading }, reading: Reading): never {
  const { figure, number, unit } = read;
  const value = toNumber(number.mantissa, number.exponent + unit.exponent) * (figure.sign === '-' ? -1 : 1);
  const symbol = unit.dimension ?? reading.rule.unit;
  const typed = reading.text.slice(figure.start, figure.end);
  const cause = figure.number.type === 'code' ? 'a letter code and a prefix' : 'an exponent and a prefix';
  const fix = Number.isFinite(value) ? patched(reading, figure, formatQuantity(value, symbol, { digits: 12 })) : undefined;
  throw new Refusal('Q012', `${typed} has two scale factors: ${cause} together`, { start: figure.start, end: figure.end, fix });
}
