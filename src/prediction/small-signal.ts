import { magnitude, phase, type Complex } from '../formulas/complex.js';
import { turningPoint } from '../formulas/bisection.js';
import { statesAt, statesAtRest, valueOf, type LinearStage } from './equations.js';
import { dot } from './dense.js';
import { exponentials, stepped } from '../formulas/matrix-exponential.js';

/** Signal to output, V/V or V/A, at a frequency in Hz; null where a pole stands exactly there. */
export function transferAt(stage: LinearStage, frequency: number): Complex | null {
  const states = statesAt(stage, 2 * Math.PI * frequency);
  return states === null ? null : valueOf(stage.output, states);
}

/** Gain at rest, signed; null for what adds up for ever. */
export function gainAtRest(stage: LinearStage): number | null {
  const states = statesAtRest(stage);
  return states === null ? null : dot(stage.output.states, states) + stage.output.signal;
}

/** Magnitudes over frequency, on a grid of equal ratios. */
export interface Response {
  readonly f: readonly number[];
  readonly magnitude: readonly number[];
  /** Degrees, unwrapped from the first point on. */
  readonly phase: readonly number[];
}

export function responseOver(stage: LinearStage, f: readonly number[]): Response {
  const values = f.map((frequency) => transferAt(stage, frequency) ?? { re: NaN, im: NaN });
  const angles: number[] = [];
  for (const value of values.map(phase)) {
    const last = angles.at(-1) ?? value;
    angles.push(value - 360 * Math.round((value - last) / 360));
  }
  return { f, magnitude: values.map(magnitude), phase: angles };
}

/** `points` frequencies of equal ratios between two ends, Hz. */
export const gridOf = (from: number, to: number, points: number): number[] => Array.from({ length: points }, (_, at) => from * (to / from) ** (at / (points - 1)));

/** −3 dB frequency and how far the gain rises above the one at rest (ratio, at least 1). */
export interface Band {
  readonly bandwidth: number;
  readonly peaking: number;
  /** Where it is highest, Hz; null: nowhere above the gain at rest. */
  readonly peakAt: number | null;
}

const SCAN = 600;

/** Looked for from far below the loop's own frequency to far above it; null when the gain never falls by 3 dB there. */
export function bandOf(stage: LinearStage, about: number): Band | null {
  const known = BANDS.get(stage) ?? new Map<number, Band | null>();
  BANDS.set(stage, known);
  const before = known.get(about);
  if (before !== undefined) return before;
  const found = bandFound(stage, about);
  known.set(about, found);
  return found;
}

/** Of each stage by where it was looked for: the small signal and the step both ask. */
const BANDS = new WeakMap<LinearStage, Map<number, Band | null>>();

function bandFound(stage: LinearStage, about: number): Band | null {
  const rest = gainAtRest(stage);
  if (rest === null || rest === 0) return null;
  const size = (frequency: number): number => magnitude(transferAt(stage, frequency) ?? { re: NaN, im: NaN }) / Math.abs(rest);
  const grid = gridOf(about * 1e-6, about * 1e3, SCAN);
  const sizes = grid.map(size);
  const below = sizes.findIndex((value) => value < Math.SQRT1_2);
  const [low, high] = [grid[below - 1], grid[below]];
  if (low === undefined || high === undefined) return null;
  const bandwidth = turningPoint((frequency) => size(frequency) < Math.SQRT1_2, { low, high });
  const top = sizes.indexOf(Math.max(...sizes));
  if (top < 1 || (sizes[top] ?? 0) <= 1 + 1e-9) return { bandwidth, peaking: 1, peakAt: null };
  const peakAt = highest(size, [grid[top - 1] ?? about, grid[top + 1] ?? about]);
  return { bandwidth, peaking: Math.max(1, size(peakAt)), peakAt };
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Golden-section search for the one maximum in between (Kiefer, Proc. Amer. Math. Soc. 4, 1953, from memory). */
function highest(size: (frequency: number) => number, [from, to]: readonly [number, number]): number {
  let [low, high] = [Math.log(from), Math.log(to)];
  for (let round = 0; round < 60; round += 1) {
    const [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
    if (size(Math.exp(left)) > size(Math.exp(right))) high = right;
    else low = left;
  }
  return Math.exp((low + high) / 2);
}

const DOUBLINGS = 70;

/** Whether what is left of any state dies away, or at least stays: e^(matrix·t) for ever longer t. An integrator stays. */
export function isStable({ rates, order }: LinearStage): boolean {
  const flat = Float64Array.from(rates.flat());
  const size = Math.max(...rates.map((row) => row.reduce((sum, value) => sum + Math.abs(value), 0)));
  let increment = exponentials(flat, 1 / size)[0] ?? flat;
  for (let doubling = 0; doubling < DOUBLINGS; doubling += 1) {
    const columns = Array.from({ length: order }, (_, column) => stepped(increment, Float64Array.from({ length: order }, (_zero, row) => (row === column ? 1 : 0))));
    const twice = columns.map((column) => stepped(increment, column));
    const grown = Math.max(...twice.flatMap((column) => [...column].map(Math.abs)));
    if (!(grown < GROWN)) return false;
    if (grown < GONE) return true;
    increment = Float64Array.from({ length: order * order }, (_, at) => (twice[at % order]?.[Math.floor(at / order)] ?? 0) - (Math.floor(at / order) === at % order ? 1 : 0));
  }
  return true;
}

const GROWN = 1e9;
const GONE = 1e-9;
