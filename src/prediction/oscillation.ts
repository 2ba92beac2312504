import { oscillatorPeriod, oscillatorThresholds } from '../formulas/oscillator.js';
import type { OscillatorResponse } from '../stage/response.js';
import { SUPPLY } from './circuit.js';
import { zeros } from './dense.js';
import { walk, type Limits, type Place, type Walk } from './march.js';
import type { Run, Wave } from './run.js';
import { resampled } from './step.js';

/** A settled period of an oscillator. */
export interface Oscillation {
  readonly wave: Wave;
  /** Hz. */
  readonly frequency: number;
  /** Share of the period the output is above the middle of its levels. */
  readonly duty: number;
  /** 10 % to 90 % of the levels, s. */
  readonly rise: number;
  readonly fall: number;
}

const POINTS = 1024;
const MOST_PERIODS = 12;
const PER_PERIOD = 2000;
const PER_EDGE = 200;
/** Steps of the linear mode, in units of 1/(2π·GBW): there the loop runs away, and nothing may overflow. */
const RUNAWAY = 50;
const SAME = 1e-6;

/** Runs until two periods are alike; null when it does not oscillate. */
export function oscillation(run: Run, { low, high, response }: { readonly low: number; readonly high: number; readonly response: OscillatorResponse }): Oscillation | null {
  const { linear, around, amplifier, corner, slew } = run;
  const speed = 2 * Math.PI * (amplifier.gainBandwidth ?? 0) * around.restored;
  const leaking = amplifier.openLoopGain === Infinity ? 0 : (linear.leak * around.restored * corner.supply) / 2;
  const expected = 1 / response.frequency;
  const step = expected / PER_PERIOD;
  const edge = (high - low) / slew.up / PER_EDGE;
  const limits: Limits = { up: slew.up * around.restored, down: slew.down * around.restored, high, low };
  const states = zeros(linear.order).map((_, at) => (at >= linear.integrator ? high * around.restored : startOf(response, { low, high, supply: corner.supply })));
  const going = walk(linear, {
    source: { omega: 0, weights: [0, 0, corner.supply / (around.signal.held[SUPPLY] ?? 1)], start: [0, 0], offset: speed * amplifier.offset, leaking },
    limits,
    states,
    steps: { linear: Math.min(step, edge, RUNAWAY / speed), slewing: Math.min(step, edge), held: step },
  });
  return settled(going, { low, high, most: MOST_PERIODS * expected * 4, response, supply: corner.supply });
}

/** Every capacitor at the lower threshold. */
const startOf = ({ toSupply, toGround, toOutput }: OscillatorResponse, levels: { readonly low: number; readonly high: number; readonly supply: number }): number =>
  oscillatorThresholds({ ...levels, toSupply, toGround, toOutput }).lower;

interface Ends {
  readonly low: number;
  readonly high: number;
  readonly response: OscillatorResponse;
  readonly supply: number;
}

interface Trace {
  readonly times: number[];
  readonly output: number[];
  readonly modes: Place['mode'][];
}

/** Upward crossings of the middle tell the period; three of them, and the last two periods alike. */
function settled(going: Walk, { most, ...of }: Ends & { readonly most: number }): Oscillation | null {
  const middle = (of.low + of.high) / 2;
  const record: Trace = { times: [0], output: [going.output(going.start)], modes: [going.start.mode] };
  const rises: number[] = [];
  let place = going.start;
  while (place.time < most) {
    place = going.next(place);
    const [before, value] = [record.output.at(-1) ?? 0, going.output(place)];
    if (before < middle && value >= middle) rises.push(record.output.length);
    record.times.push(place.time);
    record.output.push(value);
    record.modes.push(place.mode);
    const [a, b, c] = rises.slice(-3).map((at) => crossing(record, at, middle));
    if (a === undefined || b === undefined || c === undefined || place.time < c + 0.5 * (c - b)) continue;
    if (Math.abs((c - b) / (b - a) - 1) < SAME) return measured(record, { from: b, to: c, ...of });
  }
  return null;
}

function crossing({ times, output }: Trace, at: number, level: number): number {
  const [a, b] = [output[at - 1] ?? 0, output[at] ?? 0];
  const [from, to] = [times[at - 1] ?? 0, times[at] ?? 0];
  return from + ((level - a) / (b - a)) * (to - from);
}

function measured(record: Trace, { from, to, low, high, response, supply }: Ends & { readonly from: number; readonly to: number }): Oscillation | null {
  const { times, output, modes } = record;
  const level = (share: number): number => low + share * (high - low);
  const first = (share: number, upwards: boolean, after: number): number | null => {
    for (let at = 1; at < output.length; at += 1) {
      const [a, b] = [output[at - 1] ?? 0, output[at] ?? 0];
      if (!(upwards ? a < level(share) && b >= level(share) : a > level(share) && b <= level(share))) continue;
      const time = crossing(record, at, level(share));
      if (time >= after) return time;
    }
    return null;
  };
  const down = first(0.5, false, from);
  const [fallStart, fallEnd] = [first(0.9, false, from), first(0.1, false, from)];
  const riseStart = fallEnd === null ? null : first(0.1, true, fallEnd);
  const riseEnd = riseStart === null ? null : first(0.9, true, riseStart);
  if (down === null || fallStart === null || fallEnd === null || riseStart === null || riseEnd === null) return null;
  const period = to - from;
  const t = Array.from({ length: POINTS + 1 }, (_, at) => (at * period) / POINTS);
  const spent = (kinds: readonly string[]): number => modes.reduce((sum, mode, at) => (kinds.includes(mode) ? sum + Math.max(0, Math.min(to, times[at + 1] ?? to) - Math.max(from, times[at] ?? 0)) : sum), 0) / period;
  return {
    wave: { t, ideal: squareWave(response, supply, t), output: resampled(times, output, t.map((time) => from + time)), clipped: spent(['high', 'low']), slewing: spent(['up', 'down']) },
    frequency: 1 / period,
    duty: (down - from) / period,
    rise: riseEnd - riseStart,
    fall: fallEnd - fallStart,
  };
}

/** What an endless amplifier with an output from rail to rail would do, from its rise on. */
function squareWave({ toSupply, toGround, toOutput, timeConstant }: OscillatorResponse, supply: number, t: readonly number[]): number[] {
  const { up, down } = oscillatorPeriod({ supply, high: supply, low: 0, toSupply, toGround, toOutput }, timeConstant);
  return t.map((time) => (time % (up + down) < up ? supply : 0));
}
