import type { PhaseMarginDemand } from '../demands/index.js';
import { excessPole } from '../formulas/feedback-loop.js';
import { secondPoleForPhaseMargin } from '../formulas/two-pole-loop.js';
import type { Basis } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Spread } from '../parts/spread.js';
import { formatQuantity } from '../quantities/format.js';

/** Second pole of the part itself, Hz, and what it is known by. */
export interface OwnPole {
  readonly hertz: number;
  readonly basis: Basis;
  readonly slot: string | null;
  readonly how: string;
}

/** Everything of a part that decides its phase margin; null: not known. */
export interface LoopFigures {
  readonly speed: Spread | null;
  readonly own: OwnPole;
  /** What a pole is made of needs a figure only where there is such a pole. */
  readonly inputCapacitance: Reading | null;
  readonly needsInput: boolean;
  readonly outputResistance: Reading | null;
  readonly capacitiveLoad: Reading | null;
}

export function loopFigures(asked: Pick<PhaseMarginDemand, 'network'>, readings: Readings): LoopFigures {
  const speed = readings.spread('gainBandwidth');
  const needsInput = !HELD.has(asked.network.minus.pin);
  return {
    speed,
    own: ownPole(readings, speed),
    inputCapacitance: needsInput ? readings.figure('inputCapacitance') : null,
    needsInput,
    // Read where they count: what is not looked at makes no difference between parts.
    get outputResistance() { return readings.figure('outputResistance'); },
    get capacitiveLoad() { return readings.figure('capacitiveLoad'); },
  };
}

/** Pins without any impedance: a capacitance there makes no pole. */
const HELD: ReadonlySet<string> = new Set(['output', 'input', 'ground']);
/** A part stated with no margin at all oscillates by itself; the smallest angle keeps the form finite, degrees. */
const LEAST_ANGLE = 0.1;

/** f2 = fu·tan PM from its stated unity-gain crossover and margin; without the crossover from its gain bandwidth. */
function ownPole(readings: Readings, speed: Spread | null): OwnPole {
  const margin = readings.figure('phaseMargin');
  if (margin === null) return { hertz: Infinity, basis: 'assumed', slot: null, how: 'no margin of the part itself known: no excess phase counted' };
  const { slot, basis } = margin;
  const angle = Math.max(LEAST_ANGLE, margin.value);
  const stated = readings.brief ? '' : `phase margin ${formatQuantity(margin.printed ?? margin.value, '°')} at unity gain`;
  if (angle >= 90) return { hertz: Infinity, basis, slot, how: `${stated}: no excess phase` };
  const crossover = readings.figure('unityCrossover');
  if (crossover !== null) return { hertz: Number.isFinite(crossover.value) ? excessPole(crossover.value, angle) : Infinity, basis, slot, how: stated };
  const hertz = speed?.printed == null ? Infinity : secondPoleForPhaseMargin(speed.printed, angle);
  return { hertz, basis: 'estimated', slot, how: `${stated}, its crossover taken from the gain bandwidth` };
}
