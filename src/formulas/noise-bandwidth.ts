import { cascadeShrinkage } from './cascade.js';
import { requirePositive, requireWithin } from './domain.js';
import { transimpedanceResponse, type TransimpedanceStage } from './transimpedance.js';

/**
 * Noise bandwidth of n equal real poles, in units of their common −3 dB bandwidth: 1.571, 1.220, 1.155 …
 * @param poles whole number, at least 1
 * @returns Hz/Hz
 * @example realPolesNoiseBandwidth(2) is 1.220
 * Source: Motchenbacher & Connelly, Low-Noise Electronic System Design (1993), ch. 1 (from memory).
 */
export function realPolesNoiseBandwidth(poles: number): number {
  let area = Math.PI / 2 / cascadeShrinkage(poles);
  for (let k = 1; k < poles; k += 1) area *= (2 * k - 1) / (2 * k);
  return area;
}

/**
 * Noise bandwidth of an n-th order Butterworth low-pass, in units of its −3 dB bandwidth: (π/2n)/sin(π/2n).
 * @param order whole number, at least 1
 * @returns Hz/Hz
 * @example butterworthNoiseBandwidth(2) is 1.111
 * Source: closed form, any text on filters.
 */
export function butterworthNoiseBandwidth(order: number): number {
  requireWithin('butterworthNoiseBandwidth', { order }, { from: 1 });
  const angle = Math.PI / (2 * order);
  return angle / Math.sin(angle);
}

/**
 * Noise bandwidth of any second-order low-pass: (π/2)·f0·Q.
 * @param naturalFrequency Hz, above 0
 * @param q above 0
 * @returns Hz
 * @example secondOrderNoiseBandwidth(1e3, 1) is 1571 Hz
 * Source: closed form of the integral.
 */
export function secondOrderNoiseBandwidth(naturalFrequency: number, q: number): number {
  requirePositive('secondOrderNoiseBandwidth', { naturalFrequency, q });
  return (Math.PI / 2) * naturalFrequency * q;
}

/**
 * Factor that turns a transimpedance amplifier's voltage noise density into its output noise, exact:
 * √{(π/2)·f0·Q·[1 + (f0/fz)²]}, fz = 1/(2π·Rf(Cin+Cf)).
 * @returns √Hz, to multiply with en
 * @example 16 MHz, 10 MΩ, 45 pF, 0.5 pF: 47.8·10³ √Hz, so 4.5 nV/√Hz give 215 µV
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ex. 7.11 (data); exact form own algebra.
 */
export function transimpedanceVoltageNoiseRoot(stage: TransimpedanceStage): number {
  const { naturalFrequency, q } = transimpedanceResponse(stage);
  const zero = 1 / (2 * Math.PI * stage.feedback * (stage.inputCapacitance + stage.feedbackCapacitance));
  return Math.sqrt(secondOrderNoiseBandwidth(naturalFrequency, q) * (1 + (naturalFrequency / zero) ** 2));
}
