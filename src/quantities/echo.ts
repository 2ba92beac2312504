import { formatPercent, formatQuantity } from './format.js';
import type { FieldKind } from './kinds.js';
import type { Measured } from './measure.js';
import { ends, type Side, type Toleranced } from './tolerance.js';

/**
 * The canonical forms of a Quantity. They carry U+2212 for the minus (unlike `formatQuantity`, whose text is for terminals
 * and files): the echo is what the reader compares with what was typed, and it is read back all the same.
 */
const EXACT = { digits: 12 } as const;
/** Figures in parentheses are derived, often irrational; four digits, common practice. */
const DERIVED = { digits: 4 } as const;

const typographic = (text: string): string => text.replaceAll('-', '−');

/** A number of a kind in its SI unit, exact to 12 digits; a charge as batteries state it. */
export function echoNumber(value: number, kind: FieldKind, unit: string): string {
  if (kind === 'fraction') return typographic(formatPercent(value, EXACT));
  if (kind === 'ratio') return typographic(formatQuantity(20 * Math.log10(value), 'dB', EXACT));
  if (kind === 'charge') return formatQuantity(value / 3600, 'Ah', EXACT);
  return typographic(formatQuantity(value, unit, EXACT));
}

/** A value of its own: with what was typed when that says more (dB, Vpp, rms, V/mV, C). */
export function echoValue(measured: Measured, kind: FieldKind, unit: string): string {
  if (kind === 'amplitude') return echoAmplitude(measured);
  if (kind === 'gain') return echoGain(measured);
  if (kind === 'charge' && measured.unit.dimension === 'C') return formatQuantity(measured.value, 'C', EXACT);
  if (kind === 'ratio' && measured.unit.dimension !== 'dB') return typographic(echoRejection(measured));
  return echoNumber(measured.value, kind, unit);
}

function echoAmplitude({ value, unit, typed }: Measured): string {
  if (unit.dimension === 'Vpk') return typographic(formatQuantity(value, 'Vpk', EXACT));
  const peak = formatQuantity(value, 'Vpk', DERIVED);
  if (unit.dimension === 'Vpp') return `${formatQuantity(value * 2, 'Vpp', EXACT)} (${peak})`;
  if (unit.dimension === 'Vrms') return `${formatQuantity(value / Math.SQRT2, 'Vrms', EXACT)} (${peak}, sine)`;
  const level = formatQuantity(typed, unit.dimension, EXACT);
  return typographic(`${level} (${formatQuantity(value / Math.SQRT2, 'Vrms', DERIVED)}, sine)`);
}

function echoGain({ value, unit, typed }: Measured): string {
  if (unit.dimension === 'dB') return typographic(`${formatQuantity(typed, 'dB', EXACT)} (${formatQuantity(value, 'V/V', DERIVED)})`);
  return typographic(formatQuantity(value, 'V/V', EXACT)) + (value < 0 ? ' (inverting)' : '');
}

function echoRejection({ value, unit, typed }: Measured): string {
  const decibels = formatQuantity(20 * Math.log10(value), 'dB', DERIVED);
  return `${decibels} (${formatQuantity(typed, unit.canonical, EXACT)})`;
}

const LIMIT_WORDS = { min: 'at least', typ: 'typically', max: 'at most' } as const;

/** `at most 5 mV`. */
export function echoLimit(value: number, limit: 'min' | 'typ' | 'max', how: { kind: FieldKind; unit: string }): string {
  return `${LIMIT_WORDS[limit]} ${echoNumber(value, how.kind, how.unit)}`;
}

/** A rejection keeps its unit: `at most 50 µV/V` says the same as at least 86 dB, and exactly. */
export function echoTypedLimit({ typed, unit }: Measured, limit: 'min' | 'typ' | 'max'): string {
  return `${LIMIT_WORDS[limit]} ${formatQuantity(typed, unit.canonical, EXACT)}`;
}

/** `min 3 V, typ 3.6 V, max 4.2 V`, of those that are known. */
export function echoFigures(figures: { min?: number; nominal?: number; max?: number }, kind: FieldKind, unit: string): string {
  const words: [string, number | undefined][] = [['min', figures.min], ['typ', figures.nominal], ['max', figures.max]];
  return words.flatMap(([word, value]) => (value === undefined ? [] : [`${word} ${echoNumber(value, kind, unit)}`])).join(', ');
}

/** `3 V..4.2 V`. */
export function echoRange(min: number, max: number, how: { kind: FieldKind; unit: string }): string {
  return `${echoNumber(min, how.kind, how.unit)}..${echoNumber(max, how.kind, how.unit)}`;
}

/** `5 V ±5 % (4.75 V..5.25 V)`; for components, which are named by value and tolerance, without the ends. */
export function echoTolerance(read: Toleranced, kind: FieldKind, unit: string): string {
  const value = echoNumber(read.nominal.value, kind, unit);
  const sides = read.symmetric ? `±${amount(read.upper, kind, unit)}` : bothSides(read, kind, unit);
  if (kind === 'resistance' || kind === 'capacitance') return `${value} ${sides}`;
  const { min, max } = ends(read);
  return `${value} ${sides} (${echoRange(min, max, { kind, unit })})`;
}

function bothSides({ upper, lower }: Toleranced, kind: FieldKind, unit: string): string {
  if (upper.relative && lower.relative) return `+${formatPercent(upper.amount, EXACT).replace(' %', '')}/−${amount(lower, kind, unit)}`;
  return `+${amount(upper, kind, unit)}/−${amount(lower, kind, unit)}`;
}

function amount(side: Side, kind: FieldKind, unit: string): string {
  return side.relative ? formatPercent(side.amount, EXACT) : echoNumber(side.amount, kind, unit);
}
