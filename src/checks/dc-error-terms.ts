import type { DcErrorDemand } from '../demands/index.js';
import type { LimitKind, Parameter } from '../parts/figures.js';
import type { OffsetReading } from '../parts/offset.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Missing, Term, TurningPoint } from '../verdicts/finding.js';

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

/** Only rounding is left of a multiplier below this: a move of a picovolt, and far less of any other. */
const NOTHING = 1e-12;

/** A term that is a figure times (or a move over) something; nothing when the multiplier is zero: it needs no figure then. */
function multiplied(of: Multiplied, reading: Reading | null, { brief }: Pick<Readings, 'brief'>): ErrorTerm {
  if (of.multiplier <= NOTHING) return { kind: 'nothing' };
  if (reading === null) {
    const turn = (left: number): number => (of.divides ? of.multiplier / left : left / of.multiplier);
    const turnsAt = (left: number): TurningPoint => ({ figure: of.figure, kind: of.kind, value: turn(left), unit: of.unit });
    return { kind: 'missing', missing: { figure: of.figure, kind: of.kind }, turnsAt };
  }
  const value = of.divides ? of.multiplier / reading.value : of.multiplier * reading.value;
  return { kind: 'value', term: termOf(of.name, value, { reading, unit: of.unit, how: brief ? '' : of.how() }) };
}

export interface TermSource {
  readonly reading: Reading;
  readonly unit: string;
  readonly how: string;
}

export function termOf(name: string, value: number, { reading, unit, how }: TermSource): Term {
  const steps = [reading.how, how].filter((step) => step !== null && step !== '');
  const figure = { value: reading.printed ?? reading.value, unit };
  return { name, value, slot: reading.slot, basis: reading.basis, figure: Number.isFinite(figure.value) ? figure : null, how: steps.join(', ') };
}

export function offsetTerm(asked: DcErrorDemand, offset: OffsetReading | null, readings: Pick<Readings, 'brief'>): ErrorTerm {
  return multiplied({ name: 'offset', figure: 'offsetVoltage', kind: 'max', unit: 'V', multiplier: asked.noiseGain, how: () => gain(asked) }, offset, readings);
}

/** No drift term beside an offset rated over temperature. */
export function driftTerm(asked: DcErrorDemand, offset: OffsetReading | null, readings: Readings): ErrorTerm {
  if (offset?.overTemperature === true) return { kind: 'nothing' };
  const multiplier = asked.noiseGain * asked.kelvin;
  const how = (): string => `× ${Number(asked.kelvin.toPrecision(4))} K, ${gain(asked)}`;
  return multiplied({ name: 'offset drift', figure: 'offsetDrift', kind: 'max', unit: 'V/K', multiplier, how }, readings.figureOrClass('offsetDrift'), readings);
}

export function commonModeTerm(asked: DcErrorDemand, readings: Readings): ErrorTerm {
  const multiplier = asked.noiseGain * asked.commonModeMove;
  const how = (): string => `over ${formatQuantity(asked.commonModeMove, 'V')} of common mode, ${gain(asked)}`;
  const of = { name: 'common mode', figure: 'commonModeRejection', kind: 'min', unit: 'V/V', multiplier, divides: true, how } as const;
  return multiplied(of, readings.figureOrClass('commonModeRejection'), readings);
}

/** Distance of the supply from the one the offset is rated at, else from the nominal. */
export function supplyTerm(asked: DcErrorDemand, offset: OffsetReading | null, readings: Readings): ErrorTerm {
  const rated = offset?.ratedSupply ?? asked.supply.nominal;
  const move = Math.max(Math.abs(asked.supply.min - rated), Math.abs(asked.supply.max - rated));
  const how = (): string => `over ${formatQuantity(move, 'V')} of supply, ${gain(asked)}`;
  const of = { name: 'supply', figure: 'supplyRejection', kind: 'min', unit: 'V/V', multiplier: asked.noiseGain * move, divides: true, how } as const;
  return multiplied(of, readings.figureOrClass('supplyRejection'), readings);
}

