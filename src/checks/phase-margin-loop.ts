import { withFeedbackCapacitor, type OpenTransimpedance } from '../demands/index.js';
import { divide, magnitude, phase } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { crossoverOf } from './phase-margin-crossover.js';
import { loadedFactor, type Factor, type LoopNetworks } from './phase-margin-exact-load.js';

/** What hangs behind the amplifier's open-loop output resistance: Ω and F; resistance null: a capacitance alone. */
export interface LoadedOutput {
  readonly outputResistance: number;
  readonly capacitance: number;
  readonly resistance: number | null;
  readonly isolation: number;
}

/** The opened loop of one stage with one part, but for its gain bandwidth. */
export interface Loop {
  readonly network: { readonly plus: PinNetwork; readonly minus: PinNetwork };
  /** The capacitor that makes this stage maximally flat belongs to the loop. */
  readonly open: OpenTransimpedance | null;
  /** F at the − input: the part's own, and what the feedback capacitor is not chosen for. */
  readonly inputCapacitance: number;
  readonly stray?: number;
  /** Second pole of the part itself, Hz; Infinity: none. */
  readonly ownPole: number;
  readonly load: LoadedOutput | null;
}

export interface Ends {
  readonly least: number;
  readonly most: number;
}

/** Phase margin (degrees) at the gain bandwidth (Hz) it stands at. */
export interface Margin {
  readonly margin: number;
  readonly gainBandwidth: number;
}

/** Margin of the loop at one gain bandwidth, degrees; 180 where the loop gain never reaches 1. */
export function marginAt(loop: Loop, gainBandwidth: number): number {
  return marginIn(opened(loop), gainBandwidth);
}

function marginIn(loop: Opened, gainBandwidth: number): number {
  const parts = partsIn(loop, gainBandwidth);
  if (parts === null) return 180;
  const margin = 90 + parts.feedback + parts.load + parts.own;
  // Only upwards is it wrapped: lag beyond a full turn must not look like margin.
  return Math.max(-180, margin > 180 ? margin - 360 : margin);
}

