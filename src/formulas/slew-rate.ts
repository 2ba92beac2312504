import { thermalVoltage } from './constants.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Slew rate a sine needs: SR = 2π·f·Vp. By Bernstein's inequality also the exact worst case of any signal limited to the
 * band 0..f and to ±Vp.
 * @param frequency Hz, at least 0 (top of the band)
 * @param peak V at the output, at least 0
 * @returns V/s
 * @example slewRateForSine(20e3, 2) is 251 327 V/s
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 6, ex. 6.8;
 * Boas, Entire Functions (1954), ch. 11 (from memory).
 */
export function slewRateForSine(frequency: number, peak: number): number {
  requireNotNegative('slewRateForSine', { frequency, peak });
  return 2 * Math.PI * frequency * peak;
}

/**
 * Highest frequency of an undistorted sine: f = SR/(2π·Vp).
 * @param slewRate V/s, above 0
 * @param peak V at the output, above 0
 * @returns Hz
 * @example fullPowerFrequency(0.5e6, 5) is 15.9 kHz
 * Source: Franco (3rd ed. 2002), ex. 6.8a.
 */
export function fullPowerFrequency(slewRate: number, peak: number): number {
  requirePositive('fullPowerFrequency', { slewRate, peak });
  return slewRate / (2 * Math.PI * peak);
}

/**
 * Slew rate for a sum of tones whose steepest slopes may coincide: SR = 2π·Σ f_k·V_k.
 * @param tones frequency in Hz and peak in V at the output, both at least 0
 * @returns V/s
 * @example slewRateForTones([{frequency: 1e3, peak: 1}, {frequency: 10e3, peak: 0.5}]) is 37 699 V/s
 * Source: sum of the slopes of slewRateForSine(); own algebra.
 */
export function slewRateForTones(tones: readonly { readonly frequency: number; readonly peak: number }[]): number {
  return tones.reduce((sum, { frequency, peak }) => sum + slewRateForSine(frequency, peak), 0);
}

/**
 * Slope of a triangle wave: SR = 2·f·Vpp.
 * @param frequency Hz, at least 0
 * @param peakToPeak V, at least 0
 * @returns V/s
 * @example slewRateForTriangle(1e3, 2) is 4000 V/s
 * Source: geometry of the waveform.
 */
export function slewRateForTriangle(frequency: number, peakToPeak: number): number {
  requireNotNegative('slewRateForTriangle', { frequency, peakToPeak });
  return 2 * frequency * peakToPeak;
}

/**
 * Slew rate that holds a step wholly linear in a one-pole loop: SR = 2π·f_cl·ΔV.
 * @param step V, at least 0
 * @param bandwidth Hz, closed-loop −3 dB, at least 0
 * @returns V/s
 * @example slewRateForLinearStep(4, 1e6) is 25.13 V/µs
 * Source: Franco (3rd ed. 2002), sec. 6.4, onset of slewing (from memory).
 */
export function slewRateForLinearStep(step: number, bandwidth: number): number {
  requireNotNegative('slewRateForLinearStep', { step, bandwidth });
  return 2 * Math.PI * bandwidth * step;
}

/**
 * Largest step without slewing: ΔV = SR·τ = SR/(2π·f_cl).
 * @param slewRate V/s, above 0
 * @param bandwidth Hz, closed-loop −3 dB, above 0
 * @returns V
 * @example slewOnsetStep(633e3, 200e3) is 0.504 V
 * Source: Franco (3rd ed. 2002), ex. 6.7.
 */
export function slewOnsetStep(slewRate: number, bandwidth: number): number {
  requirePositive('slewOnsetStep', { slewRate, bandwidth });
  return slewRate / (2 * Math.PI * bandwidth);
}

/**
 * Slew rate left into a capacitive load: the smaller of SR and (Imax − Iresistive)/CL.
 * @param load slewRate V/s above 0; current A above 0 (usable); capacitance F above 0; resistiveCurrent A, 0..current
 * @returns V/s
 * @example effectiveSlewRate({slewRate: 5e6, current: 5e-3, capacitance: 10e-9}) is 0.5 V/µs
 * Source: I = C·dv/dt.
 */
export function effectiveSlewRate(load: {
  readonly slewRate: number;
  readonly current: number;
  readonly capacitance: number;
  readonly resistiveCurrent?: number;
}): number {
  const { slewRate, current, capacitance, resistiveCurrent = 0 } = load;
  requirePositive('effectiveSlewRate', { slewRate, current, capacitance });
  requireWithin('effectiveSlewRate', { resistiveCurrent }, { from: 0, to: current });
  return Math.min(slewRate, (current - resistiveCurrent) / capacitance);
}

/**
 * Slew rate per gain-bandwidth of a bipolar input pair without emitter resistors: SR/GBW = 2π·2VT.
 * @param temperature K, above 0
 * @returns V (V/s per Hz)
 * @example slewPerGainBandwidthBipolar(300) is 0.325 V/µs per MHz
 * Source: Solomon, The monolithic op amp: a tutorial study, IEEE J. Solid-State Circuits 9(6), 1974 (from memory).
 */
export function slewPerGainBandwidthBipolar(temperature: number): number {
  return 4 * Math.PI * thermalVoltage(temperature);
}

/**
 * Slew rate per gain-bandwidth of a square-law MOS input pair: SR/GBW = 2π·Vov.
 * @param overdrive V, gate overdrive Vov, above 0
 * @returns V (V/s per Hz)
 * @example slewPerGainBandwidthMos(0.2) is 1.257 V/µs per MHz
 * Source: Gray, Hurst, Lewis & Meyer, Analysis and Design of Analog Integrated Circuits (5th ed. 2009), ch. 9 (from memory).
 */
export function slewPerGainBandwidthMos(overdrive: number): number {
  requirePositive('slewPerGainBandwidthMos', { overdrive });
  return 2 * Math.PI * overdrive;
}
