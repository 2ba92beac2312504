import type { Topology } from '../../src/spec/spec.js';
import { drawing, type Driven, type Parts } from './drawings.js';
import { amplifierLines, generator, loadLines, type LiveAmplifier, type LiveLoad } from './live-amplifier.js';
import { magnitude, type Complex } from './nodal.js';
import { period, spice, type Analysis } from './spice.js';

/** A stage on the bench: what is drawn, what drives it, what amplifies, what it drives. */
export interface LiveStage {
  readonly topology: Topology;
  readonly parts: Parts;
  readonly driven: Driven;
  readonly amplifier: LiveAmplifier;
  readonly load?: LiveLoad;
}

/** One run of one analysis of one stage. `injected` is the source text that opens the loop. */
export function run(stage: LiveStage, analysis: string, options: { readonly injected?: string; readonly more?: readonly string[] } = {}): Promise<Analysis> {
  const drawn = drawing(stage.topology, stage.parts, stage.driven);
  const lines = [
    ...drawn.lines,
    ...amplifierLines(drawn, stage.amplifier, options.injected ?? ''),
    ...loadLines(stage.load ?? {}),
    ...(options.more ?? []),
  ];
  return spice(['* a stage', ...lines, analysis, '.end', ''].join('\n'));
}

export interface Curve {
  readonly frequencies: readonly number[];
  readonly values: readonly Complex[];
}

/** Small-signal response at a node. */
export async function response(stage: LiveStage, [from, to]: readonly [number, number], perDecade = 400): Promise<Curve> {
  const result = await run(stage, `.ac dec ${perDecade} ${from} ${to}`);
  return { frequencies: result.real('frequency'), values: result.complex('v(out)') };
}

/** Small-signal value at one frequency. */
export async function responseAt(stage: LiveStage, frequency: number): Promise<Complex> {
  const result = await run(stage, `.ac lin 1 ${frequency} ${frequency}`);
  return result.complex('v(out)')[0]!;
}

/** −3 dB against the first point of the curve, where the last such crossing lies; straight lines in the logarithms. */
export function halfPower({ frequencies, values }: Curve): number {
  const level = magnitude(values[0]!) * Math.SQRT1_2;
  const above = values.findIndex((value) => magnitude(value) < level);
  if (above < 1) throw new RangeError('no −3 dB on this curve');
  const [a, b] = [values[above - 1]!, values[above]!].map((value) => Math.log(magnitude(value))) as [number, number];
  const share = (a - Math.log(level)) / (a - b);
  return frequencies[above - 1]! * (frequencies[above]! / frequencies[above - 1]!) ** share;
}

/** Largest magnitude over the first point of the curve, a parabola through the three points about it. */
export function peaking({ values }: Curve): number {
  const sizes = values.map(magnitude);
  const top = sizes.indexOf(Math.max(...sizes));
  if (top === 0 || top === sizes.length - 1) return sizes[top]! / sizes[0]!;
  const [a, b, c] = [sizes[top - 1]!, sizes[top]!, sizes[top + 1]!];
  return (b + (a - c) ** 2 / (8 * (2 * b - a - c))) / sizes[0]!;
}

/** True crossover (Hz) and phase margin (degrees) of the loop opened at the amplifier's own output; the highest crossing counts. */
export async function openedLoop(stage: LiveStage, [from, to]: readonly [number, number]): Promise<{ readonly crossover: number; readonly margin: number }> {
  const result = await run(stage, `.ac dec 1000 ${from} ${to}`, { injected: 'ac 1' });
  const frequencies = result.real('frequency');
  const [before, behind] = [result.complex('v(before)'), result.complex('v(behind)')];
  const gains = before.map((value, k) => over([-value[0], -value[1]], behind[k]!));
  const last = gains.reduce((found, value, k) => (magnitude(value) >= 1 ? k : found), -1);
  if (last < 0 || last === gains.length - 1) throw new RangeError('no crossover in this range');
  const [a, b] = [gains[last]!, gains[last + 1]!];
  const share = Math.log(magnitude(a)) / Math.log(magnitude(a) / magnitude(b));
  const crossover = frequencies[last]! * (frequencies[last + 1]! / frequencies[last]!) ** share;
  const phases = [degrees(a), degrees(b)] as const;
  const turn = Math.abs(phases[1] - phases[0]) > 180 ? 360 * Math.sign(phases[0] - phases[1]) : 0;
  const margin = 180 + phases[0] + share * (phases[1] + turn - phases[0]);
  return { crossover, margin: margin > 180 ? margin - 360 : margin };
}

