import { toNumber } from './decimal.js';
import type { ReadFigure } from './figure.js';
import { formatQuantity } from './format.js';
import { measure, type Measured } from './measure.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { acceptUnit } from './unit-acceptance.js';
import type { UnitReading } from './unit-reading.js';

/**
 * One unit at the end covers the figures before it (rule Q-11); when it carries a prefix, only if they rise with it.
 * Throws Refusal Q008 when the prefix may belong to the last figure alone.
 */
export function shareUnit(reads: readonly ReadFigure[], reading: Reading): ReadFigure[] {
  const last = reads.at(-1);
  if (last?.unit == null) return shareFirst(reads, reading);
  const { unit } = last;
  const bare = reads.filter((read) => read.unit === null);
  if (bare.length === 0) return [...reads];
  if (unit.dimension !== null) acceptUnit({ ...unit, dimension: unit.dimension }, last, reading);
  if (unit.prefix !== '' && !rises(reads)) refuseShared(reads, unit, reading);
  return reads.map((read) => (read.unit === null ? { ...read, unit } : read));
}

/** `3 V..4.2`: a unit without prefix on the first figure leaves one reading; with a prefix it does not. */
function shareFirst(reads: readonly ReadFigure[], reading: Reading): ReadFigure[] {
  const unit = reads[0]?.unit;
  if (unit == null || reading.header !== null) return [...reads];
  if (unit.prefix !== '') refusePrefixAhead(reads, unit, reading);
  return reads.map((read) => (read.unit === null ? { ...read, unit } : read));
}

/** Measures in the order typed, or last first when no figure has a unit: the fix then adds it where it covers all. */
export function measureAll(reads: readonly ReadFigure[], reading: Reading): Measured[] {
  const last = reads.at(-1);
  if (last !== undefined && reads.every((read) => read.unit === null)) measure(last, reading);
  return reads.map((read) => measure(read, reading));
}

const plainNumber = (read: ReadFigure): number => toNumber(read.number.mantissa, read.number.exponent) * (read.figure.sign === '-' ? -1 : 1);

const rises = (reads: readonly ReadFigure[]): boolean =>
  reads.every((read, index) => index === 0 || plainNumber(reads[index - 1] ?? read) < plainNumber(read));

function extent(reads: readonly ReadFigure[]): { start: number; end: number } {
  return { start: reads[0]?.figure.start ?? 0, end: reads.at(-1)?.figure.end ?? 0 };
}

function refuseShared(reads: readonly ReadFigure[], unit: UnitReading, reading: Reading): never {
  const [first, last] = [reads[0], reads.at(-1)];
  if (first === undefined || last === undefined) throw new RangeError('a shared unit needs figures');
  const base = unit.canonical.replace(/^[fpnµmkMGT]/, '') || (reading.rule.dimensions[0] ?? '');
  const prefixed = unit.dimension === null ? unit.canonical + base : unit.canonical;
  const rescued = plainNumber(first) < toNumber(last.number.mantissa, last.number.exponent + unit.exponent);
  const texts = reads.map((read) => read.figure.sign + read.figure.number.text);
  const equal = plainNumber(first) === plainNumber(last);
  const where = extent(reads);
  if (!rescued && !equal) {
    const turned = reads.length === 2 ? patched(reading, where, `${texts.toReversed().join('..')} ${prefixed}`) : undefined;
    throw new Refusal('Q007', 'the figures run downwards', { ...where, fix: turned });
  }
  const problem = equal ? `this is ${texts[0] ?? ''} ${prefixed} to ${texts.at(-1) ?? ''} ${prefixed}` : 'the range runs downwards';
  const fix = [...texts.slice(0, -1).map((text) => `${text} ${base}`), `${texts.at(-1) ?? ''} ${prefixed}`].join('..');
  throw new Refusal('Q008', `with one shared unit ${problem}`, { ...where, fix: reads.length === 2 ? patched(reading, where, fix) : undefined });
}

function refusePrefixAhead(reads: readonly ReadFigure[], unit: UnitReading, reading: Reading): never {
  const bare = reads.find((read) => read.unit === null);
  const figure = bare?.figure ?? extent(reads);
  const typed = reading.text.slice(figure.start, figure.end);
  const symbol = unit.dimension === null ? unit.canonical + (reading.rule.dimensions[0] ?? '') : unit.canonical;
  throw new Refusal('Q008', `whether the prefix of ${symbol} also holds for ${typed} is not said`, {
    start: figure.start,
    end: figure.end,
    fix: patched(reading, figure, `${typed} ${symbol}`),
  });
}

/** `5±0.25 V`: the unit of an absolute tolerance covers the value, with a prefix only when the value is the larger number. */
export function shareWithTolerance(value: ReadFigure, tolerance: readonly ReadFigure[], reading: Reading): ReadFigure {
  const unit = tolerance.at(-1)?.unit ?? null;
  if (value.unit !== null || unit === null || unit.dimension === '1' || reading.header !== null) return value;
  const smaller = tolerance.every((side) => Math.abs(plainNumber(side)) < Math.abs(plainNumber(value)));
  if (unit.prefix === '' || smaller) return { ...value, unit };
  const { figure } = value;
  const typed = reading.text.slice(figure.start, figure.end);
  const base = unit.dimension ?? reading.rule.unit;
  const whole = patched(reading, figure, `${typed} ${base}`);
  const amount = formatQuantity(toNumber(value.number.mantissa, value.number.exponent + unit.exponent), base, { digits: 12 });
  throw new Refusal('Q008', `with one shared unit the value would be ${amount}, less than its tolerance`, { ...figure, fix: whole });
}
