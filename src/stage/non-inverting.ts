import { inputOf, parallel, plusOne, ratioSpan, UNITY, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import type { StageResistors } from './stage.js';

/** Non-inverting stage, gain leg to the reference; AC-coupled with a capacitor in the gain leg, so that its DC gain is 1 (method.md 1). */
export function nonInverting(resistors: StageResistors, around: Surroundings): Circuit {
  const { feedback, input, tolerance } = resistors;
  const series = around.ac ? 0 : around.referenceResistance;
  const ratio = ratioSpan({ value: feedback, tolerance }, { value: input, tolerance, series });
  const noiseGain = plusOne(ratio);
  const corner = (rho: number): RatioCorner => ({
    noiseGain: 1 + rho,
    output: (point, reference) => {
      const vi = inputOf(point, 'input');
      return around.ac ? reference + (1 + rho) * vi : reference + (1 + rho) * (vi - reference);
    },
    commonMode: (point, reference) => (around.ac ? reference : 0) + inputOf(point, 'input'),
  });
  return {
    gain: noiseGain.nominal,
    noiseGain,
    dcNoiseGain: around.ac ? UNITY : noiseGain,
    resistors,
    nominal: corner(ratio.nominal),
    corners: [corner(ratio.min), corner(ratio.max)],
    networkConductance: 1 / (feedback + input + series),
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.ac ? around.referenceResistance : around.sourceResistance,
    seriesNegative: around.ac ? feedback : parallel(feedback, input + series),
    resistorRejection: null,
    notes: [],
  };
}
