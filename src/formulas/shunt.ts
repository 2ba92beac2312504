import { requireNotNegative, requirePositive } from './domain.js';

/**
 * Least current a ground-referenced sense stage can show, because the output does not reach the rail: VOL/(G·Rsh).
 * @param lowestOutput V, VOL, at least 0
 * @param gain V/V, above 0
 * @param shunt Ω, above 0
 * @returns A
 * @example leastReadableCurrent(20e-3, 50, 10e-3) is 40 mA
 * Source: own algebra.
 */
export function leastReadableCurrent(lowestOutput: number, gain: number, shunt: number): number {
  requireNotNegative('leastReadableCurrent', { lowestOutput });
  requirePositive('leastReadableCurrent', { gain, shunt });
  return lowestOutput / (gain * shunt);
}

/**
 * Offset voltage as a current through the shunt: Vos/Rsh.
 * @param offset V, magnitude, at least 0
 * @param shunt Ω, above 0
 * @returns A
 * @example offsetAsCurrent(1e-3, 10e-3) is 100 mA
 * Source: own algebra.
 */
export function offsetAsCurrent(offset: number, shunt: number): number {
  requireNotNegative('offsetAsCurrent', { offset });
  requirePositive('offsetAsCurrent', { shunt });
  return offset / shunt;
}
