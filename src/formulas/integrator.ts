import { requireNotNegative, requirePositive } from './domain.js';

/**
 * Drift of an integrator whose input rests at the reference: Vos/(RC) + Ib/C, magnitudes.
 * @param stage offset V and biasCurrent A, at least 0; resistance Ω and capacitance F, above 0
 * @returns V/s
 * @example integratorDrift({offset: 1e-3, biasCurrent: 0, resistance: 100e3, capacitance: 10e-9}) is 1 V/s
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 1, 5 (from memory).
 */
export function integratorDrift(stage: {
  readonly offset: number;
  readonly biasCurrent: number;
  readonly resistance: number;
  readonly capacitance: number;
}): number {
  const { offset, biasCurrent, resistance, capacitance } = stage;
  requireNotNegative('integratorDrift', { offset, biasCurrent });
  requirePositive('integratorDrift', { resistance, capacitance });
  return offset / (resistance * capacitance) + biasCurrent / capacitance;
}

/**
 * Time until a constant current carries the output across a voltage: C·ΔV/I.
 * @param capacitance F, above 0
 * @param distance V, at least 0
 * @param current A, above 0
 * @returns s
 * @example timeToRail(10e-9, 2.5, 1e-6) is 25 ms
 * Source: I = C·dv/dt.
 */
export function timeToRail(capacitance: number, distance: number, current: number): number {
  requireNotNegative('timeToRail', { distance });
  requirePositive('timeToRail', { capacitance, current });
  return (capacitance * distance) / current;
}

/**
 * Steepest slope of an integrator's output, whatever the waveform: |vi|/(RC), and |vo|/(Rb·C) through a resistor across the capacitor.
 * @param stage largest input and output about the reference, V, at least 0; resistance Ω, bleed Ω (Infinity: none) and capacitance F, above 0
 * @returns V/s
 * @example integratorSlope({input: 1, output: 0, resistance: 100e3, bleed: Infinity, capacitance: 100e-9}) is 100 V/s
 * Source: I = C·dv/dt at the summing node.
 */
export function integratorSlope(stage: {
  readonly input: number;
  readonly output: number;
  readonly resistance: number;
  readonly bleed: number;
  readonly capacitance: number;
}): number {
  const { input, output, resistance, bleed, capacitance } = stage;
  requireNotNegative('integratorSlope', { input, output });
  requirePositive('integratorSlope', { resistance, capacitance });
  return (input / resistance + output / bleed) / capacitance;
}
