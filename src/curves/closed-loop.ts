import type { Loop } from '../checks/phase-margin-loop.js';
import { networksOf } from '../checks/phase-margin-factors.js';
import { add, divide, magnitude, multiply, subtract, type Complex } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import { pinTransfers } from '../formulas/pin-network.js';
import type { Stage } from '../stage/index.js';
import type { Speed } from './loop.js';

/**
 * |Signal to output| over frequency (Hz), V/V: (a+ − a−)/(1/A + β), a± the transfers from the signal to the pins. A difference stage
 * is driven at its − leg, the + leg resting; a photocurrent counts over its resistor, so that its plateau is 1.
 * Source: as closedLoopGain() of the formulas; of a current, the pin's impedance times the noise gain.
 */
export function closedLoopOf(stage: Stage, loop: Loop, { gainBandwidth }: Speed): (frequency: number) => number {
  const networks = networksOf(loop, gainBandwidth);
  const [plus, minus] = [pinTransfers(loop.network.plus), pinTransfers(networks.minus, networks.minusCapacitance)];
  const factor = feedbackFactor(networks);
  const inverseGain = (frequency: number): Complex => multiply({ re: 0, im: frequency / gainBandwidth }, { re: 1, im: frequency / loop.ownPole });
  const noiseGain = (frequency: number): Complex => divide({ re: 1, im: 0 }, add(inverseGain(frequency), factor(frequency)));
  const { response } = stage;
  if (response.kind === 'transimpedance') return (frequency) => magnitude(multiply(minus(frequency).impedance, noiseGain(frequency))) / response.feedback;
  const oneLeg = stage.topology === 'difference' || stage.topology === 'high-side-sense';
  return (frequency) => {
    const a = minus(frequency).fromInput;
    const driven = oneLeg ? a : subtract(plus(frequency).fromInput, a);
    return magnitude(multiply(driven, noiseGain(frequency)));
  };
}
