import { inputOf, parallel, plusOne, ratioSpan, UNITY, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import { biasedPin, feedbackLeg, pinOf, referenceLeg, resistor, sourcePin } from './networks.js';
import type { StageResistors } from './stage.js';

/**
 * Non-inverting stage, gain leg to the reference; AC-coupled with a capacitor in the gain leg, so that its DC gain is 1. The
 * resistance of the reference stands in the leg; a bypass across it takes it out where bandwidth and stability are decided.
 */
export function nonInverting(resistors: StageResistors, around: Surroundings): Circuit {
  const { feedback, input, tolerance } = resistors;
  const series = around.ac ? 0 : around.referenceResistance;
  const isBypassed = series > 0 && around.referenceBypass > 0;
  const ratioThrough = (ohms: number) => ratioSpan({ value: feedback, tolerance }, { value: input, tolerance, series: ohms });
  const ratio = ratioThrough(series);
  const signal = isBypassed ? ratioThrough(around.signalResistance) : ratio;
  const corner = (rho: number): RatioCorner => ({
    noiseGain: 1 + rho,
    output: (point, reference) => {
      const vi = inputOf(point, 'input');
      return around.ac ? reference + (1 + rho) * vi : reference + (1 + rho) * (vi - reference);
    },
    commonMode: (point, reference) => (around.ac ? reference : 0) + inputOf(point, 'input'),
  });
  return {
    gain: 1 + ratio.nominal,
    gainUnit: 'V/V',
    noiseGain: plusOne(isBypassed ? ratioThrough(0) : ratio),
    dcNoiseGain: around.ac ? UNITY : plusOne(ratio),
    resistors,
    nominal: corner(ratio.nominal),
    corners: [corner(ratio.min), corner(ratio.max)],
    ...(isBypassed ? { signalCorners: [corner(signal.min), corner(signal.max)] } : {}),
    networkConductance: 1 / (feedback + input + series),
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.ac ? around.referenceResistance : around.sourceResistance,
    seriesNegative: around.ac ? feedback : parallel(feedback, input + series),
    resistorRejection: null,
    network: {
      plus: around.ac ? biasedPin(around) : sourcePin(around),
      minus: pinOf([...feedbackLeg(feedback, around), ...(around.ac ? resistor('gain leg', input, ['pin', 'ground']) : referenceLeg('gain leg', input, around))]),
    },
    notes: [],
  };
}
