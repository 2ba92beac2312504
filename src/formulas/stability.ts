import { requireNotNegative, requirePositive, requireWithin } from './domain.js';
import { secondPoleForPhaseMargin } from './two-pole-loop.js';

const DEGREES = 180 / Math.PI;

/**
 * Pole of the open-loop output resistance with a load: 1/(2π·(Ro||RL)·CL). The same form serves (Rf||Rg)·Cin.
 * @param resistance Ω, the parallel value, above 0
 * @param capacitance F, above 0
 * @returns Hz
 * @example poleFrequency(200, 1e-9) is 795.8 kHz
 * Source: definition of a pole.
 */
export function poleFrequency(resistance: number, capacitance: number): number {
  requirePositive('poleFrequency', { resistance, capacitance });
  return 1 / (2 * Math.PI * resistance * capacitance);
}

/**
 * Largest capacitance behind a resistance that leaves a phase margin: cos PM/(2π·R·fc·sin²PM). R = Ro for a load; R = Rf||Rg for
 * an input capacitance. No other pole is counted.
 * @param asymptote Hz, fc = GBW/NG, above 0
 * @param resistance Ω, above 0
 * @param phaseMargin degrees, above 0 and below 90
 * @returns F
 * @example capacitanceForPhaseMargin(1e6, 200, 45) is 1.125 nF
 * Source: own algebra, secondPoleForPhaseMargin().
 */
export function capacitanceForPhaseMargin(asymptote: number, resistance: number, phaseMargin: number): number {
  return 1 / (2 * Math.PI * positive(resistance) * secondPoleForPhaseMargin(asymptote, phaseMargin));
}

/** A loop (fc/jf)(1 + jf/fz)/(1 + jf/fp): frequencies in Hz, above 0. */
export interface LeadLagLoop {
  readonly asymptote: number;
  readonly zero: number;
  readonly pole: number;
}

/**
 * True crossover of a loop with one pole and one zero: f⁴/fp² + f²(1 − fc²/fz²) − fc² = 0.
 * @returns Hz
 * @example leadLagCrossover({asymptote: 1e6, zero: 318.3e3, pole: 63.66e3}) is 290.0 kHz
 * Source: own algebra, |T| = 1 solved exactly.
 */
export function leadLagCrossover({ asymptote, zero, pole }: LeadLagLoop): number {
  requirePositive('leadLagCrossover', { asymptote, zero, pole });
  const b = 1 - (asymptote / zero) ** 2;
  const root = Math.sqrt(b * b + (2 * asymptote / pole) ** 2);
  // Two forms of one root of the quadratic; each is free of cancellation on its side.
  return Math.sqrt(b > 0 ? (2 * asymptote ** 2) / (b + root) : ((root - b) * pole ** 2) / 2);
}

/**
 * Phase margin of that loop: 90° + atan(fx/fz) − atan(fx/fp). Isolation resistor: fz = 1/(2π·Riso·CL), fp = 1/(2π(Ro+Riso)CL);
 * transimpedance: fz = 1/(2π·Rf·Cf), fp = 1/(2π·Rf(Cin+Cf)).
 * @returns degrees
 * @example Ro 200 Ω, Riso 50 Ω, CL 10 nF, GBW 1 MHz: 54.7°
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 8 (from memory).
 */
export function leadLagPhaseMargin(loop: LeadLagLoop): number {
  const crossover = leadLagCrossover(loop);
  return 90 + DEGREES * (Math.atan(crossover / loop.zero) - Math.atan(crossover / loop.pole));
}

/**
 * Isolation resistor that holds a phase margin for any load capacitance whatever: Ro/(m − 1), where
 * PM = 90° − asin[(m−1)/(m+1)], m = 1 + Ro/Riso.
 * @param outputResistance Ω, open loop, above 0
 * @param phaseMargin degrees, above 0 and below 90
 * @returns Ω
 * @example isolationResistance(200, 45) is 41.4 Ω
 * Source: own algebra, the least phase of a lead-lag.
 */
export function isolationResistance(outputResistance: number, phaseMargin: number): number {
  requirePositive('isolationResistance', { outputResistance });
  requireWithin('isolationResistance', { phaseMargin }, { above: 0, below: 90 });
  const dip = Math.sin((90 - phaseMargin) / DEGREES);
  return (outputResistance * (1 - dip)) / (2 * dip);
}

/**
 * DC gain error of an isolation resistor outside the loop: −Riso/(Riso + RL).
 * @param isolation Ω, at least 0
 * @param load Ω, above 0
 * @returns fraction, negative
 * @example isolationGainError(41.42, 1e3) is −0.0398
 * Source: divider.
 */
export function isolationGainError(isolation: number, load: number): number {
  requireNotNegative('isolationGainError', { isolation });
  requirePositive('isolationGainError', { load });
  return -isolation / (isolation + load);
}

/**
 * Feedback capacitor that cancels the input capacitance: Cf = Cin·Rg/Rf.
 * @param inputCapacitance F, above 0
 * @param feedback Rf Ω, above 0
 * @param input Rg Ω, above 0
 * @returns F
 * @example neutralCapacitor(10e-12, 100e3, 100e3) is 10 pF
 * Source: Franco (3rd ed. 2002), ch. 8 (from memory).
 */
export function neutralCapacitor(inputCapacitance: number, feedback: number, input: number): number {
  requirePositive('neutralCapacitor', { inputCapacitance, feedback, input });
  return (inputCapacitance * input) / feedback;
}

function positive(resistance: number): number {
  requirePositive('capacitanceForPhaseMargin', { resistance });
  return resistance;
}
