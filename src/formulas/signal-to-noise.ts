import { ELEMENTARY_CHARGE } from './constants.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Peak-to-peak value quoted for Gaussian noise: 6.6 × rms, exceeded 0.097 % of the time.
 * @param rms V, at least 0
 * @returns V
 * @example peakToPeakNoise(153.74e-6) is 1.015 mV
 * Source: Franco (3rd ed. 2002), ex. 7.7.
 */
export function peakToPeakNoise(rms: number): number {
  requireNotNegative('peakToPeakNoise', { rms });
  return 6.6 * rms;
}

/**
 * Share of the time Gaussian noise is outside a peak-to-peak band: erfc(k/(2√2)).
 * @param factor k, band in units of rms, 0..10
 * @returns fraction
 * @example gaussianExceedance(6.6) is 0.000967
 * Source: Gaussian distribution; Taylor series of the error function.
 */
export function gaussianExceedance(factor: number): number {
  requireWithin('gaussianExceedance', { factor }, { from: 0, to: 10 });
  const x = factor / (2 * Math.SQRT2);
  let term = x;
  let sum = x;
  for (let n = 1; Math.abs(term) > 1e-18 * sum && n < 400; n += 1) {
    term *= (-x * x) / n;
    sum += term / (2 * n + 1);
  }
  return 1 - (2 / Math.sqrt(Math.PI)) * sum;
}

/**
 * Signal-to-noise ratio of a full-scale sine: 20·log10[swing/(2√2)/rms], with the swing that is available, not the supply.
 * @param swing V peak to peak, above 0
 * @param rms V, above 0
 * @returns dB
 * @example signalToNoise(4.8, 100e-6) is 84.6 dB
 * Source: definition.
 */
export function signalToNoise(swing: number, rms: number): number {
  requirePositive('signalToNoise', { swing, rms });
  return 20 * Math.log10(swing / (2 * Math.SQRT2) / rms);
}

/**
 * Signal-to-noise ratio of a current limited by its own shot noise √(2qIB).
 * @param current A, above 0
 * @param bandwidth Hz (noise bandwidth), above 0
 * @returns dB
 * @example shotSignalToNoise(1e-6, 1e6) is 64.9 dB
 * Source: Franco (3rd ed. 2002), ex. 7.5a; Schottky (1918) for the shot noise (from memory).
 */
export function shotSignalToNoise(current: number, bandwidth: number): number {
  requirePositive('shotSignalToNoise', { current, bandwidth });
  return 10 * Math.log10(current / (2 * ELEMENTARY_CHARGE * bandwidth));
}

/**
 * Signal-to-noise ratio of an ideal converter on a full-scale sine: 20·log10(2)·n + 10·log10(1.5).
 * @param bits at least 1
 * @returns dB
 * @example idealConverterSignalToNoise(12) is 74.0 dB
 * Source: Bennett, Spectra of quantized signals, Bell Syst. Tech. J. 27, 1948; IEEE Std 1241-2010.
 */
export function idealConverterSignalToNoise(bits: number): number {
  requireWithin('idealConverterSignalToNoise', { bits }, { from: 1 });
  return 20 * Math.log10(2) * bits + 10 * Math.log10(1.5);
}
