import { BOLTZMANN } from './constants.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Thermal noise of a resistor: √(4kTR).
 * @param resistance Ω, at least 0
 * @param temperature K, above 0
 * @returns V/√Hz
 * @example resistorNoise(1e3, 298.15) is 4.06 nV/√Hz
 * Source: Nyquist, Thermal agitation of electric charge in conductors, Phys. Rev. 32, 1928.
 */
export function resistorNoise(resistance: number, temperature: number): number {
  requireNotNegative('resistorNoise', { resistance });
  requirePositive('resistorNoise', { temperature });
  return Math.sqrt(4 * BOLTZMANN * temperature * resistance);
}

/** voltage V/√Hz and current A/√Hz of the amplifier; plus and minus Ω at its inputs (minus: Rf||Rg); noiseGain V/V; temperature K. */
export interface NoiseSources {
  readonly noiseGain: number;
  readonly voltage: number;
  readonly current: number;
  readonly plus: number;
  readonly minus: number;
  readonly temperature: number;
}

/**
 * Output noise density, all terms: NG·√(en² + 4kT(Rp+Rn) + (in·Rp)² + (in·Rn)²).
 * @returns V/√Hz
 * @example 10 nV, 1 pA, NG 10, Rp 10 kΩ, Rn 900 Ω, 300 K: 195 nV/√Hz
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 7; Motchenbacher & Connelly,
 * Low-Noise Electronic System Design (1993) (from memory).
 */
export function outputNoiseDensity(sources: NoiseSources): number {
  const { noiseGain, voltage, current, plus, minus, temperature } = sources;
  requireWithin('outputNoiseDensity', { noiseGain }, { from: 1 });
  requireNotNegative('outputNoiseDensity', { voltage, current, plus, minus });
  const thermal = resistorNoise(plus + minus, temperature);
  return noiseGain * Math.hypot(voltage, thermal, current * plus, current * minus);
}

/**
 * White noise with a 1/f part through one pole, exact: en·√{fce·½·ln[1+(fB/fL)²] + fB[π/2 − atan(fL/fB)]}. The logarithm takes fB,
 * only the white term takes 1.571·fB.
 * @param noise density (white level, any unit per √Hz, at least 0), corner fce Hz at least 0, lowest fL and pole fB Hz above 0
 * @returns unit of the density without the /√Hz, rms
 * @example density 20e-9, corner 200, lowest 0.1, pole 333.3e3: 14.5 µV
 * Source: Franco (3rd ed. 2002), ex. 7.7 (approximate form); exact integral own algebra.
 */
export function noiseThroughPole(noise: {
  readonly density: number;
  readonly corner: number;
  readonly lowest: number;
  readonly pole: number;
}): number {
  const { density, corner, lowest, pole } = noise;
  requireNotNegative('noiseThroughPole', { density, corner });
  requirePositive('noiseThroughPole', { lowest, pole });
  const flicker = (corner * Math.log1p((pole / lowest) ** 2)) / 2;
  return density * Math.sqrt(flicker + pole * (Math.PI / 2 - Math.atan(lowest / pole)));
}

/**
 * Gain from the supply to the output through a divider reference on the + input: NG·α/|1 + j2πf·C·(Ra||Rb)|.
 * @param divider upper Ra and lower Rb Ω above 0; capacitance F and frequency Hz at least 0; noiseGain V/V at least 1
 * @returns V/V
 * @example 100 kΩ/100 kΩ with 1 µF, NG 11, 100 Hz: 0.175; without the capacitor 5.5
 * Source: own algebra.
 */
export function referenceRippleGain(divider: {
  readonly upper: number;
  readonly lower: number;
  readonly capacitance: number;
  readonly frequency: number;
  readonly noiseGain: number;
}): number {
  const { upper, lower, capacitance, frequency, noiseGain } = divider;
  requirePositive('referenceRippleGain', { upper, lower });
  requireNotNegative('referenceRippleGain', { capacitance, frequency });
  requireWithin('referenceRippleGain', { noiseGain }, { from: 1 });
  const thevenin = (upper * lower) / (upper + lower);
  const fraction = lower / (upper + lower);
  return (noiseGain * fraction) / Math.hypot(1, 2 * Math.PI * frequency * capacitance * thevenin);
}
