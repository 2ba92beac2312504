import { formatDecibels } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { hasEdge } from './bandwidth-criteria.js';
import { cornerGroups, endsOf, type CornerGroup } from './corner-groups.js';
import { feedbackCapacitance } from './closed-loop.js';
import { noiseGainAt } from './noise-gain.js';
import { farthestFrom25 } from './operating.js';
import { bareVertex } from './output-headroom.js';
import { outputSlope } from './output-slope.js';
import type { ClippingCorner, DistortionDemand, InputSwing } from './speed-demand.js';

const SOURCE = 'M2, M6 and M9: input pair below the slew limit with the noise gain at the third harmonic (Solomon, IEEE J. Solid-State Circuits 9(6), 1974, from memory), clipping and input crossover (own algebra)';

/** Distortion of a sine at the largest swing and the top frequency, fraction. Null without a limit, and of an oscillator. */
export function distortion(stage: Stage): DistortionDemand | null {
  const limit = stage.asked.limits.distortion;
  if (limit === undefined || stage.response.kind === 'oscillator') return null;
  const groups = cornerGroups(stage);
  const slewing = slewingOf(stage);
  return {
    check: 'distortion',
    required: limit.value,
    unit: '1',
    sense: 'at-most',
    because: `${limit.text} of the fundamental (${formatDecibels(limit.value)}) at the largest swing${slewing === null ? `; ${silent(stage)} only clipping and the input crossover count` : ''}`,
    source: SOURCE,
    slewing,
    corners: groups.map((group) => clippingCorner(stage, group)),
    crossovers: inputSwings(stage),
    closest: Math.min(...stage.vertices.map(({ supply, commonMode }) => supply - commonMode)),
    peak: stage.outputPeak,
    noiseGain: stage.dcNoiseGain.max,
    kelvin: farthestFrom25(stage).kelvin,
  };
}

const silent = (stage: Stage): string => (hasEdge(stage) ? 'of a step' : 'without a frequency');

function slewingOf(stage: Stage): DistortionDemand['slewing'] {
  const { frequency, response } = stage;
  if (frequency === null || frequency === 0 || hasEdge(stage)) return null;
  return {
    frequency,
    slewRate: outputSlope(stage, frequency).slope,
    noiseGainAt: noiseGainAt(stage, 3 * frequency),
    countsInput: response.kind === 'transimpedance',
    remembers: response.kind !== 'amplifier' || feedbackCapacitance(stage) > 0,
  };
}

function peakOf({ vertices }: CornerGroup): number {
  const [low, high] = endsOf(vertices, ({ output }) => output);
  return (high.output - low.output) / 2;
}

function clippingCorner(stage: Stage, group: CornerGroup): ClippingCorner {
  const side = (of: 'low' | 'high') => group.vertices.map((vertex) => bareVertex(stage, of, vertex));
  return { peak: peakOf(group), low: side('low'), high: side('high') };
}

/** Below this the inputs stand still, V. */
const STILL = 1e-9;

/** How the inputs swing at every corner; only inputs that move with the signal can cross from one pair to the other within it. */
export function inputSwings(stage: Stage): InputSwing[] {
  return cornerGroups(stage).flatMap((group) => inputSwing(stage, group));
}

function inputSwing(stage: Stage, group: CornerGroup): InputSwing[] {
  const [near, far] = endsOf(group.vertices, ({ supply, commonMode }) => supply - commonMode).map(({ supply, commonMode }) => supply - commonMode) as [number, number];
  const outputPeak = peakOf(group);
  if (far - near <= STILL || outputPeak <= STILL) return [];
  return [{ near, far, supply: group.supply, noiseGain: stage.noiseGain.nominal, outputPeak }];
}