export function outputTerm(asked: DcErrorDemand, readings: Readings): ErrorTerm {
  const multiplier = asked.noiseGain * asked.outputMove;
  const how = (): string => `over ${formatQuantity(asked.outputMove, 'V')} of output, ${gain(asked)}`;
  const of = { name: 'open-loop gain', figure: 'openLoopGain', kind: 'min', unit: 'V/V', multiplier, divides: true, how } as const;
  return multiplied(of, readings.figureOrClass('openLoopGain'), readings);
}

/**
 * Bias and offset current through the series resistances. With the offset current unknown the two pins may differ by the
 * whole bias current: then Ib·(Rp+Rn) stands for both, at best the offset current is nothing.
 */
export function currentTerms(asked: DcErrorDemand, readings: Readings): ErrorTerm[] {
  const sum = asked.positive + asked.negative;
  if (sum === 0) return [];
  const bias = readings.figure('biasCurrent');
  const matched = asked.noiseGain * (Math.abs(asked.positive - asked.negative) + asked.tolerance * sum);
  const how = (): string => `through ${formatQuantity(matched / asked.noiseGain, 'Ω')}, ${gain(asked)}`;
  const biasTerm = multiplied({ name: 'bias current', figure: 'biasCurrent', kind: 'max', unit: 'A', multiplier: matched, how }, bias, readings);
  const half = asked.noiseGain * (sum / 2);
  const offset = readings.figure('offsetCurrent');
  if (offset !== null) return [biasTerm, offsetCurrentTerm({ asked, half, brief: readings.brief }, offset)];
  // Matched pins leave nothing of the bias current to charge, but what they differ by is not known then.
  if (bias === null) return [matched <= NOTHING ? offsetCurrentTerm({ asked, half, brief: readings.brief }, readings.figureOrClass('offsetCurrent')) : biasTerm];
  return unknownOffsetCurrent({ asked, bias, biasTerm, matched, half, sum }, readings);
}

interface OffsetCurrent extends Pick<Readings, 'brief'> {
  readonly asked: DcErrorDemand;
  /** Volts at the output per ampere. */
  readonly half: number;
}

function offsetCurrentTerm({ asked, half, brief }: OffsetCurrent, reading: Reading | null): ErrorTerm {
  const how = (): string => `half of it through ${formatQuantity((2 * half) / asked.noiseGain, 'Ω')}, ${gain(asked)}`;
  return multiplied({ name: 'offset current', figure: 'offsetCurrent', kind: 'max', unit: 'A', multiplier: half, how }, reading, { brief });
}

interface UnknownOffsetCurrent {
  readonly asked: DcErrorDemand;
  readonly bias: Reading;
  readonly biasTerm: ErrorTerm;
  /** Volts at the output per ampere of bias current with matched pins, and per ampere of offset current. */
  readonly matched: number;
  readonly half: number;
  readonly sum: number;
}

/** The whole bias current may differ between the pins, unless the class's offset current says less. */
function unknownOffsetCurrent(of: UnknownOffsetCurrent, readings: Readings): ErrorTerm[] {
  const { asked, bias, biasTerm, matched, half, sum } = of;
  const whole = asked.noiseGain * sum * bias.value;
  const best = matched * bias.value;
  const borrowed = readings.figureOrClass('offsetCurrent');
  if (borrowed !== null && best + half * borrowed.value < whole) return [biasTerm, offsetCurrentTerm({ asked, half, brief: readings.brief }, borrowed)];
  const how = readings.brief ? '' : `offset current not known, through ${formatQuantity(sum, 'Ω')}, ${gain(asked)}`;
  const value = readings.bounded(whole, best);
  return [{ kind: 'value', term: termOf('bias and offset current', value, { reading: bias, unit: 'A', how }) }];
}

const gain = (asked: DcErrorDemand): string => `× noise gain ${Number(asked.noiseGain.toPrecision(4))}`;
