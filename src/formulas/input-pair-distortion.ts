import { turningPoint } from './bisection.js';
import { requirePositive, requireWithin } from './domain.js';

/** How fast a stage is driven: frequency and gainBandwidth in Hz, above 0; noiseGain V/V, at least 1. */
export interface Drive {
  readonly frequency: number;
  readonly gainBandwidth: number;
  readonly noiseGain: number;
}

/**
 * Third harmonic of a stage whose bipolar input pair (tanh law) must supply a fraction `ratio` of its slewing current:
 * HD3 = NG·(f/GBW)·2ρ³/(3r), ρ = (1−√(1−r²))/r; for small r NG·(f/GBW)·r²/12.
 * @param drive with ratio r = 2π·f·Vp/SR, above 0, at most 1
 * @returns fraction of the fundamental
 * @example thirdHarmonicBipolar({ratio: 0.5, frequency: 10e3, gainBandwidth: 1e6, noiseGain: 1}) is 2.565e-4 (−71.8 dB)
 * Source: Solomon, IEEE J. Solid-State Circuits 9(6), 1974 (pair law, from memory); series: own algebra.
 */
export function thirdHarmonicBipolar(drive: Drive & { readonly ratio: number }): number {
  const { ratio } = drive;
  requireWithin('thirdHarmonicBipolar', { ratio }, { above: 0, to: 1 });
  const rho = ratio / (1 + Math.sqrt(1 - ratio ** 2));
  return (perLoopGain('thirdHarmonicBipolar', drive) * 2 * rho ** 3) / (3 * ratio);
}

/**
 * The same for a square-law MOS pair, 8.5 dB better: third Fourier coefficient of 2·sin(asin(r·cos θ)/2); for small r
 * HD3 = NG·(f/GBW)·r²/32.
 * @param drive with ratio r = 2π·f·Vp/SR, above 0, at most 1
 * @returns fraction of the fundamental
 * @example thirdHarmonicMos({ratio: 0.5, frequency: 10e3, gainBandwidth: 1e6, noiseGain: 1}) is 9.08e-5 (−80.8 dB)
 * Source: Gray, Hurst, Lewis & Meyer (5th ed. 2009) (pair law, from memory); series: own algebra.
 */
export function thirdHarmonicMos(drive: Drive & { readonly ratio: number }): number {
  const { ratio } = drive;
  requireWithin('thirdHarmonicMos', { ratio }, { above: 0, to: 1 });
  const points = 1024;
  let sum = 0;
  for (let k = 0; k < points; k += 1) {
    const angle = (2 * Math.PI * k) / points;
    sum += 2 * Math.sin(Math.asin(ratio * Math.cos(angle)) / 2) * Math.cos(3 * angle);
  }
  return (perLoopGain('thirdHarmonicMos', drive) * (2 * sum)) / points / ratio;
}

/**
 * Slew margin SR/(2π·f·Vp) that holds the third harmonic of a bipolar pair (the harder case) at a limit; at least 1.
 * @param drive with harmonic: the limit as a fraction of the fundamental, above 0
 * @returns V/s per V/s
 * @example slewMarginForDistortion({harmonic: 1e-4, frequency: 10e3, gainBandwidth: 1e6, noiseGain: 1}) is 3.014
 * Source: thirdHarmonicBipolar() solved for r.
 */
export function slewMarginForDistortion(drive: Drive & { readonly harmonic: number }): number {
  const { harmonic } = drive;
  requirePositive('slewMarginForDistortion', { harmonic });
  const within = (margin: number): boolean => thirdHarmonicBipolar({ ...drive, ratio: 1 / margin }) <= harmonic;
  if (within(1)) return 1;
  let high = 2;
  while (!within(high)) high *= 2;
  return turningPoint(within, { low: high / 2, high });
}

function perLoopGain(where: string, { frequency, gainBandwidth, noiseGain }: Drive): number {
  requirePositive(where, { frequency, gainBandwidth });
  requireWithin(where, { noiseGain }, { from: 1 });
  return (noiseGain * frequency) / gainBandwidth;
}