/** Output noise density, V/√Hz. `temperature` in °C. */
export async function noiseDensity(stage: LiveStage, [from, to]: readonly [number, number], temperature: number): Promise<{ readonly frequencies: readonly number[]; readonly density: readonly number[] }> {
  const result = await run(stage, `.noise v(out) vidle dec 200 ${from} ${to}`, { more: noiseRun(temperature) });
  return { frequencies: result.real('frequency'), density: result.real('onoise_spectrum') };
}

/** White level of one noise generator at a temperature (°C), A/√Hz. */
export async function generatorLevel(temperature: number): Promise<number> {
  const lines = ['* generator', ...generator('v'), 'h1 out 0 vxv 1', ...noiseRun(temperature), '.noise v(out) vidle lin 1 1e3 1e3', '.end', ''];
  return (await spice(lines.join('\n'))).real('onoise_spectrum')[0]!;
}

/** Integrated over the frequency: a power of the frequency between each two points, and 1/f² in power beyond the last. */
export function integrated(frequencies: readonly number[], density: readonly number[], weight: (frequency: number) => number = () => 1): number {
  const powers = density.map((value, k) => value ** 2 * weight(frequencies[k]!));
  let sum = powers.at(-1)! * frequencies.at(-1)!;
  for (let k = 1; k < powers.length; k += 1) {
    const [f0, f1, p0, p1] = [frequencies[k - 1]!, frequencies[k]!, powers[k - 1]!, powers[k]!];
    const order = Math.log(p1 / p0) / Math.log(f1 / f0) + 1;
    sum += Math.abs(order) < 1e-6 ? p0 * f0 * Math.log(f1 / f0) : (f1 * p1 - f0 * p0) / order;
  }
  return Math.sqrt(sum);
}

/** The simulator wants a source that an equivalent input noise can be told for; it drives nothing here. */
const noiseRun = (temperature: number): string[] => [`.options temp=${temperature} tnom=${temperature}`, 'vidle idle 0 dc 0 ac 1', 'ridle idle 0 1e3 noisy=0'];

const degrees = ([re, im]: Complex): number => (Math.atan2(im, re) * 180) / Math.PI;

function over([a, b]: Complex, [c, d]: Complex): Complex {
  const square = c * c + d * d;
  return [(a * c + b * d) / square, (b * c - a * d) / square];
}

/** One settled period at the output on an even grid, everything starting empty; `periods` is how many go before it. */
export async function settledPeriod(stage: LiveStage, { frequency, points, periods }: { frequency: number; points: number; periods: number }): Promise<number[]> {
  const length = 1 / frequency;
  const analysis = `.tran ${length / points} ${(periods + 1.01) * length} ${(periods - 0.01) * length} ${length / points} uic`;
  const result = await run(stage, analysis, { more: ['.options reltol=1e-6 abstol=1e-15 vntol=1e-9'] });
  return period(result.real('time'), result.real('v(out)'), [periods * length, length, points]);
}

/** Output over time from 0 on, everything at the operating point of the sources' first value. `steps` bounds the time step. */
export async function transient(stage: LiveStage, duration: number, steps: number): Promise<{ readonly times: readonly number[]; readonly output: readonly number[] }> {
  const step = duration / steps;
  const result = await run(stage, `.tran ${step} ${duration} 0 ${step}`, { more: ['.options reltol=1e-6 abstol=1e-15 vntol=1e-9'] });
  return { times: result.real('time'), output: result.real('v(out)') };
}

/** When a curve enters a band about its final value for good, straight between its points; from the time `since` on. */
export function settlesAt({ times, output }: { readonly times: readonly number[]; readonly output: readonly number[] }, final: number, band: number): number {
  const outside = output.reduce((last, value, k) => (Math.abs(value - final) > band ? k : last), -1);
  if (outside < 0 || outside === output.length - 1) throw new RangeError(`never settles to ${final} within ${band}; last ${output.at(-1)}`);
  const [a, b] = [Math.abs(output[outside]! - final), Math.abs(output[outside + 1]! - final)];
  return times[outside]! + ((a - band) / (a - b)) * (times[outside + 1]! - times[outside]!);
}
