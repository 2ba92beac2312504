import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Distortion of a follower whose offset steps where the input pairs hand over: a rectangular error of duty D = acos((Vx−Vdc)/Vp)/π,
 * THD = √{dV²·D(1−D) − (2·dV·sin(πD)/π)²/2}/(Vp/√2).
 * @param swing step dV V, at least 0; crossover Vx, level Vdc and peak Vp V, peak above 0, crossover inside level ± peak
 * @returns fraction of the fundamental
 * @example 1 mV at 3.5 V under 2 V peak about 2.5 V: 1.87e-4
 * Source: own algebra.
 */
export function inputCrossoverDistortion(swing: {
  readonly step: number;
  readonly crossover: number;
  readonly level: number;
  readonly peak: number;
}): number {
  const { step, crossover, level, peak } = swing;
  requireNotNegative('inputCrossoverDistortion', { step });
  requirePositive('inputCrossoverDistortion', { peak });
  requireWithin('inputCrossoverDistortion', { crossover }, { from: level - peak, to: level + peak });
  const duty = Math.acos(Math.max(-1, Math.min(1, (crossover - level) / peak))) / Math.PI;
  const fundamental = (2 * step * Math.sin(Math.PI * duty)) / Math.PI;
  return Math.sqrt(Math.max(0, step ** 2 * duty * (1 - duty) - fundamental ** 2 / 2)) / (peak / Math.SQRT2);
}
