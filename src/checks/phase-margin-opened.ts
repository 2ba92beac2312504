import { withFeedbackCapacitor } from '../demands/index.js';
import { divide, magnitude, phase, type Complex } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { boundedCrossover, crossoverOf, laggingCrossover, leastCrossover } from './phase-margin-crossover.js';
import { loadedFactor, type Factor, type LoopNetworks } from './phase-margin-exact-load.js';
import { loadAngle, loadSize } from './phase-margin-load.js';
import type { Loop, PhaseParts } from './phase-margin-loop.js';

/** A loop taken apart once, for any number of gain bandwidths (Hz). */
export interface Opened {
  /** Nothing in it leads: |T| falls with the frequency and so does the phase, and the margin is least at the largest gain bandwidth. */
  readonly onlyLags: boolean;
  factorsAt(gainBandwidth: number): Factors;
  partsAt(gainBandwidth: number): PhaseParts | null;
}

/** β of the loop at a gain bandwidth (Hz): by itself, with the load inside it (null: the load stands apart), and its size with the load. */
export interface Factors {
  readonly bare: Factor;
  readonly loaded: Factor | null;
  readonly size: (frequency: number) => number;
}

/** What was found out about one network: its feedback factor by the capacitance at the − input, and the loops around it that were opened last. */
interface Known {
  /** As it takes part in the loop. */
  readonly plus: PinNetwork;
  readonly isExact: boolean;
  readonly isResistive: boolean;
  readonly bare: Map<number, Factor>;
  readonly recent: { readonly loop: Loop; readonly opened: Opened }[];
}

const KNOWN = new WeakMap<Loop['network'], Known>();
/** Of one part: with and without what is not known of its input and its load. Both readings mostly have the same loop. */
const RECENT = 4;
/** Values of an input capacitance that a list prints; a search over it begins anew. */
const CAPACITANCES = 256;

/** The opened loop; the same one for a loop of the same values. */
export function opened(loop: Loop): Opened {
  const known = knownOf(loop.network);
  const before = known.recent.find((one) => isSame(one.loop, loop));
  if (before !== undefined) return before.opened;
  const made = open(loop, known);
  if (known.recent.length >= RECENT) known.recent.shift();
  known.recent.push({ loop, opened: made });
  return made;
}

function knownOf(network: Loop['network']): Known {
  const before = KNOWN.get(network);
  if (before !== undefined) return before;
  const { minus } = network;
  const plus = heard(network.plus);
  const known = { plus, isExact: isExact({ plus, minus }), isResistive: resistorsAlone(network), bare: new Map<number, Factor>(), recent: [] };
  KNOWN.set(network, known);
  return known;
}

function isSame(one: Loop, other: Loop): boolean {
  const [a, b] = [one.load, other.load];
  return one.ownPole === other.ownPole && one.inputCapacitance === other.inputCapacitance && (one.stray ?? 0) === (other.stray ?? 0) && one.open === other.open &&
    (a === b || (a !== null && b !== null && a.outputResistance === b.outputResistance && a.capacitance === b.capacitance && a.resistance === b.resistance && a.isolation === b.isolation));
}

function open(loop: Loop, known: Known): Opened {
  let made: Factors | null = null;
  const factorsAt = (gainBandwidth: number): Factors => (loop.open !== null ? factorsOf(loop, gainBandwidth, null) : (made ??= factorsOf(loop, gainBandwidth, known)));
  const isResistive = loop.open === null && known.isResistive;
  const onlyLags = lags(loop, known);
  const found: { readonly gainBandwidth: number; readonly parts: PhaseParts | null }[] = [];
  return {
    onlyLags,
    factorsAt,
    partsAt(gainBandwidth) {
      // A part is asked about at its ends and one place between.
      for (const before of found) if (before.gainBandwidth === gainBandwidth) return before.parts;
      const parts = partsOf(loop, { factors: factorsAt(gainBandwidth), gainBandwidth, isResistive, onlyLags });
      if (found.length < KEPT) found.push({ gainBandwidth, parts });
      return parts;
    },
  };
}

/** Nothing leads: resistors alone, and a load that is not isolated. */
const lags = ({ open: chosen, load }: Loop, { isResistive }: Known): boolean => chosen === null && isResistive && (load === null || load.isolation === 0);

/** Ends, the place between them, and what a search between these comes back to. */
const KEPT = 8;

/** From the output to the − input, with a capacitance there at most: what comes back is most at DC, and a load takes from it. */
function resistorsAlone({ plus, minus }: Loop['network']): boolean {
  const { elements, pin } = minus;
  const isHeard = pin === 'output' || (feedsBack(minus) && elements.some(({ between }) => between.includes(pin)));
  return !feedsBack(plus) && isHeard && elements.every(({ kind }) => kind === 'resistor');
}

