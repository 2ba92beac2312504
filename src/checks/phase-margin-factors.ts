import { withFeedbackCapacitor } from '../demands/index.js';
import { magnitude, type Complex } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { loadedFactor, type Factor, type LoopNetworks } from './phase-margin-exact-load.js';
import { loadSize } from './phase-margin-load.js';
import type { Loop } from './phase-margin-loop.js';

/** β of the loop at a gain bandwidth (Hz): by itself, with the load inside it (null: the load stands apart), and its size with the load. */
export interface Factors {
  readonly bare: Factor;
  readonly loaded: Factor | null;
  readonly size: (frequency: number) => number;
}

/** What was found out about one network: and its feedback factor by the capacitance at the − input. */
interface Known {
  /** As it takes part in the loop. */
  readonly plus: PinNetwork;
  readonly isExact: boolean;
  readonly isResistive: boolean;
  readonly bare: Map<number, Factor>;
  readonly lags: Map<number, InputLag>;
}

/** What resistors alone and a capacitance at the − input make of the output: V/V at DC, and s (times a frequency in Hz the tangent of the lag there). */
export interface InputLag {
  readonly share: number;
  readonly time: number;
}

const KNOWN = new WeakMap<Loop['network'], Known>();
/** Values of an input capacitance that a list prints; a search over it begins anew. */
const CAPACITANCES = 256;

function knownOf(network: Loop['network']): Known {
  const before = KNOWN.get(network);
  if (before !== undefined) return before;
  const { minus } = network;
  const plus = heard(network.plus);
  const known = { plus, isExact: isExact({ plus, minus }), isResistive: resistorsAlone(network), bare: new Map<number, Factor>(), lags: new Map<number, InputLag>() };
  KNOWN.set(network, known);
  return known;
}

/** A network of resistors alone, and no capacitor that the gain bandwidth chooses. */
export const isResistive = ({ network, open }: Loop): boolean => open === null && knownOf(network).isResistive;

/** Nothing leads: resistors alone, and a load that is not isolated. |T| falls with the frequency and so does the phase, and the margin is least at the largest gain bandwidth. */
export const onlyLags = (loop: Loop): boolean => isResistive(loop) && (loop.load === null || loop.load.isolation === 0);

/** From the output to the − input, with a capacitance there at most: what comes back is most at DC, and a load takes from it. */
function resistorsAlone({ plus, minus }: Loop['network']): boolean {
  const { elements, pin } = minus;
  const isHeard = pin === 'output' || (feedsBack(minus) && elements.some(({ between }) => between.includes(pin)));
  return !feedsBack(plus) && isHeard && elements.every(({ kind }) => kind === 'resistor');
}

/** What comes back at a gain bandwidth (Hz), which counts only where it chooses a capacitor of the network. */
export function factorsOf(loop: Loop, gainBandwidth: number): Factors {
  const { load } = loop;
  const known = loop.open === null ? knownOf(loop.network) : null;
  const networks = known === null ? networksOf(loop, gainBandwidth) : { plus: known.plus, minus: loop.network.minus, minusCapacitance: minusCapacitance(loop) };
  const bare = known === null ? feedbackFactor(networks) : bareOf(networks, known);
  const loaded = load !== null && (known?.isExact ?? isExact(networks)) ? loadedFactor(networks, load) : null;
  if (loaded !== null) return { bare, loaded, size: (frequency) => magnitude(loaded(frequency)) };
  const ofLoad = loadSize(load);
  return { bare, loaded, size: (frequency) => share(bare(frequency)) * ofLoad(frequency) };
}

/** Size of what comes back, V/V: too near to 1 for the care that hypot takes. */
const share = ({ re, im }: Complex): number => Math.sqrt(re * re + im * im);

/** Of a network of resistors alone. */
export function inputLagOf(loop: Loop): InputLag {
  const known = knownOf(loop.network);
  const capacitance = minusCapacitance(loop);
  const before = known.lags.get(capacitance);
  if (before !== undefined) return before;
  if (known.lags.size >= CAPACITANCES) known.lags.clear();
  const lag = lagIn(bareOf({ plus: known.plus, minus: loop.network.minus, minusCapacitance: capacitance }, known), capacitance);
  known.lags.set(capacitance, lag);
  return lag;
}

function lagIn(bare: Factor, capacitance: number): InputLag {
  const share = magnitude(bare(0));
  if (capacitance === 0) return { share, time: 0 };
  // The tangent is taken where it is near 1: farther off rounding would tell.
  const timeAt = (frequency: number): number => {
    const { re, im } = bare(frequency);
    return -im / re / frequency;
  };
  let time = timeAt(SOMEWHERE);
  for (let step = 0; step < 2 && time > 0; step += 1) time = timeAt(1 / time);
  return { share, time };
}

/** Hz. */
const SOMEWHERE = 1e6;

function bareOf(networks: LoopNetworks, { bare }: Known): Factor {
  const before = bare.get(networks.minusCapacitance);
  if (before !== undefined) return before;
  if (bare.size >= CAPACITANCES) bare.clear();
  const factor = feedbackFactor(networks);
  bare.set(networks.minusCapacitance, factor);
  return factor;
}

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
