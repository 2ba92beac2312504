import { add, magnitude, type Complex } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import type { Stage } from '../stage/index.js';
import type { AmplifierNetwork } from '../stage/stage.js';
import { withFeedbackCapacitor } from './feedback-capacitor.js';
import type { Loop, NoiseGainAt } from './speed-demand.js';
import { openTransimpedance } from './stable-gain.js';

/**
 * What an error between the inputs is multiplied with at a frequency (Hz), nominal components, V/V: |1/β| of resistors; with
 * capacitors in the loop |1/(1/A + β)|, the part's own gain A beside them, since near the crossover the one differs much from the
 * other. A transimpedance stage counts the input of the part at hand and the capacitor that is left to it; of the other stages
 * neither is known to the demand. Never below 1. Source: as closedLoopNoiseGain().
 */
export function noiseGainAt(stage: Stage, frequency: number): NoiseGainAt {
  const { network, response } = stage;
  if (network === null) return () => stage.noiseGain.nominal;
  const closed = (factor: Complex, { gainBandwidth }: Loop): number => Math.max(1, 1 / magnitude(add({ re: 0, im: frequency / gainBandwidth }, factor)));
  if (response.kind === 'transimpedance') return (loop) => closed(feedbackFactor(withPart(stage, network, loop))(frequency), loop);
  const factor = feedbackFactor(network)(frequency);
  const noiseGain = Math.max(1, 1 / magnitude(factor));
  return hasCapacitor(network) ? (loop) => closed(factor, loop) : () => noiseGain;
}

/**
 * The same with the part's own gain beside β whatever the loop is made of: above its crossover the output no longer follows. An endless
 * gain bandwidth leaves |1/β|. Source: as closedLoopNoiseGain().
 */
export function closedNoiseGainAt(stage: Stage, frequency: number): NoiseGainAt {
  const { network, response } = stage;
  if (network === null) return () => stage.noiseGain.nominal;
  const closed = (factor: Complex, { gainBandwidth }: Loop): number => 1 / magnitude(add({ re: 0, im: frequency / gainBandwidth }, factor));
  if (response.kind === 'transimpedance') return (loop) => closed(feedbackFactor(withPart(stage, network, loop))(frequency), loop);
  const factor = feedbackFactor(network)(frequency);
  return (loop) => closed(factor, loop);
}

/** What stands at a + input the output does not reach, the bypass of a reference for one, is not in the loop. */
function hasCapacitor({ plus, minus }: AmplifierNetwork): boolean {
  const inLoop = [plus, minus].filter(({ elements }) => elements.some(({ between }) => between.includes('output')));
  return inLoop.some(({ elements }) => elements.some(({ kind }) => kind === 'capacitor'));
}

function withPart(stage: Stage, network: AmplifierNetwork, { gainBandwidth, inputCapacitance }: Loop): Parameters<typeof feedbackFactor>[0] {
  const open = openTransimpedance(stage);
  const total = (open?.inputCapacitance ?? 0) + inputCapacitance;
  const fitted = open === null || total === 0 ? network : withFeedbackCapacitor(network, maximallyFlatCapacitor({ feedback: open.feedback, inputCapacitance: total, gainBandwidth }));
  return { ...fitted, minusCapacitance: inputCapacitance };
}
