import { requireFinite, requireNotNegative, requirePositive, requireWithin } from './domain.js';

/** rail V; floor V0 (head-room without current) V, at least 0; onResistance Ω, at least 0; load Ω, above 0, to loadVoltage V. */
export interface ResistiveOutput {
  readonly rail: number;
  readonly floor: number;
  readonly onResistance: number;
  readonly load: number;
  readonly loadVoltage: number;
}

/**
 * Highest output into a load, resistive model: VOH = (V+ − V0 + Ron·Vt/RL)/(1 + Ron/RL).
 * @param stage rail: V+
 * @returns V
 * @example rail 5, floor 0, onResistance 100, load 1e3 to 0 V: 4.545 V
 * Source: own algebra, head-room = V0 + Ron·I.
 */
export function highestOutput(stage: ResistiveOutput): number {
  requireOutput('highestOutput', stage);
  return settled(stage, -stage.floor);
}

/**
 * Lowest output into a load, resistive model: VOL = (V− + V0 + Ron·Vt/RL)/(1 + Ron/RL).
 * @param stage rail: V−
 * @returns V
 * @example rail 0, floor 0, onResistance 100, load 1e3 to 5 V: 0.4545 V
 * Source: as highestOutput().
 */
export function lowestOutput(stage: ResistiveOutput): number {
  requireOutput('lowestOutput', stage);
  return settled(stage, stage.floor);
}

/**
 * Factor on a head-room rated at one supply and used at another: (VS1 − 0.7)/(VS2 − 0.7). An estimate, to be marked as one.
 * @param rated V, supply of the data, above 0.7
 * @param used V, supply of the stage, above 0.7
 * @returns V/V
 * @example headroomScale(5, 1.8) is 3.909
 * Source: on-resistance ~ 1/(VS − Vth) of the triode law at Vth = 0.7 V (common practice).
 */
export function headroomScale(rated: number, used: number): number {
  requireWithin('headroomScale', { rated, used }, { above: 0.7 });
  return (rated - 0.7) / (used - 0.7);
}

/**
 * Peak current of a sine into R parallel C: Vp·√(1/R² + (2π·f·C)²); the two peaks are 90° apart and do not add.
 * @param drive peak V, frequency Hz and capacitance F at least 0; resistance Ω above 0
 * @returns A
 * @example peakLoadCurrent({peak: 2, frequency: 20e3, resistance: 1e3, capacitance: 100e-9}) is 25.2 mA
 * Source: phasor sum.
 */
export function peakLoadCurrent(drive: {
  readonly peak: number;
  readonly frequency: number;
  readonly resistance: number;
  readonly capacitance: number;
}): number {
  const { peak, frequency, resistance, capacitance } = drive;
  requireNotNegative('peakLoadCurrent', { peak, frequency, capacitance });
  requirePositive('peakLoadCurrent', { resistance });
  return peak * Math.hypot(1 / resistance, 2 * Math.PI * frequency * capacitance);
}

function settled({ rail, onResistance, load, loadVoltage }: ResistiveOutput, shift: number): number {
  const share = onResistance / load;
  return (rail + shift + share * loadVoltage) / (1 + share);
}

function requireOutput(where: string, { rail, floor, onResistance, load, loadVoltage }: ResistiveOutput): void {
  requireFinite(where, { rail, loadVoltage });
  requireNotNegative(where, { floor, onResistance });
  requirePositive(where, { load });
}
