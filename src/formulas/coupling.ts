import { requireNotNegative, requireWithin } from './domain.js';

/**
 * Excursions about the bias after a coupling capacitor has removed the average of a pulse train: (1−D)·Vpp above, D·Vpp below.
 * @param peakToPeak V, at least 0
 * @param duty fraction of the time at the upper level, 0..1
 * @returns V, both as magnitudes
 * @example pulseExcursion(2, 0.1) is 1.8 V above and 0.2 V below
 * Source: own algebra.
 */
export function pulseExcursion(peakToPeak: number, duty: number): { readonly above: number; readonly below: number } {
  requireNotNegative('pulseExcursion', { peakToPeak });
  requireWithin('pulseExcursion', { duty }, { from: 0, to: 1 });
  return { above: (1 - duty) * peakToPeak, below: duty * peakToPeak };
}