/** `known`: null where a capacitor of the network is chosen by the gain bandwidth. */
function factorsOf(loop: Loop, gainBandwidth: number, known: Known | null): Factors {
  const { load } = loop;
  const networks = known === null ? networksOf(loop, gainBandwidth) : { plus: known.plus, minus: loop.network.minus, minusCapacitance: minusCapacitance(loop) };
  const bare = known === null ? feedbackFactor(networks) : bareOf(networks, known);
  const loaded = load !== null && (known?.isExact ?? isExact(networks)) ? loadedFactor(networks, load) : null;
  if (loaded !== null) return { bare, loaded, size: (frequency) => magnitude(loaded(frequency)) };
  const ofLoad = loadSize(load);
  return { bare, loaded, size: (frequency) => share(bare(frequency)) * ofLoad(frequency) };
}

/** Size of what comes back, V/V: too near to 1 for the care that hypot takes. */
const share = ({ re, im }: Complex): number => Math.sqrt(re * re + im * im);

function bareOf(networks: LoopNetworks, { bare }: Known): Factor {
  const before = bare.get(networks.minusCapacitance);
  if (before !== undefined) return before;
  if (bare.size >= CAPACITANCES) bare.clear();
  const factor = feedbackFactor(networks);
  bare.set(networks.minusCapacitance, factor);
  return factor;
}

interface At {
  readonly factors: Factors;
  readonly gainBandwidth: number;
  readonly isResistive: boolean;
  readonly onlyLags: boolean;
}

/**
 * Where the phase goes at the true crossover of T = A·β·load·own pole. A network of resistors alone leaves the load by itself: poles of
 * (Ro||RL)·CL and Riso·CL as M7 has them. One with capacitors of its own (filters, integrator, feedback capacitor, transimpedance)
 * loads the output resistance too: there Ro, Riso, RL and CL stand in one circuit with it, exactly.
 */
function partsOf(loop: Loop, { factors, gainBandwidth, isResistive, onlyLags }: At): PhaseParts | null {
  const gain = gainOf(loop, factors, gainBandwidth);
  const most = isResistive ? mostCrossover(factors, gainBandwidth) : Infinity;
  const crossover = onlyLags && most > 0 ? laggingCrossover(gain, most) : isResistive ? boundedCrossover(gain, gainBandwidth, most) : crossoverOf(gain, gainBandwidth);
  return crossover === null ? null : phaseAt(loop, factors, crossover);
}

/** ln|T| by the frequency in Hz. */
function gainOf({ ownPole }: Loop, { size }: Factors, gainBandwidth: number): (frequency: number) => number {
  return (frequency) => Math.log(((gainBandwidth / frequency) * size(frequency)) / Math.sqrt(1 + (frequency / ownPole) ** 2));
}

/** Of resistors alone what comes back is most at DC: Hz, above any crossover. */
const mostCrossover = ({ bare }: Factors, gainBandwidth: number): number => gainBandwidth * magnitude(bare(0));

/** Where the phase goes at a frequency that is certainly not below the crossover, and at one that is certainly not above it. */
export interface PhaseBounds {
  fastest(): PhaseParts;
  slowest(): PhaseParts;
}

/** Of a loop that only lags, without a search and without opening it; null: of any other nothing is certain. */
export function phaseBounds(loop: Loop, gainBandwidth: number): PhaseBounds | null {
  const known = knownOf(loop.network);
  if (!lags(loop, known)) return null;
  const factors = factorsOf(loop, gainBandwidth, known);
  const most = mostCrossover(factors, gainBandwidth);
  if (!(most > 0 && most < Infinity)) return null;
  return {
    fastest: () => phaseAt(loop, factors, most * ROUNDED),
    slowest: () => phaseAt(loop, factors, leastCrossover(gainOf(loop, factors, gainBandwidth), most)),
  };
}

/** Above what rounding of a frequency can be. */
const ROUNDED = 1 + 1e-9;

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

/** Both networks with this part's capacitances and, where it is left to the part, its feedback capacitor. */
export function networksOf(loop: Loop, gainBandwidth: number): LoopNetworks {
  const { network, open: chosen, inputCapacitance } = loop;
  const flat = chosen === null ? null : maximallyFlatCapacitor({ feedback: chosen.feedback, inputCapacitance: chosen.inputCapacitance + inputCapacitance, gainBandwidth });
  const { plus, minus } = flat === null ? network : withFeedbackCapacitor(network, flat);
  return { plus: heard(plus), minus, minusCapacitance: minusCapacitance(loop) };
}

const minusCapacitance = ({ inputCapacitance, stray = 0 }: Loop): number => inputCapacitance + stray;

/** A bypass shorts a leg and takes nothing from the output. */
const isExact = ({ plus, minus }: Pick<LoopNetworks, 'plus' | 'minus'>): boolean => [...plus.elements, ...minus.elements].some(({ kind, name }) => kind === 'capacitor' && name !== 'bypass');

const feedsBack = ({ elements, pin }: PinNetwork): boolean => pin === 'output' || elements.some(({ between }) => between.includes('output'));

const heard = (network: PinNetwork): PinNetwork => (feedsBack(network) ? network : SILENT);

/** A pin the output never reaches takes no part in the loop. */
const SILENT: PinNetwork = { elements: [], pin: 'ground' };
