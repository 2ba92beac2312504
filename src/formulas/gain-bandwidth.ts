import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/**
 * Closed-loop −3 dB bandwidth of a one-pole amplifier: f_cl = GBW/NG. The noise gain counts, never the signal gain: a unity
 * inverter has NG = 2.
 * @param gainBandwidth Hz, above 0
 * @param noiseGain V/V, at least 1
 * @returns Hz
 * @example closedLoopBandwidth(1e6, 11) is 90.9 kHz
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 6 (from memory).
 */
export function closedLoopBandwidth(gainBandwidth: number, noiseGain: number): number {
  requirePositive('closedLoopBandwidth', { gainBandwidth });
  requireWithin('closedLoopBandwidth', { noiseGain }, { from: 1 });
  return gainBandwidth / noiseGain;
}

/**
 * Gain-bandwidth for an amplitude error ε at f, exact: GBW = NG·f/√((1−ε)⁻²−1).
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param error fraction, above 0 and below 1
 * @returns Hz
 * @example gainBandwidthForMagnitudeError(10, 20e3, 0.01) is 1.4036 MHz
 * Source: Franco (3rd ed. 2002), ch. 6 (from memory); exact one-pole form.
 */
export function gainBandwidthForMagnitudeError(noiseGain: number, frequency: number, error: number): number {
  const needed = loopFrequency('gainBandwidthForMagnitudeError', noiseGain, frequency);
  requireWithin('gainBandwidthForMagnitudeError', { error }, { above: 0, below: 1 });
  // (1−ε)⁻²−1 written without its cancellation for small ε.
  return (needed * (1 - error)) / Math.sqrt(error * (2 - error));
}

/**
 * Gain-bandwidth for a phase lag φ at f: GBW = NG·f/tan φ.
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param phase degrees, above 0 and below 90
 * @returns Hz
 * @example gainBandwidthForPhaseError(10, 20e3, 1) is 11.458 MHz
 * Source: own algebra, one pole.
 */
export function gainBandwidthForPhaseError(noiseGain: number, frequency: number, phase: number): number {
  const needed = loopFrequency('gainBandwidthForPhaseError', noiseGain, frequency);
  requireWithin('gainBandwidthForPhaseError', { phase }, { above: 0, below: 90 });
  return needed / Math.tan((phase * Math.PI) / 180);
}

/**
 * Gain-bandwidth for a vector error |1−H/G| = ε at f: GBW = NG·f·√(ε⁻²−1). The rule "loop gain 100 for 1 %" is this one.
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param error fraction, above 0 and below 1
 * @returns Hz
 * @example gainBandwidthForVectorError(10, 20e3, 0.01) is 19.999 MHz
 * Source: own algebra, one pole.
 */
export function gainBandwidthForVectorError(noiseGain: number, frequency: number, error: number): number {
  const needed = loopFrequency('gainBandwidthForVectorError', noiseGain, frequency);
  requireWithin('gainBandwidthForVectorError', { error }, { above: 0, below: 1 });
  return (needed * Math.sqrt((1 - error) * (1 + error))) / error;
}

/**
 * Amplitude error at f, x = NG·f/GBW: 1 − 1/√(1+x²).
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param gainBandwidth Hz, above 0
 * @returns fraction
 * @example magnitudeErrorAt(1, 10e3, 1e6) is 5.0e-5: 0.005 % at a loop gain of 100
 * Source: as gainBandwidthForMagnitudeError().
 */
export function magnitudeErrorAt(noiseGain: number, frequency: number, gainBandwidth: number): number {
  const x = lag('magnitudeErrorAt', [noiseGain, frequency, gainBandwidth]);
  const root = Math.sqrt(1 + x * x);
  return (x * x) / (root * (root + 1));
}

/**
 * Phase lag at f: atan x, x = NG·f/GBW.
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param gainBandwidth Hz, above 0
 * @returns degrees
 * @example phaseErrorAt(1, 10e3, 1e6) is 0.573°
 * Source: own algebra, one pole.
 */
export function phaseErrorAt(noiseGain: number, frequency: number, gainBandwidth: number): number {
  return (Math.atan(lag('phaseErrorAt', [noiseGain, frequency, gainBandwidth])) * 180) / Math.PI;
}

/**
 * Vector error at f: x/√(1+x²), x = NG·f/GBW.
 * @param noiseGain V/V, at least 1
 * @param frequency Hz, at least 0
 * @param gainBandwidth Hz, above 0
 * @returns fraction
 * @example vectorErrorAt(1, 10e3, 1e6) is 0.0100
 * Source: own algebra, one pole.
 */
export function vectorErrorAt(noiseGain: number, frequency: number, gainBandwidth: number): number {
  const x = lag('vectorErrorAt', [noiseGain, frequency, gainBandwidth]);
  return x / Math.sqrt(1 + x * x);
}

function loopFrequency(where: string, noiseGain: number, frequency: number): number {
  requireWithin(where, { noiseGain }, { from: 1 });
  requireNotNegative(where, { frequency });
  return noiseGain * frequency;
}

function lag(where: string, [noiseGain, frequency, gainBandwidth]: readonly [number, number, number]): number {
  requirePositive(where, { gainBandwidth });
  return loopFrequency(where, noiseGain, frequency) / gainBandwidth;
}