/** The smaller margin of the two ends alone, degrees: enough to search with. */
export function atEitherEnd(loop: Loop, { least, most }: Ends): number {
  const open = opened(loop);
  return Math.min(marginIn(open, least), marginIn(open, most));
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;
const REFINEMENTS = 20;

/**
 * Least margin over all gain bandwidths of a part: a lag is worst at the most, a lead at the least, a lead-lag has its dip in
 * between. Over this octave a parabola through three points tells whether there is one.
 */
export function worstMargin(loop: Loop, { least, most }: Ends): Margin {
  const open = opened(loop);
  const at = (gainBandwidth: number): Margin => ({ margin: marginIn(open, gainBandwidth), gainBandwidth });
  const last = at(most);
  if (most <= least) return last;
  const [first, middle] = [at(least), at(Math.sqrt(least * most))];
  const worst = lesser(lesser(last, first), middle);
  const curve = first.margin - 2 * middle.margin + last.margin;
  const hasDip = curve > FLAT && Math.abs(first.margin - last.margin) < 2 * curve;
  return hasDip ? lesser(worst, dip(at, { least, most })) : worst;
}

/** Degrees: less than rounding of a margin. */
const FLAT = 1e-7;

const lesser = (one: Margin, other: Margin): Margin => (other.margin < one.margin ? other : one);

/** Golden-section search for the one minimum in between (Kiefer, Proc. Amer. Math. Soc. 4, 1953, from memory). */
function dip(at: (gainBandwidth: number) => Margin, { least, most }: Ends): Margin {
  let [low, high] = [Math.log(least), Math.log(most)];
  let left = at(Math.exp(high - GOLDEN * (high - low)));
  let right = at(Math.exp(low + GOLDEN * (high - low)));
  for (let step = 0; step < REFINEMENTS; step += 1) {
    if (left.margin < right.margin) {
      high = Math.log(right.gainBandwidth);
      right = left;
      left = at(Math.exp(high - GOLDEN * (high - low)));
    } else {
      low = Math.log(left.gainBandwidth);
      left = right;
      right = at(Math.exp(low + GOLDEN * (high - low)));
    }
  }
  return lesser(left, right);
}

/** Degrees at the true crossover (Hz), part by part; with 90° of the integrating amplifier they add up to the margin. */
export interface PhaseParts {
  readonly crossover: number;
  readonly feedback: number;
  readonly load: number;
  readonly own: number;
}

/**
 * Where the phase goes at the true crossover of T = A·β·load·own pole, one gain bandwidth (Hz). Null without a crossover: a part
 * far too slow for its network has nothing that could oscillate. A network of resistors alone leaves the load by itself: poles of
 * (Ro||RL)·CL and Riso·CL as M7 has them. One with capacitors of its own (filters, integrator, feedback capacitor, transimpedance)
 * loads the output resistance too: there Ro, Riso, RL and CL stand in one circuit with it, exactly.
 */
export function phaseParts(loop: Loop, gainBandwidth: number): PhaseParts | null {
  return partsIn(opened(loop), gainBandwidth);
}

/** β of the loop at a gain bandwidth (Hz): by itself, with the load inside it (null: the load stands apart), and its size with the load. */
interface Factors {
  readonly bare: Factor;
  readonly loaded: Factor | null;
  readonly size: (frequency: number) => number;
}

interface Opened {
  readonly loop: Loop;
  readonly factorsAt: (gainBandwidth: number) => Factors;
}

/** Made once where no capacitor of the loop is chosen by the gain bandwidth. */
function opened(loop: Loop): Opened {
  if (loop.open !== null) return { loop, factorsAt: (gainBandwidth) => factorsOf(loop, gainBandwidth) };
  let made: Factors | null = null;
  return { loop, factorsAt: (gainBandwidth) => (made ??= factorsOf(loop, gainBandwidth)) };
}

function factorsOf(loop: Loop, gainBandwidth: number): Factors {
  const networks = networksOf(loop, gainBandwidth);
  const bare = feedbackFactor(networks);
  const loaded = loadedOf(loop, networks);
  return { bare, loaded, size: sizeOf({ load: loop.load, bare, loaded }) };
}

function partsIn({ loop: { load, ownPole }, factorsAt }: Opened, gainBandwidth: number): PhaseParts | null {
  const { bare, loaded, size } = factorsAt(gainBandwidth);
  const crossover = crossoverOf((frequency) => Math.log(((gainBandwidth / frequency) * size(frequency)) / Math.hypot(1, frequency / ownPole)), gainBandwidth);
  if (crossover === null) return null;
  const feedback = bare(crossover);
  return {
    crossover,
    feedback: phase(feedback),
    load: loaded === null ? loadAngle(load, crossover) : phase(divide(loaded(crossover), feedback)),
    own: 0 - Math.atan(crossover / ownPole) * DEGREES,
  };
}

/** |β·load| of the loop as a function of the frequency in Hz, V/V: its inverse is the noise gain that the open-loop gain meets at the crossover. */
export function loopFactor(loop: Loop, gainBandwidth: number): (frequency: number) => number {
  return factorsOf(loop, gainBandwidth).size;
}

const loadedOf = ({ load }: Loop, networks: LoopNetworks): Factor | null => (load !== null && isExact(networks) ? loadedFactor(networks, load) : null);

function sizeOf({ load, bare, loaded }: { readonly load: LoadedOutput | null; readonly bare: Factor; readonly loaded: Factor | null }): (frequency: number) => number {
  return loaded === null ? (frequency) => magnitude(bare(frequency)) * loadSize(load, frequency) : (frequency) => magnitude(loaded(frequency));
}

const DEGREES = 180 / Math.PI;

/** Magnitude of the load alone, V/V. What a load resistance divides away at all frequencies is in the printed gain bandwidth already. */
function loadSize(load: LoadedOutput | null, frequency: number): number {
  if (load === null) return 1;
  return Math.hypot(1, Math.tan(turned(load, load.isolation, frequency) / DEGREES)) / Math.hypot(1, Math.tan(turned(load, load.outputResistance + load.isolation, frequency) / DEGREES));
}

const loadAngle = (load: LoadedOutput | null, frequency: number): number => (load === null ? 0 : turned(load, load.isolation, frequency) - turned(load, load.outputResistance + load.isolation, frequency));

/** Angle of (R||RL)·CL at a frequency, degrees: the zero stands at Riso, the pole at Ro + Riso. */
function turned({ resistance, capacitance }: LoadedOutput, ohms: number, frequency: number): number {
  const parallel = resistance === null ? ohms : (ohms * resistance) / (ohms + resistance);
  return Math.atan(2 * Math.PI * frequency * parallel * capacitance) * DEGREES;
}

/** Both networks with this part's capacitances and, where it is left to the part, its feedback capacitor. */
export function networksOf({ network, open, inputCapacitance, stray = 0 }: Loop, gainBandwidth: number): LoopNetworks {
  const flat = open === null ? null : maximallyFlatCapacitor({ feedback: open.feedback, inputCapacitance: open.inputCapacitance + inputCapacitance, gainBandwidth });
  const { plus, minus } = flat === null ? network : withFeedbackCapacitor(network, flat);
  return { plus: feedsBack(plus) ? plus : SILENT, minus, minusCapacitance: inputCapacitance + stray };
}

/** A bypass shorts a leg and takes nothing from the output. */
const isExact = ({ plus, minus }: LoopNetworks): boolean => [...plus.elements, ...minus.elements].some(({ kind, name }) => kind === 'capacitor' && name !== 'bypass');

const feedsBack = ({ elements, pin }: PinNetwork): boolean => pin === 'output' || elements.some(({ between }) => between.includes('output'));

/** A pin the output never reaches takes no part in the loop. */
const SILENT: PinNetwork = { elements: [], pin: 'ground' };
