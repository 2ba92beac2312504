import type { DcErrorDemand } from '../demands/index.js';
import type { InputCurrent } from '../parts/currents.js';
import type { LimitKind, Parameter } from '../parts/figures.js';
import type { OffsetReading } from '../parts/offset.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Missing, Term, TurningPoint } from '../verdicts/finding.js';
import type { Unlimited } from './check.js';

/** One addend of the DC error: a value, nothing to charge, or a figure that is missing. Volts at the output. */
export type ErrorTerm =
  | { readonly kind: 'value'; readonly term: Term }
  | { readonly kind: 'nothing' }
  | { readonly kind: 'missing'; readonly missing: Missing; readonly turnsAt: (left: number) => TurningPoint };

interface Multiplied {
  readonly name: string;
  readonly figure: Parameter;
  readonly kind: LimitKind;
  readonly unit: string;
  /** Volts at the output per unit of the figure, or volts over the figure for a rejection. */
  readonly multiplier: number;
  readonly divides?: true;
  readonly how: () => string;
}

export type ErrorQuestion = Unlimited<DcErrorDemand>;

/** Only rounding is left of a multiplier below this: a move of a picovolt, and far less of any other. */
const NOTHING = 1e-12;

/** With a multiplier of nothing a term needs no figure. */
export const isNothing = (multiplier: number): boolean => multiplier <= NOTHING;

/** A term that is a figure times (or a move over) something; nothing when the multiplier is zero: it needs no figure then. */
function multiplied(of: Multiplied, reading: Reading | null, { brief }: Pick<Readings, 'brief'>): ErrorTerm {
  if (isNothing(of.multiplier)) return { kind: 'nothing' };
  if (reading === null) {
    const turn = (left: number): number => (of.divides ? of.multiplier / left : left / of.multiplier);
    const turnsAt = (left: number): TurningPoint => ({ figure: of.figure, kind: of.kind, value: turn(left), unit: of.unit });
    return { kind: 'missing', missing: { figure: of.figure, kind: of.kind }, turnsAt };
  }
  const value = of.divides ? of.multiplier / reading.value : of.multiplier * reading.value;
  return { kind: 'value', term: termOf(of.name, value, { reading, unit: of.unit, how: brief ? null : of.how() }) };
}

export interface TermSource {
  readonly reading: Reading;
  readonly unit: string;
  /** Null: nothing is told of it. */
  readonly how: string | null;
}

export function termOf(name: string, value: number, { reading, unit, how }: TermSource): Term {
  if (how === null) return { name, value, slot: reading.slot, basis: reading.basis, figure: null, how: null };
  const steps = [reading.how, how].filter((step) => step !== null && step !== '');
  const figure = { value: reading.printed ?? reading.value, unit };
  return { name, value, slot: reading.slot, basis: reading.basis, figure: Number.isFinite(figure.value) ? figure : null, how: steps.join(', ') };
}

export function offsetTerm(asked: ErrorQuestion, offset: OffsetReading | null, readings: Pick<Readings, 'brief'>): ErrorTerm {
  return multiplied({ name: 'offset', figure: 'offsetVoltage', kind: 'max', unit: 'V', multiplier: asked.noiseGain, how: () => gain(asked) }, offset, readings);
}

/** Drift over the stage's temperatures; not beside an offset rated over temperature. */
export function driftTerm(asked: ErrorQuestion, readings: Readings): ErrorTerm {
  const multiplier = asked.noiseGain * asked.kelvin;
  const how = (): string => `× ${Number(asked.kelvin.toPrecision(4))} K, ${gain(asked)}`;
  return multiplied({ name: 'offset drift', figure: 'offsetDrift', kind: 'max', unit: 'V/K', multiplier, how }, readings.figureOrClass('offsetDrift'), readings);
}

export function commonModeTerm(asked: ErrorQuestion, readings: Readings): ErrorTerm {
  const multiplier = asked.noiseGain * asked.commonModeMove;
  const how = (): string => `over ${formatQuantity(asked.commonModeMove, 'V')} of common mode, ${gain(asked)}`;
  const of = { name: 'common mode', figure: 'commonModeRejection', kind: 'min', unit: 'V/V', multiplier, divides: true, how } as const;
  return multiplied(of, readings.figureOrClass('commonModeRejection'), readings);
}

