import { toNumber } from './decimal.js';
import { readFigure, type ReadFigure } from './figure.js';
import { measure, type Measured } from './measure.js';
import type { Figure } from './syntax.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { shareWithTolerance } from './sharing.js';
import { readUnit } from './units.js';

/** A value with what it may be off by, both sides as positive amounts. */
export interface Toleranced {
  readonly nominal: Measured;
  readonly upper: Side;
  readonly lower: Side;
  readonly symmetric: boolean;
}

export interface Side {
  /** Fraction of the value, or an amount in the unit of the kind. */
  readonly amount: number;
  readonly relative: boolean;
}

/** Reads value and tolerance (rule Q-10). Throws Refusal. */
export function readTolerance(valueFigure: Figure, sides: readonly Figure[], reading: Reading): Toleranced {
  const reads = sides.map((side) => readFigure(side, reading));
  const value = shareWithTolerance(readFigure(valueFigure, reading), reads, reading);
  const nominal = measure(value, reading);
  if (nominal.letterTolerance !== undefined) refuse('the tolerance is given twice, as a letter and after the value', valueFigure);
  if (reading.kind === 'ratio') refuse('a ratio is given as a value or as a limit, without tolerance', valueFigure);
  if (nominal.unit.dimension.startsWith('dB')) refuse('a tolerance on a decibel value is not read; give it in plain units', valueFigure);
  const unit = reads.at(-1)?.unit ?? null;
  const [upper, lower] = reads.map((read) => readSide({ ...read, unit: read.unit ?? unit }, nominal, reading));
  if (upper === undefined) throw new RangeError('a tolerance has at least one side');
  return { nominal, upper, lower: lower ?? upper, symmetric: lower === undefined };
}

function refuse(message: string, figure: Figure): never {
  throw new Refusal('Q006', message, { start: figure.start, end: figure.end });
}

function readSide(read: ReadFigure, nominal: Measured, reading: Reading): Side {
  const { unit, number } = read;
  const size = (exponent: number): number => toNumber(number.mantissa, number.exponent + exponent);
  if (unit === null) return withoutUnit(read, nominal, reading);
  if (unit.dimension === '1') {
    if (reading.kind === 'temperature') refuse('a percentage of a Celsius temperature says nothing', read.figure);
    if (reading.kind === 'fraction') refuse('a percentage of a percentage: of the value, or added to it?', read.figure);
    return { amount: size(unit.exponent), relative: true };
  }
  if (reading.kind === 'temperature' && (unit.dimension === 'K' || unit.dimension === '°C')) return { amount: size(0), relative: false };
  return { amount: absolute(read, reading), relative: false };
}

function absolute(read: ReadFigure, reading: Reading): number {
  try {
    return Math.abs(measure({ ...read, figure: { ...read.figure, sign: '' } }, reading).value);
  } catch (problem) {
    if (!(problem instanceof Refusal) || problem.code !== 'Q004') throw problem;
    throw new Refusal('Q006', `the tolerance is ${problem.message}`, { start: problem.span[0], end: problem.span[1] });
  }
}

function withoutUnit(read: ReadFigure, nominal: Measured, reading: Reading): Side {
  const { figure } = read;
  if (/^[0.]*$/.test(read.number.mantissa)) return { amount: 0, relative: false };
  if (reading.rule.unitless === true) return { amount: toNumber(read.number.mantissa, read.number.exponent), relative: false };
  const typed = reading.text.slice(figure.start, figure.end);
  const percent = patched(reading, figure, `${typed} %`);
  const amount = patched(reading, figure, `${typed} ${nominal.unit.canonical}`);
  const isKnown = readUnit(nominal.unit.canonical, reading.kind) !== null;
  throw new Refusal('Q006', `the tolerance ${typed} has neither % nor a unit`, {
    start: figure.start,
    end: figure.end,
    fix: isKnown ? `${percent} or ${amount}` : percent,
  });
}

/** The ends of the tolerance band, rounded to what decimal arithmetic would give. */
export function ends(read: Toleranced): { min: number; max: number } {
  const value = read.nominal.value;
  const offset = (side: Side): number => (side.relative ? Math.abs(value) * side.amount : side.amount);
  const clean = (end: number): number => Number(end.toPrecision(15));
  return { min: clean(value - offset(read.lower)), max: clean(value + offset(read.upper)) };
}
