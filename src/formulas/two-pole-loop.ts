import { requirePositive, requireWithin } from './domain.js';

const DEGREES = 180 / Math.PI;

/**
 * True crossover of an integrating loop with a second pole: fx² = (f2²/2)(√(1 + 4fc²/f2²) − 1).
 * @param asymptote Hz, fc = GBW/NG, above 0
 * @param secondPole Hz, f2, above 0
 * @returns Hz
 * @example twoPoleCrossover(1e6, 2e6) is 910.2 kHz
 * Source: own algebra, |T| = 1 solved exactly.
 */
export function twoPoleCrossover(asymptote: number, secondPole: number): number {
  requirePositive('twoPoleCrossover', { asymptote, secondPole });
  const x = (2 * asymptote) / secondPole;
  // √(1+x²) − 1 without its cancellation for a far second pole.
  return secondPole * Math.sqrt((x * x) / (Math.sqrt(1 + x * x) + 1) / 2);
}

/**
 * Phase margin of that loop at the true crossover: 90° − atan(fx/f2). Read at fc instead it would be 2..10° short.
 * @param asymptote Hz, fc = GBW/NG, above 0
 * @param secondPole Hz, f2, above 0
 * @returns degrees
 * @example twoPolePhaseMargin(1e6, 2e6) is 65.53°
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 8 (from memory); exact form own algebra.
 */
export function twoPolePhaseMargin(asymptote: number, secondPole: number): number {
  return 90 - DEGREES * Math.atan(twoPoleCrossover(asymptote, secondPole) / secondPole);
}

/**
 * Second pole that leaves a phase margin: f2 = fc·sin²PM/cos PM.
 * @param asymptote Hz, fc = GBW/NG, above 0
 * @param phaseMargin degrees, above 0 and below 90
 * @returns Hz
 * @example secondPoleForPhaseMargin(1e6, 45) is 707.1 kHz
 * Source: own algebra, the inverse of twoPolePhaseMargin().
 */
export function secondPoleForPhaseMargin(asymptote: number, phaseMargin: number): number {
  requirePositive('secondPoleForPhaseMargin', { asymptote });
  requireWithin('secondPoleForPhaseMargin', { phaseMargin }, { above: 0, below: 90 });
  const angle = phaseMargin / DEGREES;
  return (asymptote * Math.sin(angle) ** 2) / Math.cos(angle);
}

/**
 * Q of the closed loop: √(fc/f2). Its natural frequency is √(fc·f2).
 * @param asymptote Hz, fc = GBW/NG, above 0
 * @param secondPole Hz, f2, above 0
 * @returns Q
 * @example twoPoleQ(1e6, 1e6) is 1
 * Source: own algebra.
 */
export function twoPoleQ(asymptote: number, secondPole: number): number {
  requirePositive('twoPoleQ', { asymptote, secondPole });
  return Math.sqrt(asymptote / secondPole);
}

/**
 * Q of the closed loop from its true phase margin: √(cos PM)/sin PM.
 * @param phaseMargin degrees, above 0 and below 90
 * @returns Q
 * @example qOfPhaseMargin(45) is 1.189 (23.3 % overshoot)
 * Source: own algebra.
 */
export function qOfPhaseMargin(phaseMargin: number): number {
  requireWithin('qOfPhaseMargin', { phaseMargin }, { above: 0, below: 90 });
  const angle = phaseMargin / DEGREES;
  return Math.sqrt(Math.cos(angle)) / Math.sin(angle);
}
