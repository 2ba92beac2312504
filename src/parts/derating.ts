import type { Parameter } from './figures.js';

/**
 * What a figure with no limit is multiplied by on the pessimistic reading. Common practice, from memory; one table, printed
 * wherever a factor is used. Head-rooms are not factors: half their magnitude is added.
 */
export const TYPICAL_FACTOR: Partial<Record<Parameter, number>> = {
  slewRate: 0.6,
  gainBandwidth: 0.6,
  offsetVoltage: 3,
  offsetDrift: 3,
  biasCurrent: 4,
  offsetCurrent: 4,
  quiescentCurrent: 1.4,
  voltageNoise: 1.25,
  currentNoise: 1.25,
  commonModeRejection: 1 / 3.16,
  supplyRejection: 1 / 3.16,
  openLoopGain: 1 / 3.16,
  // They go with the speed of the part, and are derated as that is.
  supplyRejectionCorner: 0.6,
  overloadRecovery: 1 / 0.6,
  startUpTime: 1 / 0.6,
};

/** Typical head-rooms lose half their magnitude, whichever side of the rail they stand on. */
export function derateHeadroom(typical: number): number {
  return typical + Math.abs(typical) / 2;
}

/** A figure rated at 25 °C used more than this far away is an estimate. */
export const TEMPERATURE_REACH = 15;

/** What a 25 °C figure is multiplied by away from 25 °C, pessimistic reading (common practice, from memory). */
export const COLD_HOT_FACTOR: Partial<Record<Parameter, number>> = {
  slewRate: 0.8,
  gainBandwidth: 0.8,
  quiescentCurrent: 1.3,
};

/** Output head-room grows by this per kelvin of the largest distance from 25 °C (common practice, from memory). */
export const HEADROOM_PER_KELVIN = 0.005;

/** FET input currents double per this many kelvin (Jung (ed.), Op Amp Applications Handbook, 2005, from memory). */
export const DOUBLING_KELVIN = 10;

/** Bias current below which an input of unknown type is treated as a FET, A. */
export const FET_BIAS_LIMIT = 1e-9;

/** Bounds of the supply ratio within which a figure rated at another supply still counts as rated. */
export const SUPPLY_REACH = 2;
