import { requireFinite, requirePositive } from './domain.js';

/**
 * An amplitude ratio in decibels: 20·log10(ratio).
 * @param ratio V/V, above 0
 * @returns dB
 * @example decibels(1000) is 60 dB
 * Source: definition of the decibel for field quantities (ISO 80000-3, 2006, annex C; from memory).
 */
export function decibels(ratio: number): number {
  requirePositive('decibels', { ratio });
  return 20 * Math.log10(ratio);
}

/**
 * The amplitude ratio behind decibels: 10^(dB/20).
 * @param level dB, finite
 * @returns V/V
 * @example ratioOfDecibels(80) is 10 000
 * Source: as decibels().
 */
export function ratioOfDecibels(level: number): number {
  requireFinite('ratioOfDecibels', { level });
  return 10 ** (level / 20);
}
