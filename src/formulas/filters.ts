import { turningPoint } from './bisection.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';
import { halfPowerFrequency, type LowPass } from './low-pass-response.js';

/** r1 source→x, r2 x→+ input, c1 x→output, c2 + input→reference; gain K at least 1. Ω, F, all above 0. */
export interface SallenKey {
  readonly r1: number;
  readonly r2: number;
  readonly c1: number;
  readonly c2: number;
  readonly gain: number;
}

/** r1 source→x, r2 x→output, r3 x→− input, c1 x→reference, c2 − input→output; DC gain −r2/r1. Ω, F, all above 0. */
export interface MultipleFeedback {
  readonly r1: number;
  readonly r2: number;
  readonly r3: number;
  readonly c1: number;
  readonly c2: number;
}

/**
 * Exact response of a Sallen-Key low-pass with an integrating amplifier A = 2π·GBW/s.
 * @param parts the five component values
 * @param gainBandwidth Hz, above 0; Infinity for the ideal filter
 * @returns coefficients of the low-pass
 * @example Butterworth 10 kHz at GBW = 300 kHz has its −3 dB at 9979 Hz (ideal: 10 kHz)
 * Source: own algebra; Karki, Analysis of the Sallen-Key Architecture (1999) for the ideal form (from memory).
 */
export function sallenKey(parts: SallenKey, gainBandwidth: number): LowPass {
  const { r1, r2, c1, c2, gain } = parts;
  requirePositive('sallenKey', { r1, r2, c1, c2 });
  requireWithin('sallenKey', { gain }, { from: 1 });
  const slowness = gain * integratorTime('sallenKey', gainBandwidth);
  const square = r1 * r2 * c1 * c2;
  const grounded = (r1 + r2) * c2;
  return {
    gain,
    a: grounded + r1 * c1 * (1 - gain) + slowness,
    b: square + slowness * (grounded + r1 * c1),
    c: slowness * square,
  };
}

/**
 * Exact response of a multiple-feedback low-pass with an integrating amplifier A = 2π·GBW/s.
 * @param parts the five component values
 * @param gainBandwidth Hz, above 0; Infinity for the ideal filter
 * @returns coefficients of the low-pass
 * @example multipleFeedback({r1: 10e3, r2: 10e3, r3: 5e3, c1: 4e-9, c2: 1e-9}, Infinity).gain is −1
 * Source: own algebra; Mancini (ed.), Op Amps for Everyone (2002), ch. 16 for the ideal form (from memory).
 */
export function multipleFeedback(parts: MultipleFeedback, gainBandwidth: number): LowPass {
  const { r1, r2, r3, c1, c2 } = parts;
  requirePositive('multipleFeedback', { r1, r2, r3, c1, c2 });
  const slowness = integratorTime('multipleFeedback', gainBandwidth);
  const conductance = 1 / r1 + 1 / r2 + 1 / r3;
  const square = r2 * r3 * c1 * c2;
  return {
    gain: -r2 / r1,
    a: r2 * r3 * c2 * conductance + (1 + r2 / r1) * slowness,
    b: square + r2 * (c1 + r3 * c2 * conductance) * slowness,
    c: square * slowness,
  };
}

/**
 * Gain-bandwidth at which the −3 dB frequency is off by a fraction: the largest such value, found downwards and bisected.
 * @param responseAt the filter as a function of the gain-bandwidth in Hz (Infinity: ideal)
 * @param shift fraction, above 0 and below 1, either direction
 * @returns Hz
 * @example gainBandwidthForShift((gbw) => sallenKey(butterworth10k, gbw), 0.01) is 132.8 kHz
 * Source: own algebra; Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972 for the first-order treatment (from memory).
 */
export function gainBandwidthForShift(responseAt: (gainBandwidth: number) => LowPass, shift: number): number {
  requireWithin('gainBandwidthForShift', { shift }, { above: 0, below: 1 });
  const ideal = halfPowerFrequency(responseAt(Infinity));
  const within = (gainBandwidth: number): boolean => Math.abs(halfPowerFrequency(responseAt(gainBandwidth)) / ideal - 1) <= shift;
  let high = ideal * 1e9;
  while (within(high / 1.1)) high /= 1.1;
  return turningPoint(within, { low: high / 1.1, high });
}

/**
 * What is left of a Sallen-Key's attenuation far above the amplifier's bandwidth: (Ro||R2)/(R1 + Ro||R2).
 * @param r1 Ω, above 0
 * @param r2 Ω, above 0
 * @param outputResistance Ω, open loop, above 0
 * @returns V/V
 * @example stopBandFloor(10e3, 10e3, 100) is 0.0098 (−40 dB)
 * Source: Karki, Analysis of the Sallen-Key Architecture (1999) (from memory).
 */
export function stopBandFloor(r1: number, r2: number, outputResistance: number): number {
  requirePositive('stopBandFloor', { r1, r2, outputResistance });
  const shunt = (outputResistance * r2) / (outputResistance + r2);
  return shunt / (r1 + shunt);
}

function integratorTime(where: string, gainBandwidth: number): number {
  if (gainBandwidth === Infinity) return 0;
  requirePositive(where, { gainBandwidth });
  return 1 / (2 * Math.PI * gainBandwidth);
}

/**
 * What C1 takes from the output of a Sallen-Key low-pass about an ideal amplifier. The pin stands at Vo/K, the inner node at (1 + jωR2C2)·Vo/K:
 * I = jωC1·(1 − (1 + jωR2C2)/K)·Vo, that is ω²·R2·C1·C2/K in phase and C1·(1 − 1/K) as a capacitance.
 * @param frequency Hz, at least 0
 * @returns siemens and F
 * @example 1 V at the corner of 10 kΩ each, Q = 1/√2, K = 1: ω²R2C1C2 = 1/R1, 100 µA
 * Source: own algebra.
 */
export function sallenKeyLoading({ r2, c1, c2, gain }: SallenKey, frequency: number): { readonly conductance: number; readonly capacitance: number } {
  requireNotNegative('sallenKeyLoading', { frequency });
  requirePositive('sallenKeyLoading', { r2, c1, c2, gain });
  return { conductance: ((2 * Math.PI * frequency) ** 2 * r2 * c1 * c2) / gain, capacitance: c1 * (1 - 1 / gain) };
}
