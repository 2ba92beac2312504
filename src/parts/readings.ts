import type { Basis } from './basis.js';
import { inputCurrentReading, inputCurrents, inputDoubles, type BothCurrents, type InputCurrent } from './currents.js';
import { PARAMETERS, type Parameter } from './figures.js';
import type { Side } from './headroom.js';
import { headroomCurve, heaviestPoint, REACH, type HeadroomQuestion, type HeadroomReading } from './headroom-curve.js';
import { offsetReading, type OffsetReading } from './offset.js';
import type { Part } from './part.js';
import type { PartUnderTest, Reading } from './reading.js';
import { scalarReading, type RangeEnd } from './select.js';
import { spreadReading, type Spread } from './spread.js';

/** What is known about a part in words and counts, as wishes compare it. */
export type Identity = Pick<Part, 'tier' | 'status' | 'lifecycle' | 'package' | 'channels' | 'qualification' | 'price' | 'inputType' | 'inputClamp' | 'phaseReversal' | 'crossoverFree'>;

/**
 * A part's figures resolved into one outlook. A check asks for what it reads and never learns which outlook it is given;
 * `null` means the figure is missing there.
 */
export interface Readings {
  readonly identity: Identity;
  /** `end` names the end of a range parameter (supply voltage, temperature). */
  figure(parameter: Parameter, end?: RangeEnd): Reading | null;
  /** An input current as one that doubles over temperature, and as one that does not: figures of its own alone. */
  inputCurrents(parameter: InputCurrent): BothCurrents;
  /** Whether currents of this input double. */
  inputDoubles(): boolean;
  /** The figure, else the class's worst (pessimistic) or no contribution at all (optimistic), basis borrowed. */
  figureOrClass(parameter: Parameter): Reading | null;
  /** What the class lends for want of the figure; null: nothing. */
  ofClass(parameter: Parameter): Reading | null;
  /** The figure, else a value assumed for want of one: it can pass a check, not fail it. */
  figureOrAssumed(parameter: Parameter, assumed: Assumed, end?: RangeEnd): Reading | null;
  /** The figure with both its ends, for what is not worst at the least of it: a fast part is noisier and harder to load. */
  spread(parameter: Parameter): Spread | null;
  offset(): OffsetReading | null;
  headroom(side: Side): (question: HeadroomQuestion) => HeadroomReading;
  /** Usable output current of one direction: 1.5 × the heaviest head-room point; null (undecided beyond) without points. */
  currentFromHeadroom(side: Side, supply: number): Reading | null;
  /** An unknown that known figures bound: its worst and its best. */
  bounded(worst: number, best: number): number;
  /** Only numbers that decide are wanted: remedies, which cost far more than the verdict, are left out. */
  readonly brief: boolean;
}

export interface Assumed {
  readonly value: number;
  readonly best: number;
  readonly why: string;
}

/** The readings of one part in one outlook. */
export function readingsOf(test: PartUnderTest): Readings {
  const figure = (parameter: Parameter, end?: RangeEnd): Reading | null => plain(test, parameter, end);
  return {
    identity: test.part,
    figure,
    inputCurrents: (parameter) => inputCurrents(test, parameter),
    inputDoubles: () => inputDoubles(test),
    figureOrClass: (parameter) => figure(parameter) ?? borrowed(test, parameter),
    ofClass: (parameter) => borrowed(test, parameter),
    figureOrAssumed: (parameter, assumed, end) =>
      figure(parameter, end) ?? (isPrinted(test, parameter, end) ? null : assumedReading(test, assumed)),
    spread: (parameter) => spreadReading(test, parameter),
    offset: () => offsetReading(test),
    headroom: (side) => headroomCurve(test, side),
    currentFromHeadroom: (side, supply) => fromHeadroom(test, side, supply),
    bounded: (worst, best) => (test.outlook === 'pessimistic' ? worst : best),
    brief: test.brief === true,
  };
}

function plain(test: PartUnderTest, parameter: Parameter, end?: RangeEnd): Reading | null {
  if (parameter === 'biasCurrent' || parameter === 'offsetCurrent') return inputCurrentReading(test, parameter);
  return scalarReading(test, parameter, end);
}

function isPrinted(test: PartUnderTest, parameter: Parameter, end?: RangeEnd): boolean {
  test.look?.(parameter);
  return test.part.figures.some((figure) => figure.parameter === parameter && (end === undefined || figure.kind === end));
}

function borrowed(test: PartUnderTest, parameter: Parameter): Reading | null {
  const worst = test.strict ? undefined : test.classWorst?.[parameter];
  if (worst === undefined) return null;
  const rejects = (PARAMETERS[parameter].kinds as readonly string[]).includes('min');
  const best = rejects ? Number.POSITIVE_INFINITY : 0;
  const value = test.outlook === 'pessimistic' ? worst : best;
  return { value, printed: null, kind: null, basis: 'borrowed', slot: null, how: `worst of class ${test.part.class ?? ''}` };
}

function assumedReading(test: PartUnderTest, assumed: Assumed): Reading | null {
  const value = test.outlook === 'pessimistic' ? assumed.value : assumed.best;
  return { value, printed: null, kind: null, basis: 'assumed', slot: null, how: assumed.why };
}

function fromHeadroom(test: PartUnderTest, side: Side, supply: number): Reading | null {
  const heaviest = heaviestPoint(test, side, supply);
  if (heaviest === null || heaviest.amperes === 0) return null;
  const value = test.outlook === 'pessimistic' ? REACH * heaviest.amperes : Number.POSITIVE_INFINITY;
  const basis: Basis = heaviest.basis === 'assumed' ? 'assumed' : 'estimated';
  return { value, printed: heaviest.amperes, kind: null, basis, slot: heaviest.slot, how: `${REACH} × the heaviest head-room point` };
}
