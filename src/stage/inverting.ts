import { inputOf, parallel, plusOne, ratioSpan, UNITY, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import { feedbackLeg, pinOf, referencePin, signalLeg } from './networks.js';
import type { StageResistors } from './stage.js';

/** Inverting stage, + input at the reference. DC-coupled it idles at Vref(1+rho), AC-coupled at Vref. */
export function inverting(resistors: StageResistors, around: Surroundings): Circuit {
  const { feedback, input, tolerance } = resistors;
  const source = { series: around.sourceResistance, seriesTolerance: around.sourceTolerance };
  const ratio = ratioSpan({ value: feedback, tolerance }, { value: input, tolerance, ...source });
  const noiseGain = plusOne(ratio);
  const corner = (rho: number): RatioCorner => ({
    noiseGain: 1 + rho,
    output: (point, reference) => {
      const vi = inputOf(point, 'input');
      return around.ac ? reference - rho * vi : reference * (1 + rho) - rho * vi;
    },
    commonMode: (_point, reference) => reference,
  });
  return {
    gain: -ratio.nominal,
    gainUnit: 'V/V',
    noiseGain,
    dcNoiseGain: around.ac ? UNITY : noiseGain,
    resistors,
    nominal: corner(ratio.nominal),
    corners: [corner(ratio.min), corner(ratio.max)],
    networkConductance: 1 / feedback,
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.referenceResistance,
    seriesNegative: around.ac ? feedback : parallel(feedback, input + around.sourceResistance),
    resistorRejection: null,
    network: { plus: referencePin(around), minus: pinOf([...feedbackLeg(feedback, around), ...signalLeg('input', input, around)]) },
    notes: [],
  };
}
