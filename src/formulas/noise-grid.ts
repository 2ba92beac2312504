import { cell } from './cells.js';
import { BOLTZMANN } from './constants.js';
import { requirePositive, requireWithin } from './domain.js';
import type { FeedbackNetworks } from './feedback-loop.js';
import { panelIntegral } from './gauss-kronrod.js';
import { butterworthPower, panelAxis, type FollowingFilter, type Panel, type PanelAxis } from './panel-axis.js';
import { pinResponses, type PinResponse } from './pin-network.js';

/** temperature K, lowest frequency of interest Hz; both above 0. Every resistor has a name of its own. */
export interface NoiseStage extends FeedbackNetworks {
  readonly temperature: number;
  readonly lowest: number;
  readonly following: FollowingFilter | null;
}

/**
 * A stage without its amplifier, sampled panel by panel: feedback factor V/V; |Z+|² and |Z−|² Ω²; thermal densities at the
 * amplifier's input V²/Hz, each and together.
 */
export interface NoiseSamples extends PanelAxis {
  readonly feedbackRe: Float64Array;
  readonly feedbackIm: Float64Array;
  readonly plusSquare: Float64Array;
  readonly minusSquare: Float64Array;
  readonly thermal: readonly Float64Array[];
  readonly thermalSum: Float64Array;
}

/** The samples of a whole stage; after the last panel one point stands for everything above. resistors name the thermal rows. */
export interface NoiseGrid extends NoiseSamples {
  readonly following: FollowingFilter | null;
  readonly resistors: readonly string[];
}

/** Hz, above which noise falls with 1/f² behind any amplifier. */
const HIGHEST = 1e15;
/** In ln f. A network's own corners lie π/2 away from this axis: 15 points hold it to 1e-10. */
const WIDEST = 1.5;
const NARROWEST = WIDEST / 256;
/** Of the 7-point rule; the 15-point rule is then good to about its power of 1.6. */
const RESOLVED = 1e-5;

/**
 * Everything of a stage that its output noise needs, but the amplifier: worked out once, then outputNoise() for each amplifier.
 * @param stage networks Ω and F, temperature K, lowest Hz
 * @returns samples from lowest to 1e15 Hz, closer where the network or the filter has a resonance
 * @example noiseGrid(10 kΩ from ground to +, follower, 300 K, 0.1 Hz).thermal[0] is 1.657e-16 V²/Hz throughout
 * Source: Nyquist, Thermal agitation of electric charge in conductors, Phys. Rev. 32, 1928; quadrature as panelIntegral().
 * @throws RangeError for two resistors of one name, and as pinResponse().
 */
export function noiseGrid(stage: NoiseStage): NoiseGrid {
  const { temperature, lowest, following } = stage;
  requirePositive('noiseGrid', { temperature });
  requireWithin('noiseGrid', { lowest }, { above: 0, to: 1e12 });
  if (following) {
    requirePositive('noiseGrid', { 'following corner': following.corner });
    requireWithin('noiseGrid', { 'following order': following.order }, { from: 1 });
  }
  const resistors = resistorNames(stage);
  const response = stageResponse(stage);
  const [from, to] = [Math.log(lowest), Math.log(HIGHEST)];
  const count = Math.ceil((to - from) / WIDEST);
  const edge = (k: number): number => from + ((to - from) * k) / count;
  const panels = Array.from({ length: count }, (_, k): Panel => [edge(k), edge(k + 1)]).flatMap((panel) => refined(panel, response, following));
  const axis = withTail(panelAxis(panels.map(({ panel }) => panel), following), following);
  const points = [...panels.flatMap(({ points: own }) => own), response(HIGHEST)];
  return { following, resistors, ...axis, ...sampled(points, 4 * BOLTZMANN * temperature) };
}

/** One point more for all above: ∫ of 1/f² from there to infinity is its value there times that frequency. */
function withTail(axis: PanelAxis, following: FollowingFilter | null): PanelAxis {
  return {
    frequency: Float64Array.of(...axis.frequency, HIGHEST),
    weight: Float64Array.of(...axis.weight, HIGHEST),
    difference: Float64Array.of(...axis.difference, 0),
    filter: Float64Array.of(...axis.filter, butterworthPower(HIGHEST, following)),
  };
}

/** @param fourKT J, 4kT */
function sampled(points: readonly StagePoint[], fourKT: number): Omit<NoiseSamples, keyof PanelAxis> {
  const thermal = (points[0]?.shares ?? []).map((_, k) => Float64Array.from(points, ({ shares }) => fourKT * (shares[k] ?? NaN)));
  return {
    feedbackRe: Float64Array.from(points, ({ feedbackRe }) => feedbackRe),
    feedbackIm: Float64Array.from(points, ({ feedbackIm }) => feedbackIm),
    plusSquare: Float64Array.from(points, ({ plusSquare }) => plusSquare),
    minusSquare: Float64Array.from(points, ({ minusSquare }) => minusSquare),
    thermal,
    thermalSum: Float64Array.from(points, (_, i) => thermal.reduce((sum, row) => sum + (row[i] ?? NaN), 0)),
  };
}

interface StagePoint {
  readonly feedbackRe: number;
  readonly feedbackIm: number;
  readonly plusSquare: number;
  readonly minusSquare: number;
  readonly shares: readonly number[];
}

function stageResponse({ plus, minus, plusCapacitance = 0, minusCapacitance = 0 }: NoiseStage): (frequency: number) => StagePoint {
  const [atPlus, atMinus] = [pinResponses(plus, plusCapacitance), pinResponses(minus, minusCapacitance)];
  const square = ({ impedance: { re, im } }: PinResponse): number => re * re + im * im;
  return (frequency) => {
    const [p, m] = [atPlus(frequency), atMinus(frequency)];
    return {
      feedbackRe: m.fromOutput.re - p.fromOutput.re,
      feedbackIm: m.fromOutput.im - p.fromOutput.im,
      plusSquare: square(p),
      minusSquare: square(m),
      shares: [...p.thermal, ...m.thermal].map(({ transfer }) => transfer),
    };
  };
}

interface SampledPanel {
  readonly panel: Panel;
  readonly points: readonly StagePoint[];
}

/** Halves a panel until the noise gain of an ideal amplifier is resolved on it, where the filter lets anything through. */
function refined(panel: Panel, response: (frequency: number) => StagePoint, following: FollowingFilter | null): readonly SampledPanel[] {
  const [from, to] = panel;
  const { frequency, filter } = panelAxis([panel], following);
  const points = Array.from(frequency, response);
  const values = points.map(({ feedbackRe, feedbackIm }, i) => (cell(filter, i) * cell(frequency, i)) / (feedbackRe * feedbackRe + feedbackIm * feedbackIm));
  const { integral, difference } = panelIntegral(values, to - from);
  if (difference <= RESOLVED * integral || to - from < NARROWEST || cell(filter, 0) < 1e-8) return [{ panel, points }];
  const middle = (from + to) / 2;
  return [...refined([from, middle], response, following), ...refined([middle, to], response, following)];
}

function resistorNames({ plus, minus }: NoiseStage): readonly string[] {
  const names = [...plus.elements, ...minus.elements].filter(({ kind }) => kind === 'resistor').map(({ name }) => name);
  const twice = names.filter((name, k) => names.indexOf(name) !== k);
  if (twice.length > 0) throw new RangeError(`noiseGrid: every resistor needs a name of its own, but ${twice.join(', ')} stands for two`);
  return names;
}
