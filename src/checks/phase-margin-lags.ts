import { inputLagOf, onlyLags, type InputLag } from './phase-margin-factors.js';
import { slope } from './phase-margin-load.js';
import type { Loop } from './phase-margin-loop.js';

const DEGREES = 180 / Math.PI;

/**
 * A loop in which nothing leads, in numbers. A network of resistors with one capacitance at its pin is a share and one pole, whatever its shape
 * (Thévenin); the load is another, the part's own a third.
 */
export interface Lags {
  /** Of the output at the − input, at DC. */
  readonly share: number;
  /** Seconds: times a frequency in Hz each is the tangent of what it turns the phase by there. */
  readonly input: number;
  readonly load: number;
  readonly own: number;
}

/** Null: something leads, or may. */
export function lagsOf(loop: Loop): Lags | null {
  if (!onlyLags(loop)) return null;
  const { share, time }: InputLag = inputLagOf(loop);
  return { share, input: time, load: loop.load === null ? 0 : slope(loop.load, loop.load.outputResistance), own: 1 / loop.ownPole };
}

/** Margin if the crossover were at this frequency (Hz), degrees. */
export function marginThere({ input, load, own }: Lags, frequency: number): number {
  return 90 - (Math.atan(input * frequency) + Math.atan(load * frequency) + Math.atan(own * frequency)) * DEGREES;
}

/** Hz, not below the crossover: of a share alone there is no more. */
export const highestCrossover = ({ share }: Lags, gainBandwidth: number): number => gainBandwidth * share * (1 + ROUNDED);

/** Hz, not above the crossover: |T| falls by a decade or more in every decade, so that it is 1 no further below that place than it is below 1 there. */
export function lowestCrossover({ share, input, load, own }: Lags, gainBandwidth: number): number {
  const high = gainBandwidth * share;
  return high * (1 - ROUNDED) / Math.sqrt((1 + (input * high) ** 2) * (1 + (load * high) ** 2) * (1 + (own * high) ** 2));
}

/** Above what rounding of a frequency can be. */
const ROUNDED = 1e-9;
