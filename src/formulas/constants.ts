import { requirePositive } from './domain.js';

/** Boltzmann constant k, J/K, exact. Source: SI Brochure, 9th ed. (BIPM 2019), table 1. */
export const BOLTZMANN = 1.380649e-23;

/** Elementary charge q, C, exact. Source: SI Brochure, 9th ed. (BIPM 2019), table 1. */
export const ELEMENTARY_CHARGE = 1.602176634e-19;

/**
 * Thermal voltage VT = kT/q.
 * @param temperature K, above 0
 * @returns V
 * @example thermalVoltage(298.15) is 25.69 mV
 * Source: from the exact SI constants.
 */
export function thermalVoltage(temperature: number): number {
  requirePositive('thermalVoltage', { temperature });
  return (BOLTZMANN * temperature) / ELEMENTARY_CHARGE;
}
