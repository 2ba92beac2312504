import { requireFinite, requireNotNegative, requirePositive } from './domain.js';

/** Where a stage stands: output and common mode at the amplifier's inputs, V; DC noise gain, V/V. */
export interface StagePoint {
  readonly output: number;
  readonly commonMode: number;
  readonly noiseGain: number;
}

/**
 * Follower: vo = vi, vcm = vi, NG = 1.
 * @param input V, finite
 * @example follower(1.2) stands at 1.2 V with its inputs at 1.2 V
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 1 (from memory).
 */
export function follower(input: number): StagePoint {
  requireFinite('follower', { input });
  return { output: input, commonMode: input, noiseGain: 1 };
}

/**
 * Non-inverting, Rg to the reference: vo = Vref + (1+ρ)(vi − Vref), vcm = vi, NG = 1+ρ. A Sallen-Key of gain K is ρ = K − 1.
 * @param stage input and reference V; ratio ρ = Rf/Rg, at least 0
 * @example nonInverting({input: 2.8, reference: 2.5, ratio: 4}) stands at 4.0 V
 * Source: Franco (3rd ed. 2002), ch. 1 (from memory).
 */
export function nonInverting(stage: { readonly input: number; readonly reference: number; readonly ratio: number }): StagePoint {
  const { input, reference, ratio } = stage;
  requireFinite('nonInverting', { input, reference });
  requireNotNegative('nonInverting', { ratio });
  return { output: reference + (1 + ratio) * (input - reference), commonMode: input, noiseGain: 1 + ratio };
}

/**
 * Inverting, + input at the reference: vo = Vref(1+ρ) − ρ·vi, vcm = Vref, NG = 1+ρ. Also multiple feedback, ρ = |H0|.
 * @param stage input and reference V; ratio ρ = Rf/Rin, at least 0
 * @example inverting({input: 0, reference: 2.5, ratio: 2}) idles at 7.5 V, not at 2.5 V
 * Source: Franco (3rd ed. 2002), ch. 1; Mancini (ed.), Op Amps for Everyone (2002), ch. 4 (from memory).
 */
export function inverting(stage: { readonly input: number; readonly reference: number; readonly ratio: number }): StagePoint {
  return summing({ legs: [stage], reference: stage.reference });
}

/**
 * Inverting summer: vo = Vref(1+Σρk) − Σρk·vk, vcm = Vref, NG = 1+Σρk. Every leg counts, also a grounded one.
 * @param stage legs with input V and ratio Rf/Rk at least 0; reference V
 * @example summing({legs: [{input: 1, ratio: 1}, {input: 0, ratio: 2}], reference: 0}) stands at −1 V with NG 4
 * Source: Franco (3rd ed. 2002), ch. 1 (from memory).
 */
export function summing(stage: {
  readonly legs: readonly { readonly input: number; readonly ratio: number }[];
  readonly reference: number;
}): StagePoint {
  requireFinite('summing', { reference: stage.reference });
  let noiseGain = 1;
  let drawn = 0;
  for (const { input, ratio } of stage.legs) {
    requireFinite('summing', { input });
    requireNotNegative('summing', { ratio });
    noiseGain += ratio;
    drawn += ratio * input;
  }
  return { output: stage.reference * noiseGain - drawn, commonMode: stage.reference, noiseGain };
}

/**
 * Difference stage with any resistors: vcm = (V2·R4 + Vref·R3)/(R3+R4), vo = vcm(1 + R2/R1) − V1·R2/R1, NG = 1 + R2/R1.
 * @param stage positive V2, negative V1, reference V; negativeRatio R2/R1 and positiveRatio R4/R3, both at least 0
 * @example difference({positive: 12, negative: 11.9, reference: 0, negativeRatio: 10, positiveRatio: 10}) stands at 1 V, its inputs at 10.9 V
 * Source: Franco (3rd ed. 2002), ch. 1, 2 (from memory).
 */
export function difference(stage: {
  readonly positive: number;
  readonly negative: number;
  readonly reference: number;
  readonly negativeRatio: number;
  readonly positiveRatio: number;
}): StagePoint {
  const { positive, negative, reference, negativeRatio, positiveRatio } = stage;
  requireFinite('difference', { positive, negative, reference });
  requireNotNegative('difference', { negativeRatio, positiveRatio });
  const commonMode = (positive * positiveRatio + reference) / (1 + positiveRatio);
  return { output: commonMode * (1 + negativeRatio) - negative * negativeRatio, commonMode, noiseGain: 1 + negativeRatio };
}

/**
 * Highest common mode of the source of a matched difference stage: [vcm_max(1+G) − Vref]/G.
 * @param inputLimit V, the highest voltage allowed at the amplifier's inputs
 * @param reference V
 * @param gain G, above 0
 * @returns V
 * @example differenceSourceLimit(3.5, 0, 0.25) is 17.5 V
 * Source: Franco (3rd ed. 2002), ch. 2 (from memory).
 */
export function differenceSourceLimit(inputLimit: number, reference: number, gain: number): number {
  requireFinite('differenceSourceLimit', { inputLimit, reference });
  requirePositive('differenceSourceLimit', { gain });
  return (inputLimit * (1 + gain) - reference) / gain;
}
