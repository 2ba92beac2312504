import { inputOf, parallel, plusOne, ratioSpan, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import { feedbackLeg, pinOf, referenceLeg, signalLeg } from './networks.js';
import type { Span, StageResistors } from './stage.js';

/**
 * Four-resistor difference stage: feedback R2, input R1, positiveInput R3, toReference R4; the two ratios are independent corners.
 * Common mode at the pins (V2 R4 + Vref R3)/(R3 + R4). Source resistance adds to R1 and R3, that of the reference to R4; a bypass
 * takes it out of the + leg at signal frequencies.
 */
export function difference(resistors: StageResistors, around: Surroundings): Circuit {
  const { feedback, input, tolerance } = resistors;
  const positiveInput = resistors.positiveInput ?? input;
  const toReference = resistors.toReference ?? feedback;
  const source = { series: around.sourceResistance, seriesTolerance: around.sourceTolerance };
  const lower = ratioSpan({ value: feedback, tolerance }, { value: input, tolerance, ...source });
  const upperThrough = (exact: number) => ratioSpan({ value: toReference, tolerance, exact }, { value: positiveInput, tolerance, ...source });
  const upper = upperThrough(around.referenceResistance);
  const corner = (rho: number, k: number): RatioCorner => {
    const pins = (positive: number, reference: number): number => (positive * k + reference) / (1 + k);
    return {
      noiseGain: 1 + rho,
      output: (point, reference) =>
        pins(inputOf(point, 'positive'), reference) * (1 + rho) - inputOf(point, 'negative') * rho,
      commonMode: (point, reference) => pins(inputOf(point, 'positive'), reference),
    };
  };
  const endsOf = (k: Span): RatioCorner[] => [lower.min, lower.max].flatMap((rho) => [corner(rho, k.min), corner(rho, k.max)]);
  const isBypassed = around.signalResistance < around.referenceResistance;
  return {
    gain: lower.nominal,
    gainUnit: 'V/V',
    noiseGain: plusOne(lower),
    dcNoiseGain: plusOne(lower),
    resistors: { ...resistors, positiveInput, toReference },
    nominal: corner(lower.nominal, upper.nominal),
    corners: endsOf(upper),
    ...(isBypassed ? { signalCorners: endsOf(upperThrough(around.signalResistance)) } : {}),
    networkConductance: 1 / feedback,
    networkEnd: (commonMode) => commonMode,
    seriesPositive: parallel(positiveInput + around.sourceResistance, toReference + around.referenceResistance),
    seriesNegative: parallel(feedback, input + around.sourceResistance),
    resistorRejection: worstRejection(lower, upper),
    network: {
      plus: pinOf([...signalLeg('positive input', positiveInput, around), ...referenceLeg('to reference', toReference, around)]),
      minus: pinOf([...feedbackLeg(feedback, around), ...signalLeg('input', input, around)]),
    },
    notes: [],
  };
}

/**
 * Common-mode rejection left by the resistors alone at the worst corner, V/V: differential gain over common-mode gain.
 * Pallas-Areny & Webster, IEEE Trans. Instrum. Meas. 40(4), 1991 (from memory); (1+G)/(4t) for four equal tolerances.
 */
function worstRejection(lower: { min: number; max: number }, upper: { min: number; max: number }): number {
  const rejections = [lower.min, lower.max].flatMap((rho) =>
    [upper.min, upper.max].map((k) => {
      const positive = (k / (1 + k)) * (1 + rho);
      const common = Math.abs(positive - rho);
      return common === 0 ? Number.POSITIVE_INFINITY : (positive + rho) / 2 / common;
    }),
  );
  return Math.min(...rejections);
}
