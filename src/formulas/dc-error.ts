import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Bias current of a field-effect input at another temperature: ×2 per 10 K.
 * @param current A at the rated temperature, at least 0
 * @param rated °C
 * @param temperature °C
 * @returns A
 * @example biasCurrentAt(1e-12, 25, 85) is 64 pA
 * Source: Jung (ed.), Op Amp Applications Handbook (2005) (from memory); common practice.
 */
export function biasCurrentAt(current: number, rated: number, temperature: number): number {
  requireNotNegative('biasCurrentAt', { current });
  requireWithin('biasCurrentAt', { rated, temperature }, { above: -273.15 });
  return current * 2 ** ((temperature - rated) / 10);
}

/**
 * Error of the bias and offset currents across the resistances at the two inputs: Ib·|Rp−Rn| + (Ios/2)(Rp+Rn).
 * @param currents bias and offset A; plus Rp and minus Rn Ω; all magnitudes, at least 0
 * @returns V at the input
 * @example biasError({bias: 1e-9, offset: 0.2e-9, plus: 10e3, minus: 9e3}) is 2.9 µV
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 5 (from memory).
 */
export function biasError(currents: {
  readonly bias: number;
  readonly offset: number;
  readonly plus: number;
  readonly minus: number;
}): number {
  const { bias, offset, plus, minus } = currents;
  requireNotNegative('biasError', { bias, offset, plus, minus });
  return bias * Math.abs(plus - minus) + (offset / 2) * (plus + minus);
}

/**
 * Worst case of several errors: the sum of their magnitudes.
 * @param terms any one unit, finite
 * @returns the same unit
 * @example worstCaseSum([0.003, -0.004]) is 0.007
 * Source: definition of the worst case.
 */
export function worstCaseSum(terms: readonly number[]): number {
  return terms.reduce((sum, term) => addWorstCase(sum, finite('worstCaseSum', term)), 0);
}

/**
 * The same term by term: what there was and the magnitude of one more.
 * @param sum and term any one unit
 * @returns the same unit
 * @example addWorstCase(0.003, -0.004) is 0.007
 * Source: definition of the worst case.
 */
export function addWorstCase(sum: number, term: number): number {
  return sum + Math.abs(term);
}

/**
 * Root-sum-square of independent errors. Correlated ones must be summed first.
 * @param terms any one unit, finite
 * @returns the same unit
 * @example rootSumSquare([0.003, 0.004, 0.012]) is 0.013
 * Source: JCGM 100:2008 (GUM), sec. 5.1.
 */
export function rootSumSquare(terms: readonly number[]): number {
  return Math.hypot(...terms.map((term) => finite('rootSumSquare', term)));
}

/** Magnitudes in V, V/K, K; rejections and open-loop gain in V/V, above 0. */
export interface InputErrors {
  readonly offset: number;
  readonly drift: number;
  readonly temperatureChange: number;
  readonly commonModeChange: number;
  readonly commonModeRejection: number;
  readonly supplyChange: number;
  readonly supplyRejection: number;
  readonly outputChange: number;
  readonly openLoopGain: number;
}

/**
 * Worst-case error of the amplifier referred to its input: Vos + TC·ΔT + ΔVcm/CMRR + ΔVS/PSRR + ΔVo/A0.
 * @returns V; times the noise gain at the output
 * @example 0.5 mV, 2 µV/K·60 K, 2 V/80 dB, 0.5 V/90 dB, 4 V/100 dB: 0.876 mV
 * Source: Franco (3rd ed. 2002), ch. 5 (from memory).
 */
export function inputReferredError(errors: InputErrors): number {
  const { offset, drift, temperatureChange, commonModeChange, supplyChange, outputChange } = errors;
  const { commonModeRejection, supplyRejection, openLoopGain } = errors;
  requireNotNegative('inputReferredError', { offset, drift, temperatureChange, commonModeChange, supplyChange, outputChange });
  requirePositive('inputReferredError', { commonModeRejection, supplyRejection, openLoopGain });
  const leaks = commonModeChange / commonModeRejection + supplyChange / supplyRejection + outputChange / openLoopGain;
  return offset + drift * temperatureChange + leaks;
}

/**
 * Gain error of a finite open-loop gain at DC: −1/(1 + A0/NG).
 * @param openLoopGain V/V, above 0
 * @param noiseGain V/V, at least 1
 * @returns fraction, negative
 * @example openLoopGainError(1e5, 10) is −1.0e-4
 * Source: Franco (3rd ed. 2002), ch. 1 (from memory).
 */
export function openLoopGainError(openLoopGain: number, noiseGain: number): number {
  requirePositive('openLoopGainError', { openLoopGain });
  requireWithin('openLoopGainError', { noiseGain }, { from: 1 });
  return -1 / (1 + openLoopGain / noiseGain);
}

/**
 * Open-loop gain under a load: A0·RL/(RL + Ro).
 * @param openLoopGain V/V without load, above 0
 * @param load Ω, above 0
 * @param outputResistance Ω, open loop, at least 0
 * @returns V/V
 * @example loadedOpenLoopGain(1e5, 1e3, 100) is 90 909
 * Source: divider.
 */
export function loadedOpenLoopGain(openLoopGain: number, load: number, outputResistance: number): number {
  requirePositive('loadedOpenLoopGain', { openLoopGain, load });
  requireNotNegative('loadedOpenLoopGain', { outputResistance });
  return (openLoopGain * load) / (load + outputResistance);
}

/**
 * Gain error of a follower from its common-mode rejection: 1/CMRR, sign unknown. Inverting stages have none.
 * @param rejection V/V, above 0
 * @returns fraction
 * @example followerGainError(1000) is 0.001
 * Source: Franco (3rd ed. 2002), ch. 5 (from memory).
 */
export function followerGainError(rejection: number): number {
  requirePositive('followerGainError', { rejection });
  return 1 / rejection;
}

function finite(where: string, term: number): number {
  if (!Number.isFinite(term)) requireWithin(where, { term }, {});
  return term;
}
