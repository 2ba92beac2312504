import { cell } from './cells.js';
import { requirePositive } from './domain.js';
import type { LowPass } from './low-pass-response.js';

/** A stage with its amplifier, and the same with an endless one. */
export interface SlewingStage {
  readonly actual: LowPass;
  readonly ideal: LowPass;
}

/** With the slew rate as a share of the step, 1/s. */
export interface SlewingLoop extends SlewingStage {
  readonly slewRate: number;
}

/** Where the amplifier stands: within its limit, at it upwards, or downwards. */
export type Limit = 0 | 1 | -1;

/** x' = matrix·x row by row, 1/s; the slope the amplifier wants is wanted·x, 1/s; the error of the step stands at `error`. */
export interface SlewingEquations {
  readonly wanted: Float64Array;
  /** At rest before a unit step. */
  readonly start: Float64Array;
  readonly error: number;
  readonly matrix: (limit: Limit) => Float64Array;
}

/**
 * A unit step through a stage about an integrating amplifier, as first-order equations. With P the denominator of the stage and N that
 * of the ideal one, D = (P − N)/s: D·w = u − N·y is the slope w the amplifier wants, and y' is w within its limit. State: what the
 * network of order m lacks to its rest (ξ1..ξm), the error v = 1 − y, and 1:
 * w = (N_m·v − ξ1)/D_m, ξi' = D_(m−i)·w − N_(m−i)·v + ξ(i+1), v' = −w, or ∓ the slew rate.
 * @param loop stages of at most three poles with a constant numerator
 * @returns in the time unit of the loop
 * @example of one pole of 1 µs: v' = −v/1 µs within the limit
 * Source: observer form, any text on linear systems; own algebra.
 * @throws RangeError when the amplifier is endless: then nothing lags.
 */
export function slewingEquations({ actual, ideal, slewRate }: SlewingLoop): SlewingEquations {
  const lags = [actual.a - ideal.a, actual.b - ideal.b, actual.c - ideal.c];
  while (lags.length > 1 && !((lags.at(-1) ?? 0) > 0)) lags.pop();
  const lag = Float64Array.from(lags);
  requirePositive('slewingEquations', { 'lag of the amplifier': cell(lag, 0) });
  const network = Float64Array.of(1, ideal.a, ideal.b);
  const order = lag.length - 1;
  const wanted = wantedSlope(network, lag);
  const start = new Float64Array(order + 2);
  for (let i = 1; i <= order; i += 1) start[i - 1] = cell(network, order - i + 1);
  start.fill(1, order);
  const matrix = (limit: Limit): Float64Array => {
    const size = order + 2;
    const rows = new Float64Array(size * size);
    for (let i = 1; i <= order; i += 1) rows.set(networkRow({ network, lag, wanted }, i), (i - 1) * size);
    if (limit === 0) rows.set(wanted.map((weight) => -weight), order * size);
    else rows[order * size + order + 1] = -limit * slewRate;
    return rows;
  };
  return { matrix, wanted, start, error: order };
}

function wantedSlope(network: Float64Array, lag: Float64Array): Float64Array {
  const order = lag.length - 1;
  const wanted = new Float64Array(order + 2);
  wanted[order] = cell(network, order) / cell(lag, order);
  if (order > 0) wanted[0] = -1 / cell(lag, order);
  return wanted;
}

function networkRow({ network, lag, wanted }: Record<'network' | 'lag' | 'wanted', Float64Array>, i: number): Float64Array {
  const order = lag.length - 1;
  const row = wanted.map((weight) => cell(lag, order - i) * weight);
  row[order] = cell(row, order) - cell(network, order - i);
  if (i < order) row[i] = cell(row, i) + 1;
  return row;
}
