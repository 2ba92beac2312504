import { requirePositive, requireWithin } from './domain.js';

/**
 * −3 dB bandwidth of n equal one-pole stages in a row, as a fraction of one stage's: √(2^(1/n) − 1).
 * @param stages whole number, at least 1
 * @returns 0..1
 * @example cascadeShrinkage(3) is 0.5098
 * Source: Sedra & Smith, Microelectronic Circuits (from memory).
 * @throws RangeError unless `stages` is a whole number of at least 1.
 */
export function cascadeShrinkage(stages: number): number {
  requireWithin('cascadeShrinkage', { stages }, { from: 1 });
  if (!Number.isInteger(stages)) throw new RangeError(`cascadeShrinkage: stages must be a whole number, but is ${stages}`);
  return Math.sqrt(2 ** (1 / stages) - 1);
}

/**
 * Gain-bandwidth per amplifier when n equal non-inverting stages share a gain: GBW = G^(1/n)·f/√(2^(1/n) − 1).
 * @param gain V/V of the whole chain, at least 1
 * @param frequency Hz, −3 dB of the whole chain, above 0
 * @param stages whole number, at least 1
 * @returns Hz
 * @example gainBandwidthPerStage(1000, 20e3, 2) is 983 kHz, where one stage needs 20 MHz
 * Source: Sedra & Smith, Microelectronic Circuits (from memory).
 */
export function gainBandwidthPerStage(gain: number, frequency: number, stages: number): number {
  requireWithin('gainBandwidthPerStage', { gain }, { from: 1 });
  requirePositive('gainBandwidthPerStage', { frequency });
  return (gain ** (1 / stages) * frequency) / cascadeShrinkage(stages);
}