/** Volts at the output per V/V of rejection: the distance of the supply from the one the offset is rated at, else from the nominal. */
export function supplyMultiplier(asked: ErrorQuestion, offset: OffsetReading | null): number {
  return asked.noiseGain * supplyMove(asked, offset);
}

function supplyMove({ supply }: ErrorQuestion, offset: OffsetReading | null): number {
  const rated = offset?.ratedSupply ?? supply.nominal;
  return Math.max(Math.abs(supply.min - rated), Math.abs(supply.max - rated));
}

export function supplyTerm(asked: ErrorQuestion, { offset, rejection }: { readonly offset: OffsetReading | null; readonly rejection: Reading | null }): ErrorTerm {
  const how = (): string => `over ${formatQuantity(supplyMove(asked, offset), 'V')} of supply, ${gain(asked)}`;
  const of = { name: 'supply', figure: 'supplyRejection', kind: 'min', unit: 'V/V', multiplier: supplyMultiplier(asked, offset), divides: true, how } as const;
  return multiplied(of, rejection, WORDS);
}

const WORDS = { brief: false } as const;

export function outputTerm(asked: ErrorQuestion, readings: Readings): ErrorTerm {
  const multiplier = asked.noiseGain * asked.outputMove;
  const how = (): string => `over ${formatQuantity(asked.outputMove, 'V')} of output, ${gain(asked)}`;
  const of = { name: 'open-loop gain', figure: 'openLoopGain', kind: 'min', unit: 'V/V', multiplier, divides: true, how } as const;
  return multiplied(of, readings.figureOrClass('openLoopGain'), readings);
}

/** A current that is read, and what it adds. */
export interface CurrentTerm {
  readonly reading: Reading | null;
  readonly term: ErrorTerm;
}

/** A current as it is of an input whose currents do not double over temperature, and of one whose do: lists print few of either, and many together with what tells the type of an input. */
export interface ByDoubling {
  readonly steady: CurrentTerm;
  readonly doubling: CurrentTerm;
}

/** Each made of the current as it is read then. */
export function byDoubling(parameter: InputCurrent, readings: Readings, term: (reading: Reading | null) => CurrentTerm): ByDoubling {
  const { steady, doubling } = readings.inputCurrents(parameter);
  const made = term(steady);
  return { steady: made, doubling: doubling === steady ? made : term(doubling) };
}

/** Bias current through what the series resistances differ by. */
export function biasTerm(asked: ErrorQuestion, reading: Reading | null, { brief }: Pick<Readings, 'brief'>): CurrentTerm {
  const { matched } = resistancesOf(asked);
  const how = (): string => `through ${formatQuantity(matched / asked.noiseGain, 'Ω')}, ${gain(asked)}`;
  return { reading, term: multiplied({ name: 'bias current', figure: 'biasCurrent', kind: 'max', unit: 'A', multiplier: matched, how }, reading, { brief }) };
}

/** Half the offset current through both resistances; `reading` is what it is read as. */
export function offsetCurrentTerm(asked: ErrorQuestion, reading: Reading | null, { brief }: Pick<Readings, 'brief'>): CurrentTerm {
  const { half } = resistancesOf(asked);
  const how = (): string => `half of it through ${formatQuantity((2 * half) / asked.noiseGain, 'Ω')}, ${gain(asked)}`;
  return { reading, term: multiplied({ name: 'offset current', figure: 'offsetCurrent', kind: 'max', unit: 'A', multiplier: half, how }, reading, { brief }) };
}

interface Resistances {
  /** Ω in series with both inputs. */
  readonly sum: number;
  /** Volts at the output per ampere of bias current with matched pins, and per ampere of offset current. */
  readonly matched: number;
  readonly half: number;
}

export function resistancesOf({ positive, negative, tolerance, noiseGain }: ErrorQuestion): Resistances {
  const sum = positive + negative;
  return { sum, matched: noiseGain * (Math.abs(positive - negative) + tolerance * sum), half: noiseGain * (sum / 2) };
}

/** The whole bias current (V at the output) in place of both, where what the pins differ by is not known. */
export function wholeBiasTerm(asked: ErrorQuestion, bias: Reading, value: number): ErrorTerm {
  const how = `offset current not known, through ${formatQuantity(resistancesOf(asked).sum, 'Ω')}, ${gain(asked)}`;
  return { kind: 'value', term: termOf('bias and offset current', value, { reading: bias, unit: 'A', how }) };
}

const gain = (asked: ErrorQuestion): string => `× noise gain ${Number(asked.noiseGain.toPrecision(4))}`;
