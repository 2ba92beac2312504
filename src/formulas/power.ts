import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Quiescent power of a package: VS·IQ·n.
 * @param supply V, at least 0 (the highest)
 * @param current A per amplifier, at least 0
 * @param amplifiers number in the package, at least 1
 * @returns W
 * @example quiescentPower(5.25, 1.2e-3, 2) is 12.6 mW
 * Source: definition.
 */
export function quiescentPower(supply: number, current: number, amplifiers: number): number {
  requireNotNegative('quiescentPower', { supply, current });
  requireWithin('quiescentPower', { amplifiers }, { from: 1 });
  return supply * current * amplifiers;
}

/**
 * Most an output can dissipate at DC: VS²/(4RL) with the load to a rail (at half the supply), VS²/(16RL) with it to mid-rail.
 * @param supply V, at least 0
 * @param load Ω, above 0
 * @param to where the load goes
 * @returns W
 * @example worstStaticDissipation(5, 1e3, 'rail') is 6.25 mW
 * Source: own algebra; Gray, Hurst, Lewis & Meyer, Analysis and Design of Analog Integrated Circuits (5th ed. 2009), class B (from memory).
 */
export function worstStaticDissipation(supply: number, load: number, to: 'rail' | 'middle'): number {
  requireNotNegative('worstStaticDissipation', { supply });
  requirePositive('worstStaticDissipation', { load });
  return supply ** 2 / ((to === 'rail' ? 4 : 16) * load);
}

/**
 * Average dissipation of the output for a sine about a DC level into a load to ground: VS·Vdc/RL − (Vdc² + Vp²/2)/RL.
 * @param drive supply V; level Vdc V; peak Vp V, with the output inside 0..supply; load Ω above 0
 * @returns W
 * @example 5 V, 2.5 V, 1 V peak, 1 kΩ: 5.75 mW
 * Source: own algebra.
 */
export function sineDissipation(drive: {
  readonly supply: number;
  readonly level: number;
  readonly peak: number;
  readonly load: number;
}): number {
  const { supply, level, peak, load } = drive;
  requirePositive('sineDissipation', { load });
  requireNotNegative('sineDissipation', { peak });
  requireWithin('sineDissipation', { level }, { from: peak, to: supply - peak });
  return (supply * level - level ** 2 - peak ** 2 / 2) / load;
}

/**
 * Power to swing a capacitive load, all of it dissipated in the amplifier: f·CL·Vpp·VS, sine or square.
 * @param drive frequency Hz, capacitance F, peakToPeak V, supply V; all at least 0
 * @returns W
 * @example 10 kHz, 100 nF, 4 V, 5 V: 20 mW
 * Source: charge per cycle CL·Vpp drawn from the supply.
 */
export function capacitiveLoadPower(drive: {
  readonly frequency: number;
  readonly capacitance: number;
  readonly peakToPeak: number;
  readonly supply: number;
}): number {
  const { frequency, capacitance, peakToPeak, supply } = drive;
  requireNotNegative('capacitiveLoadPower', { frequency, capacitance, peakToPeak, supply });
  return frequency * capacitance * peakToPeak * supply;
}

/**
 * Junction temperature: TA + θJA·P.
 * @param ambient °C, above −273.15
 * @param thermalResistance K/W, at least 0
 * @param power W, at least 0
 * @returns °C
 * @example junctionTemperature(85, 200, 0.05066) is 95.1 °C
 * Source: JEDEC JESD51 (1995).
 */
export function junctionTemperature(ambient: number, thermalResistance: number, power: number): number {
  requireWithin('junctionTemperature', { ambient }, { above: -273.15 });
  requireNotNegative('junctionTemperature', { thermalResistance, power });
  return ambient + thermalResistance * power;
}

/**
 * Battery life: usable charge over average current.
 * @param capacity Ah, above 0
 * @param usable fraction of it, above 0, at most 1
 * @param current A, above 0
 * @returns h
 * @example batteryLife(0.22, 0.85, 40e-6) is 4675 h
 * Source: definition.
 */
export function batteryLife(capacity: number, usable: number, current: number): number {
  requirePositive('batteryLife', { capacity, current });
  requireWithin('batteryLife', { usable }, { above: 0, to: 1 });
  return (capacity * usable) / current;
}
