import { requirePositive } from './domain.js';
import { oscillatorThresholds, type RelaxationOscillator } from './oscillator.js';

/** Times of one period with edges, s; frequency Hz, duty: the share from the start of the rising edge to that of the falling one. */
export interface SlewedOscillation {
  readonly up: number;
  readonly down: number;
  readonly frequency: number;
  readonly duty: number;
}

/**
 * One period of a relaxation oscillator whose output goes from level to level at a constant slew rate, exact in that model: during
 * an edge the capacitor follows the moving output, then goes on to the next threshold.
 * @param stage the oscillator
 * @param timeConstant s, R·C, above 0
 * @param slewRate V/s, above 0
 * @returns s and Hz; null when the capacitor turns round before the edge is over: then it does not oscillate between these thresholds
 * @example 5 V rail to rail, equal resistors, RC = 100 µs, 1 V/µs: 6844 Hz, where an ideal output has 7213 Hz
 * Source: own algebra: a ramp through one RC.
 */
export function slewedOscillation(stage: RelaxationOscillator, timeConstant: number, slewRate: number): SlewedOscillation | null {
  requirePositive('slewedOscillation', { timeConstant, slewRate, 'high minus low': stage.high - stage.low });
  const { upper, lower } = oscillatorThresholds(stage);
  if (stage.high <= upper || stage.low >= lower) return null;
  const up = halfPeriod({ from: stage.low, to: stage.high, start: lower, end: upper, timeConstant, slewRate });
  const down = halfPeriod({ from: stage.high, to: stage.low, start: upper, end: lower, timeConstant, slewRate });
  return up === null || down === null ? null : { up, down, frequency: 1 / (up + down), duty: up / (up + down) };
}

interface Half {
  /** Levels of the output, and the thresholds the capacitor goes between, V. */
  readonly from: number;
  readonly to: number;
  readonly start: number;
  readonly end: number;
  readonly timeConstant: number;
  readonly slewRate: number;
}

function halfPeriod({ from, to, start, end, timeConstant, slewRate }: Half): number | null {
  const edge = Math.abs(to - from) / slewRate;
  const slope = (to - from) / edge;
  const lag = slope * timeConstant;
  // C behind R follows a ramp: v = from + slope·t − lag + (start − from + lag)·e^(−t/RC).
  const after = to - lag + (start - from + lag) * Math.exp(-edge / timeConstant);
  const left = (to - after) / (to - end);
  return left <= 1 ? null : edge + timeConstant * Math.log(left);
}
