import { requireFinite, requirePositive } from './domain.js';

/** supply V+; high VOH and low VOL of the output, V; resistors Ω to the supply, to ground and to the output, above 0. */
export interface RelaxationOscillator {
  readonly supply: number;
  readonly high: number;
  readonly low: number;
  readonly toSupply: number;
  readonly toGround: number;
  readonly toOutput: number;
}

export interface Thresholds {
  readonly upper: number;
  readonly lower: number;
}

/**
 * Thresholds: (V+/Ra + {VOH|VOL}/Rc)/(1/Ra + 1/Rb + 1/Rc).
 * @returns V
 * @example three equal resistors on 5 V with a rail-to-rail output: 3.333 V and 1.667 V
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 10 (from memory).
 */
export function oscillatorThresholds(stage: RelaxationOscillator): Thresholds {
  const { supply, high, low, toSupply, toGround, toOutput } = stage;
  requireFinite('oscillatorThresholds', { supply, high, low });
  requirePositive('oscillatorThresholds', { toSupply, toGround, toOutput });
  const conductance = 1 / toSupply + 1 / toGround + 1 / toOutput;
  const at = (level: number): number => (supply / toSupply + level / toOutput) / conductance;
  return { upper: at(high), lower: at(low) };
}

/**
 * Times of one period: t_up = RC·ln[(VOH−VTL)/(VOH−VTH)], t_down = RC·ln[(VTH−VOL)/(VTL−VOL)].
 * @param stage the oscillator
 * @param timeConstant s, R·C, above 0
 * @returns up and down in s, frequency in Hz, duty as a fraction
 * @example VOH 3.5 V, VOL 0.05 V on 5 V, RC = 100 µs: 6513 Hz with a duty of 0.653
 * Source: Franco (3rd ed. 2002), ch. 10 (from memory).
 * @throws RangeError when the output does not reach beyond both thresholds: then it does not oscillate.
 */
export function oscillatorPeriod(stage: RelaxationOscillator, timeConstant: number) {
  const { upper, lower } = oscillatorThresholds(stage);
  requirePositive('oscillatorPeriod', {
    timeConstant,
    'high minus upper threshold': stage.high - upper,
    'lower threshold minus low': lower - stage.low,
    'high minus low': stage.high - stage.low,
  });
  const up = timeConstant * Math.log((stage.high - lower) / (stage.high - upper));
  const down = timeConstant * Math.log((upper - stage.low) / (lower - stage.low));
  return { up, down, frequency: 1 / (up + down), duty: up / (up + down) };
}

/**
 * Largest voltage between the amplifier's inputs: the thresholds' distance, (VOH−VOL)/3 with equal resistors. Just after
 * switching the + input has jumped while the capacitor stands still.
 * @returns V
 * @example equal resistors, VOH 4.9 V, VOL 0.05 V: 1.617 V
 * Source: own algebra.
 */
export function oscillatorDifferentialInput(stage: RelaxationOscillator): number {
  const { upper, lower } = oscillatorThresholds(stage);
  return Math.abs(upper - lower);
}
