import { divide, magnitude, phase } from '../formulas/complex.js';
import { boundedCrossover, crossoverOf, laggingCrossover } from './phase-margin-crossover.js';
import { factorsOf, isResistive, onlyLags, type Factors } from './phase-margin-factors.js';
import { loadAngle } from './phase-margin-load.js';
import type { Loop, PhaseParts } from './phase-margin-loop.js';

/** A loop taken apart once, for any number of gain bandwidths (Hz). */
export interface Opened {
  /** Nothing in it leads. */
  readonly onlyLags: boolean;
  factorsAt(gainBandwidth: number): Factors;
  partsAt(gainBandwidth: number): PhaseParts | null;
}

/** By network: the loops around it that were opened last. */
const OPENED = new WeakMap<Loop['network'], { readonly loop: Loop; readonly opened: Opened }[]>();
/** Of one part: with and without what is not known of its input and its load. Both readings mostly have the same loop. */
const RECENT = 4;

/** The opened loop; the same one for a loop of the same values. */
export function opened(loop: Loop): Opened {
  const recent = OPENED.get(loop.network) ?? [];
  OPENED.set(loop.network, recent);
  const before = recent.find((one) => isSame(one.loop, loop));
  if (before !== undefined) return before.opened;
  const made = open(loop);
  if (recent.length >= RECENT) recent.shift();
  recent.push({ loop, opened: made });
  return made;
}

function isSame(one: Loop, other: Loop): boolean {
  const [a, b] = [one.load, other.load];
  return one.ownPole === other.ownPole && one.inputCapacitance === other.inputCapacitance && (one.stray ?? 0) === (other.stray ?? 0) && one.open === other.open &&
    (a === b || (a !== null && b !== null && a.outputResistance === b.outputResistance && a.capacitance === b.capacitance && a.resistance === b.resistance && a.isolation === b.isolation));
}

function open(loop: Loop): Opened {
  let made: Factors | null = null;
  const factorsAt = (gainBandwidth: number): Factors => (loop.open !== null ? factorsOf(loop, gainBandwidth) : (made ??= factorsOf(loop, gainBandwidth)));
  const found: { readonly gainBandwidth: number; readonly parts: PhaseParts | null }[] = [];
  return {
    onlyLags: onlyLags(loop),
    factorsAt,
    partsAt(gainBandwidth) {
      // A part is asked about at its ends and one place between.
      for (const before of found) if (before.gainBandwidth === gainBandwidth) return before.parts;
      const parts = partsOf(loop, factorsAt(gainBandwidth), gainBandwidth);
      if (found.length < KEPT) found.push({ gainBandwidth, parts });
      return parts;
    },
  };
}

/** Ends, the place between them, and what a search between these comes back to. */
const KEPT = 8;

/**
 * Where the phase goes at the true crossover of T = A·β·load·own pole. A network of resistors alone leaves the load by itself: poles of
 * (Ro||RL)·CL and Riso·CL as M7 has them. One with capacitors of its own (filters, integrator, feedback capacitor, transimpedance)
 * loads the output resistance too: there Ro, Riso, RL and CL stand in one circuit with it, exactly.
 */
function partsOf(loop: Loop, factors: Factors, gainBandwidth: number): PhaseParts | null {
  const gain = gainOf(loop, factors, gainBandwidth);
  const bounded = isResistive(loop);
  const most = bounded ? mostCrossover(factors, gainBandwidth) : Infinity;
  const crossover = onlyLags(loop) && most > 0 ? laggingCrossover(gain, most) : bounded ? boundedCrossover(gain, gainBandwidth, most) : crossoverOf(gain, gainBandwidth);
  return crossover === null ? null : phaseAt(loop, factors, crossover);
}

/** ln|T| by the frequency in Hz. */
function gainOf({ ownPole }: Loop, { size }: Factors, gainBandwidth: number): (frequency: number) => number {
  return (frequency) => Math.log(((gainBandwidth / frequency) * size(frequency)) / Math.sqrt(1 + (frequency / ownPole) ** 2));
}

/** Of resistors alone what comes back is most at DC: Hz, above any crossover. */
const mostCrossover = ({ bare }: Factors, gainBandwidth: number): number => gainBandwidth * magnitude(bare(0));

function phaseAt({ load, ownPole }: Loop, { bare, loaded }: Factors, crossover: number): PhaseParts {
  const feedback = bare(crossover);
  return {
    crossover,
    feedback: phase(feedback),
    load: loaded === null ? loadAngle(load, crossover) : phase(divide(loaded(crossover), feedback)),
    own: 0 - Math.atan(crossover / ownPole) * DEGREES,
  };
}

const DEGREES = 180 / Math.PI;
