import { dot, solveReal, zeros } from './dense.js';
import { statesAtRest } from './equations.js';
import { limitsOf } from './limits-of.js';
import { least, most } from './extremes.js';
import { walk, type Place, type Walk } from './march.js';
import type { Run, Wave } from './run.js';

/** One step of the signal from rest to rest. */
export interface StepRun {
  readonly wave: Wave;
  /** 10 % to 90 %, s; null: it does not get there. */
  readonly edge: number | null;
  /** Until it stays within the tolerance of where it comes to rest, s; null: it does not. */
  readonly settling: number | null;
  /** V, the extremes on the way. */
  readonly low: number;
  readonly high: number;
}

/** From one level of the ideal output to the other, V; the gain of the stage at rest (V/V or V/A); settled within this share of the step. */
export interface Step {
  readonly from: number;
  readonly to: number;
  readonly gain: number;
  readonly tolerance: number;
  /** Pace of the loop, s: its time constant, or that of its fastest ringing. */
  readonly pace: number;
}

const PER_PACE = 60;
const MOST_PLACES = 20_000;
/** After as many times twice the time it is taken never to settle. */
const DOUBLINGS = 24;
/** An overshoot may hold the output for a while. */
const LEAST_DOUBLINGS = 3;
/** Nor after as many places: a loop that goes on between its limits has the more of them the longer one looks. */
const MOST_KEPT = 30 * MOST_PLACES;

/** A step that begins and ends at rest; null for a stage that does not rest at a steady signal. */
export function stepRun(run: Run, step: Step): StepRun | null {
  const { linear, around, amplifier, corner, slew } = run;
  const rest = statesAtRest(linear);
  if (rest === null) return null;
  const centre = (step.from + step.to) / 2 + run.shift;
  const half = (step.to - step.from) / 2 / step.gain;
  const drifting = amplifier.openLoopGain === Infinity ? 0 : linear.leak * around.restored * (corner.supply / 2 - centre);
  const size = Math.abs(step.to - step.from);
  const expected = 12 * step.pace + size / Math.min(slew.up, slew.down);
  const pace = Math.max(step.pace / PER_PACE, expected / MOST_PLACES);
  const leaked = leakedStates(linear, drifting);
  const offset = rest.map((state, at) => (leaked[at] ?? 0) - half * state);
  const limits = limitsOf(run, centre);
  const source = { omega: 0, weights: [0, 0, half], start: [0, 0], offset: 0, leaking: drifting } as const;
  const going = (size: number): Walk => walk(linear, { source, limits, states: offset, steps: { linear: size, slewing: size, held: size } });
  const gained = 2 * half * (dot(linear.output.states, rest) + linear.output.signal);
  const final = gained / 2 + dot(linear.output.states, leaked);
  const limit = settledWalk(going, { final, band: step.tolerance * size, expected, pace });
  return measured(limit, { step, centre, final, gained });
}

/** Where the states rest with what the finite gain leaks alone. */
function leakedStates({ rates, integrator, order }: Run['linear'], leaking: number): readonly number[] {
  return solveReal(rates, zeros(order).map((_, at) => (at === integrator ? -leaking : 0))) ?? zeros(order);
}

interface Walked {
  readonly places: readonly Place[];
  readonly output: readonly number[];
  /** s; null: never. */
  readonly settling: number | null;
}

/** With every doubling of the time the steps double too: what is slow needs no fine ones, and between events they are exact. */
function settledWalk(walkIn: (size: number) => Walk, { final, band, expected, pace }: { readonly final: number; readonly band: number; readonly expected: number; readonly pace: number }): Walked {
  let going = walkIn(pace);
  const places = [going.start];
  const output = [going.output(going.start)];
  let last = 0;
  for (let doubling = 0; doubling < DOUBLINGS; doubling += 1) {
    const end = expected * 2 ** doubling;
    let place = places.at(-1) ?? going.start;
    while (place.time < end) {
      place = going.next(place);
      const value = going.output(place);
      output.push(value);
      places.push(place);
      if (Math.abs(value - final) > band) last = places.length - 1;
    }
    if ((places[last]?.time ?? 0) < 0.7 * end) return { places, output, settling: crossed({ places, output }, { after: last, final, band }) };
    if (doubling >= LEAST_DOUBLINGS && isStuck(places, last) || places.length > MOST_KEPT) break;
    going = walkIn(pace * 2 ** (doubling + 1));
  }
  return { places, output, settling: null };
}

/** At one of its ends all through the last doubling of the time: it will never be within. What overshoots into an end lets go of it again. */
function isStuck(places: readonly Place[], last: number): boolean {
  const half = (places.at(-1)?.time ?? 0) / 2;
  return last === places.length - 1 && places.every(({ mode, time }) => time < half || mode === 'high' || mode === 'low');
}

/** Where the straight line between the last place outside and the next one enters the band. */
function crossed({ places, output }: Pick<Walked, 'places' | 'output'>, { after, final, band }: { readonly after: number; readonly final: number; readonly band: number }): number {
  const [a, b] = [output[after] ?? 0, output[after + 1] ?? 0];
  const edge = final + Math.sign(a - final) * band;
  const [from, to] = [places[after]?.time ?? 0, places[after + 1]?.time ?? 0];
  return from + ((edge - a) / (b - a)) * (to - from);
}

/** Points of the printed wave. */
const POINTS = 1024;

function measured({ places, output, settling }: Walked, of: { readonly step: Step; readonly centre: number; readonly final: number; readonly gained: number }): StepRun {
  const { step, centre, final, gained } = of;
  const times = places.map(({ time }) => time);
  const reached = (share: number): number | null => firstReach(times, output, { level: final + (share - 1) * gained, upwards: gained > 0 });
  const [start, end] = [reached(0.1), reached(0.9)];
  const length = settling === null ? (times.at(-1) ?? 0) : Math.max(1.5 * settling, 4 * step.pace);
  const t = Array.from({ length: POINTS }, (_, at) => (at * length) / (POINTS - 1));
  const spent = (modes: readonly string[]): number => places.reduce((sum, { mode, time }, at) => (modes.includes(mode) ? sum + Math.max(0, Math.min(times[at + 1] ?? time, length) - time) : sum), 0) / length;
  return {
    wave: { t, ideal: t.map((time) => (time === 0 ? step.from : step.to)), output: resampled(times, output, t).map((value) => value + centre), clipped: spent(['high', 'low']), slewing: spent(['up', 'down']) },
    edge: start === null || end === null ? null : end - start,
    settling,
    low: least(output) + centre,
    high: most(output) + centre,
  };
}

function firstReach(times: readonly number[], output: readonly number[], { level, upwards }: { readonly level: number; readonly upwards: boolean }): number | null {
  const at = output.findIndex((value) => (upwards ? value >= level : value <= level));
  if (at < 1) return at === 0 ? 0 : null;
  const [a, b] = [output[at - 1] ?? 0, output[at] ?? 0];
  const [from, to] = [times[at - 1] ?? 0, times[at] ?? 0];
  return from + ((level - a) / (b - a)) * (to - from);
}

/** Values of a curve on an even grid, straight between its points; its last value beyond. */
export function resampled(times: readonly number[], values: readonly number[], grid: readonly number[]): number[] {
  let above = 1;
  return grid.map((time) => {
    while (above < times.length - 1 && (times[above] ?? 0) < time) above += 1;
    const [from, to] = [times[above - 1] ?? 0, times[above] ?? 0];
    const [a, b] = [values[above - 1] ?? 0, values[above] ?? 0];
    return to > from ? a + Math.min(1, (time - from) / (to - from)) * (b - a) : b;
  });
}
