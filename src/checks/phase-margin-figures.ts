import type { PhaseMarginDemand } from '../demands/index.js';
import { excessPole } from '../formulas/feedback-loop.js';
import { secondPoleForPhaseMargin } from '../formulas/two-pole-loop.js';
import type { Basis } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Spread } from '../parts/spread.js';
import { formatQuantity } from '../quantities/format.js';
import type { ComposedCheck, Known } from './check.js';

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
  /** Null also where nothing is loaded. */
  readonly outputResistance: Reading | null;
  /** Null also where the output resistance is known: it decides nothing then. */
  readonly capacitiveLoad: Reading | null;
}

/** What the loop of a part is put together from, each read where it counts. */
export interface LoopFound {
  readonly speed: Spread | null;
  /** Of the part itself, degrees. */
  readonly angle: Reading | null;
  readonly unityCrossover: Reading | null;
  readonly inputCapacitance: Reading | null;
  readonly outputResistance: Reading | null;
  readonly capacitiveLoad: Reading | null;
}

/** What the phase margin of a part is put together from. */
export interface PhaseMarginFound extends LoopFound {
  /** Read for remedies only. */
  readonly stableGain: Reading | null;
}

type Asked = Pick<PhaseMarginDemand, 'network' | 'load'>;

/** One figure each: few of either, and nearly as many combinations as parts. */
export const LOOP_TERMS: ComposedCheck<Asked, LoopFound, unknown>['terms'] = {
  speed: (_, readings) => readings.spread('gainBandwidth'),
  angle: (_, readings) => readings.figure('phaseMargin'),
  unityCrossover: (_, readings) => readings.figure('unityCrossover'),
  inputCapacitance: (_, readings) => readings.figure('inputCapacitance'),
  outputResistance: (_, readings) => readings.figure('outputResistance'),
  capacitiveLoad: (_, readings) => readings.figure('capacitiveLoad'),
};

/** The figures of one part, read where they count. */
export function loopFigures(asked: Asked, found: Known<LoopFound>, told: Pick<Readings, 'brief'>): LoopFigures {
  const speed = found.speed();
  const needsInput = needsInputCapacitance(asked);
  const outputResistance = asked.load.capacitance > 0 ? found.outputResistance() : null;
  return {
    speed,
    own: ownPole(found, speed, told),
    inputCapacitance: needsInput ? found.inputCapacitance() : null,
    needsInput,
    outputResistance,
    capacitiveLoad: asked.load.capacitance > 0 && outputResistance === null ? found.capacitiveLoad() : null,
  };
}

/** Whether a capacitance at the - input makes a pole. */
export const needsInputCapacitance = ({ network }: Pick<PhaseMarginDemand, 'network'>): boolean => !HELD.has(network.minus.pin);

/** Pins without any impedance: a capacitance there makes no pole. */
const HELD: ReadonlySet<string> = new Set(['output', 'input', 'ground']);
/** A part stated with no margin at all oscillates by itself; the smallest angle keeps the form finite, degrees. */
const LEAST_ANGLE = 0.1;

/** What the part's own second pole is made of: degrees and Hz as they are read, the gain bandwidth as printed; not a number: not known. */
export interface OwnPoleFigures {
  readonly angle: number;
  readonly crossover: number;
  readonly gainBandwidth: number;
}

/** f2 = fu·tan PM from its stated unity-gain crossover and margin; without the crossover from its gain bandwidth. Hz; Infinity: none. */
export function ownPoleOf({ angle, crossover, gainBandwidth }: OwnPoleFigures): number {
  const stated = Math.max(LEAST_ANGLE, angle);
  // Also an angle that is not known.
  if (!(stated < 90)) return Infinity;
  if (!Number.isNaN(crossover)) return Number.isFinite(crossover) ? excessPole(crossover, stated) : Infinity;
  return Number.isNaN(gainBandwidth) ? Infinity : secondPoleForPhaseMargin(gainBandwidth, stated);
}

function ownPole(found: Known<LoopFound>, speed: Spread | null, { brief }: Pick<Readings, 'brief'>): OwnPole {
  const margin = found.angle();
  if (margin === null) return { hertz: Infinity, basis: 'assumed', slot: null, how: 'no margin of the part itself known: no excess phase counted' };
  const { slot, basis } = margin;
  const stated = brief ? '' : `phase margin ${formatQuantity(margin.printed ?? margin.value, '°')} at unity gain`;
  if (margin.value >= 90) return { hertz: Infinity, basis, slot, how: brief ? '' : `${stated}: no excess phase` };
  const crossover = found.unityCrossover();
  const hertz = ownPoleOf({ angle: margin.value, crossover: crossover?.value ?? NaN, gainBandwidth: speed?.printed ?? NaN });
  if (crossover !== null) return { hertz, basis, slot, how: stated };
  return { hertz, basis: 'estimated', slot, how: brief ? '' : `${stated}, its crossover taken from the gain bandwidth` };
}
