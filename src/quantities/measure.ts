import { convert } from './convert.js';
import { toNumber } from './decimal.js';
import { formatRange } from './format.js';
import type { ReadFigure } from './figure.js';
import { supplyUnit } from './missing-unit.js';
import type { DecimalText } from './number.js';
import type { Figure } from './syntax.js';
import { isPlausible } from './plausibility.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { acceptUnit, valueIn, type KnownUnit } from './unit-acceptance.js';

/** A figure in the SI unit of its kind. */
export interface Measured {
  readonly value: number;
  readonly figure: Figure;
  readonly number: DecimalText;
  readonly unit: KnownUnit;
  /** The number as typed with its sign, before any conversion: what the echo of dB, Vpp and Vrms repeats. */
  readonly typed: number;
  /** A larger typed number means a smaller value (rejection in µV/V or in negative dB): limits and ends swap. */
  readonly falling: boolean;
  readonly letterTolerance: number | undefined;
  readonly notes: readonly string[];
}

/** Converts a figure whose unit has been shared or not; checks kind, letter case and sign, but not the size. Throws Refusal. */
export function measure(read: ReadFigure, reading: Reading): Measured {
  const { figure, number } = read;
  const unit = acceptUnit(supplyUnit(read, reading), read, reading);
  refuseSign(read, unit, reading);
  const typed = toNumber(number.mantissa, number.exponent) * (figure.sign === '-' ? -1 : 1);
  const scaled = toNumber(number.mantissa, number.exponent + unit.exponent) * (figure.sign === '-' ? -1 : 1);
  const rejection = reading.kind === 'ratio' && unit.dimension === 'V/V' && unit.exponent < 0;
  refuseCrest(read, unit, reading);
  const value = rejection ? toNumber('1', -(number.exponent + unit.exponent)) / toNumber(number.mantissa, 0) : convert(scaled, unit.dimension, reading.kind);
  const falling = rejection || (reading.kind === 'ratio' && unit.dimension === 'dB' && typed < 0);
  return { value: value === 0 ? 0 : value, figure, number, unit, typed, falling, letterTolerance: read.letterTolerance, notes: notesOf(read, unit) };
}

function notesOf(read: ReadFigure, unit: KnownUnit): string[] {
  const cased = unit.wrongCase === undefined || unit.notes.length > 0 ? [] : [`unit written ${read.figure.unit?.text ?? unit.wrongCase}: read as ${unit.canonical}`];
  return [...(read.number.note === undefined ? [] : [read.number.note]), ...unit.notes, ...cased];
}

function refuseSign(read: ReadFigure, unit: KnownUnit, reading: Reading): void {
  const { figure } = read;
  const logarithmic = unit.dimension.startsWith('dB');
  if (figure.sign !== '-' || reading.rule.signed || logarithmic || unit.dimension === 'K') return;
  const typed = reading.text.slice(figure.start, figure.end);
  if (/^[0.]*$/.test(read.number.mantissa)) return;
  const unsigned = typed.replace('-', '').trim();
  const message = `${typed} is negative; ${reading.rule.expected} of this kind is given without a minus`;
  throw new Refusal('Q019', message, { start: figure.start, end: figure.end, fix: patched(reading, figure, unsigned) });
}

/** An rms value turns into a peak only through a crest factor, and √2 is the sine's. */
function refuseCrest(read: ReadFigure, unit: KnownUnit, reading: Reading): void {
  const isRms = unit.dimension === 'Vrms' || unit.dimension === 'dBV' || unit.dimension === 'dBu';
  if (reading.kind !== 'amplitude' || !isRms || reading.context.waveform !== null) return;
  const { figure } = read;
  const number = `${figure.sign}${figure.number.text}`;
  const fix = unit.dimension === 'Vrms' ? patched(reading, figure, `${number} ${unit.canonical.replace('rms', 'pk')}`) : undefined;
  const message = `${number} ${unit.canonical} has a known peak only for a sine; give the peak of this waveform`;
  throw new Refusal('Q014', message, { start: figure.start, end: figure.end, fix });
}

/** Checks the size of a value that ends up in the quantity. Throws Refusal Q010 with the likely prefix. */
export function refuseImplausible(value: number, measured: Measured, reading: Reading): void {
  const vanished = value === 0 && measured.typed === 0 && !/^[0.]*$/.test(measured.number.mantissa);
  if (isPlausible(value, reading.kind) && !vanished) return;
  const { figure } = measured;
  const typed = reading.text.slice(figure.start, figure.end);
  throw new Refusal('Q010', explainSize(value, typed, reading), {
    start: figure.start,
    end: figure.end,
    fix: likelyFix(value, measured, reading),
  });
}

function explainSize(value: number, typed: string, { kind, rule }: Reading): string {
  if (!Number.isFinite(value)) return `${typed} is beyond any number`;
  if ((kind === 'fraction' || kind === 'share') && value > 1) return `${typed} is more than 100 %`;
  const unit = kind === 'price' || rule.unit === '1' ? '' : ` ${rule.unit}`;
  const size = Math.abs(value) >= 1e-6 && Math.abs(value) < 1e15 ? grouped(value) : String(value);
  const [low, high] = rule.plausible;
  const range = formatRange(low, high, kind === 'price' ? '' : rule.unit);
  const spelledOut = typed === size + unit ? '' : ` ${size}${unit},`;
  return `${typed} is${spelledOut} far outside anything around an op amp (${range})`;
}

function grouped(value: number): string {
  const [whole = '', fraction] = String(Number(value.toPrecision(12))).split('.');
  const text = whole.replace(/\B(?=(\d{3})+$)/g, ' ');
  return fraction === undefined ? text : `${text}.${fraction}`;
}

function likelyFix(value: number, measured: Measured, reading: Reading): string | undefined {
  const { figure, unit } = measured;
  const { kind } = reading;
  if (value === 0 || kind === 'fraction' || unit.dimension === '1' || figure.number.type === 'code') return undefined;
  const number = `${figure.sign}${figure.number.text}`;
  const rewritten = (symbol: string): string => patched(reading, figure, `${number} ${symbol}`);
  if (/^[mM]$/.test(unit.prefix) && Number.isFinite(value)) {
    const plain = unit.canonical.replace(/^[mM]/, '');
    const swapped = (unit.prefix === 'm' ? 'M' : 'm') + plain;
    const read = { figure, number: measured.number, unit };
    if (isPlausible(valueIn(swapped, read, reading), kind)) return rewritten(swapped);
    const plainFits = isPlausible(valueIn(plain, read, reading), kind);
    if (plainFits) return kind === 'supply' ? `${rewritten(plain)} (or ${number} m${plain} in another field)` : rewritten(plain);
  }
  if (kind === 'slew' && unit.canonical === 'V/s') return rewritten('V/µs');
  if (kind === 'temperature' && unit.canonical === 'K') return rewritten('°C');
  return 'check the prefix';
}
