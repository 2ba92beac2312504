import { magnitude, phase, type Complex } from '../formulas/complex.js';
import { idealTransfer, statesAt } from './equations.js';
import { least, most } from './extremes.js';
import { limitsOf } from './limits-of.js';
import { walk, type Place, type Walk } from './march.js';
import type { Run, Wave } from './run.js';
import { spectrumOf } from './spectrum.js';

/** A settled period of a sine through the stage. */
export interface SineRun {
  readonly wave: Wave;
  readonly distortion: number;
}

/** Power of two: the spectrum is taken of one period. */
const POINTS = 4096;
/** Periods until the stage repeats itself to this share of its swing. */
const MOST_PERIODS = 150;
const SETTLED = 1e-7;

/** How a sine drives the stage: Hz, its amplitude at the input (V or A, its sign that of the gain), and where the output rests, V. */
export interface Sine {
  readonly frequency: number;
  readonly amplitude: number;
  readonly centre: number;
}

/** The settled period of a sine; null where the stage never repeats itself. */
export function sineRun(run: Run, { frequency, amplitude, centre }: Sine): SineRun | null {
  const { linear, around, amplifier, corner } = run;
  const omega = 2 * Math.PI * frequency;
  const [steady, ideal] = [statesAt(linear, omega), idealTransfer(around, omega)];
  if (steady === null || ideal === null) return null;
  const rest = centre + run.shift;
  const step = 1 / frequency / POINTS;
  const drifting = amplifier.openLoopGain === Infinity ? 0 : linear.leak * around.restored * (corner.supply / 2 - rest);
  const going = walk(linear, {
    source: { omega, weights: [amplitude, 0, 0], start: [0, 1], offset: 0, leaking: drifting },
    limits: limitsOf(run, rest),
    // u = amplitude·sin ωt, the imaginary part of e^jωt.
    states: steady.map(({ im }) => amplitude * im),
    steps: { linear: step, slewing: step, held: step },
  });
  const period = settledPeriod(going, { from: going.start, step, length: 1 / frequency });
  if (period === null) return null;
  const output = period.output.map((value) => value + rest);
  const t = output.map((_, at) => at * step);
  const wave: Wave = { t, ideal: t.map((time) => centre + amplitude * sineOf(ideal, omega * time)), output, clipped: period.clipped, slewing: period.slewing };
  return { wave, distortion: spectrumOf(output).distortion };
}

const sineOf = (transfer: Complex, angle: number): number => magnitude(transfer) * Math.sin(angle + (phase(transfer) * Math.PI) / 180);

interface Period {
  readonly output: readonly number[];
  readonly clipped: number;
  readonly slewing: number;
  readonly end: Place;
}

function settledPeriod(going: Walk, { from, step, length }: { readonly from: Place; readonly step: number; readonly length: number }): Period | null {
  let last = onePeriod(going, from, { step, length });
  for (let count = 1; count < MOST_PERIODS; count += 1) {
    const next = onePeriod(going, last.end, { step, length });
    const swing = most(next.output) - least(next.output);
    const change = next.output.reduce((largest, value, at) => Math.max(largest, Math.abs(value - (last.output[at] ?? 0))), 0);
    if (change <= SETTLED * swing) return next;
    last = next;
  }
  return null;
}

/** Samples on an even grid; the walk itself stops at its events too, and between two of its places the output is drawn straight. */
function onePeriod(going: Walk, from: Place, { step, length }: { readonly step: number; readonly length: number }): Period {
  const begin = Math.round(from.time / length) * length;
  const output: number[] = [];
  const spent = { clipped: 0, slewing: 0 };
  let place = from;
  let value = going.output(place);
  while (output.length < POINTS) {
    const next = going.next(place);
    const ahead = going.output(next);
    const span = next.time - place.time;
    if (place.mode === 'high' || place.mode === 'low') spent.clipped += span;
    if (place.mode === 'up' || place.mode === 'down') spent.slewing += span;
    for (let due = begin + output.length * step; due < next.time - step * EDGE && output.length < POINTS; due = begin + output.length * step) {
      output.push(value + ((due - place.time) / span) * (ahead - value));
    }
    [place, value] = [next, ahead];
  }
  return { output, clipped: Math.min(1, spent.clipped / length), slewing: Math.min(1, spent.slewing / length), end: place };
}

/** Of a step: rounding of times. */
const EDGE = 1e-7;

