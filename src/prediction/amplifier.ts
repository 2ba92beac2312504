import { excessPole } from '../formulas/feedback-loop.js';
import { secondPoleForPhaseMargin } from '../formulas/two-pole-loop.js';
import type { Parameter } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import type { Reading, ReadingRules } from '../parts/reading.js';
import { readingsOf, type Readings } from '../parts/readings.js';
import { typicalPart } from './typical-part.js';

export type Outcome = 'typical' | 'worst';

/** A figure the model is made of, as it counts; SI. */
export interface FigureUsed {
  readonly parameter: Parameter;
  readonly value: number;
  /** How it was made from the printed one; null: as printed. */
  readonly how: string | null;
}

/** The amplifier as the model has it: Hz, Hz, V/s, V/V, Ω, F. */
export interface Amplifier {
  /** Null: not known, and then nothing of the response is. */
  readonly gainBandwidth: number | null;
  /** The most a part may have; the same in the typical form. */
  readonly gainBandwidthMost: number | null;
  /** Infinity: no excess phase counted. */
  readonly ownPole: number;
  readonly slewRate: number | null;
  /** Infinity: not counted. */
  readonly openLoopGain: number;
  /** 0: not counted. */
  readonly outputResistance: number;
  readonly inputCapacitance: number;
  /** V at the input, offset and drift; 0: not counted. */
  readonly offset: number;
  /** A that the output can deliver; null: not known. */
  readonly outputCurrent: number | null;
  /** Figures of the model that are not known. */
  readonly unknown: ReadonlySet<Parameter>;
  readonly used: readonly FigureUsed[];
  readonly readings: Readings;
}

/** Where the stage stands: K of the largest distance from 25 °C, and the least supply, V. */
export interface Place {
  readonly kelvin: number;
  readonly supply: number;
}

/** A part's figures as the model takes them: typical as printed, or as the checks read them pessimistically. */
export function amplifierOf(part: Part, rules: ReadingRules, of: { readonly form: Outcome; readonly place: Place }): Amplifier {
  const { form, place } = of;
  const readings = form === 'worst' ? readingsOf({ part, ...rules, outlook: 'pessimistic' }) : readingsOf({ part: typicalPart(part), ...rules, strict: false, outlook: 'optimistic' });
  const book = bookOf(readings);
  const speed = readings.spread('gainBandwidth');
  const offset = offsetOf(readings, book, form === 'worst' ? place.kelvin : 0);
  return {
    gainBandwidth: book.read('gainBandwidth')?.value ?? null,
    gainBandwidthMost: speed?.ends?.most ?? speed?.value ?? null,
    ownPole: ownPole(readings, book, speed?.printed ?? null),
    slewRate: book.read('slewRate')?.value ?? null,
    openLoopGain: book.read('openLoopGain')?.value ?? Infinity,
    outputResistance: book.read('outputResistance')?.value ?? 0,
    inputCapacitance: book.read('inputCapacitance')?.value ?? 0,
    offset,
    outputCurrent: usableCurrent(readings, place.supply),
    unknown: book.unknown,
    used: book.used,
    readings,
  };
}

interface Book {
  readonly used: FigureUsed[];
  readonly unknown: Set<Parameter>;
  read(parameter: Parameter): Reading | null;
  note(parameter: Parameter, reading: Reading | null): void;
}

/** Keeps what was read, and what was looked for and not found. */
function bookOf(readings: Readings): Book {
  const used: FigureUsed[] = [];
  const unknown = new Set<Parameter>();
  const note = (parameter: Parameter, reading: Reading | null): void => {
    if (reading === null) unknown.add(parameter);
    else used.push({ parameter, value: reading.value, how: reading.how });
  };
  const read = (parameter: Parameter): Reading | null => {
    const reading = readings.figure(parameter);
    note(parameter, reading);
    return reading;
  };
  return { used, unknown, read, note };
}

/** Offset and what it drifts: V at the input. */
function offsetOf(readings: Readings, book: Book, kelvin: number): number {
  const offset = readings.offset();
  book.note('offsetVoltage', offset);
  if (offset === null) return 0;
  if (offset.overTemperature || kelvin === 0) return offset.value;
  return offset.value + (book.read('offsetDrift')?.value ?? 0) * kelvin;
}

/** Less would put the pole at nothing, degrees. */
const LEAST_ANGLE = 0.1;

/** f2 = fu·tan PM from its stated unity-gain crossover and margin; without the crossover from its gain bandwidth (as the phase margin check). */
function ownPole(readings: Readings, book: Book, gainBandwidth: number | null): number {
  const margin = book.read('phaseMargin');
  if (margin === null || margin.value >= 90) return Infinity;
  const angle = Math.max(LEAST_ANGLE, margin.value);
  const crossover = readings.figure('unityCrossover');
  if (crossover !== null) book.note('unityCrossover', crossover);
  if (crossover !== null) return excessPole(crossover.value, angle);
  return gainBandwidth === null ? Infinity : secondPoleForPhaseMargin(gainBandwidth, angle);
}

/** Of the weaker direction, as the settling check takes it. */
function usableCurrent(readings: Readings, supply: number): number | null {
  const rated = readings.figure('outputCurrent');
  if (rated !== null) return rated.value;
  const [low, high] = [readings.currentFromHeadroom('low', supply), readings.currentFromHeadroom('high', supply)];
  return low === null || high === null ? null : Math.min(low.value, high.value);
}
