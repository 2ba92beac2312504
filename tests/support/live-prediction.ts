import type { Topology } from '../../src/spec/spec.js';
import { drawing, type Driven, type Parts } from './drawings.js';
import { loadLines, type LiveLoad } from './live-amplifier.js';
import type { Curve } from './live-stage.js';
import { period, spice, type Analysis } from './spice.js';

/** Head-room of one side: V up to a current in A, from there on so many ohm. */
export interface LiveHeadroom {
  readonly volts: number;
  readonly from: number;
  readonly ohms: number;
}

/** A whole amplifier drawn as elements: Hz, Hz, V/s, V/V, Ω, F, V at the + input. */
export interface WholeAmplifier {
  readonly gainBandwidth: number;
  readonly pole?: number;
  readonly slewRate: number;
  readonly openLoopGain?: number;
  readonly outputResistance?: number;
  readonly inputCapacitance?: number;
  readonly offset?: number;
  readonly high: LiveHeadroom;
  readonly low: LiveHeadroom;
}

export interface WholeStage {
  readonly topology: Topology;
  readonly parts: Parts;
  readonly driven: Driven & { readonly supply: number };
  readonly amplifier: WholeAmplifier;
  readonly load?: LiveLoad;
  /** Further lines around the drawing. */
  readonly more?: readonly string[];
  /** V the output starts from when nothing else is at rest. */
  readonly initial?: number;
}

const FARAD = 1e-9;
/** 1/V, of the slewing current: how hard the integrator is held at its ends, 50 µV at most. */
const HOLDING = 2e4;

/**
 * Netlist lines: a transconductance with a hard limit into a capacitor that is held where the head-room for the current at the output
 * ends, a buffered RC for the second pole, a source behind the output resistance. The gain makes up for what RL takes from Ro, so that
 * the gain bandwidth holds with the load.
 */
function lines({ topology, parts, driven, amplifier, load = {}, more = [], initial }: WholeStage): string[] {
  const drawn = drawing(topology, parts, driven);
  const { gainBandwidth, pole, slewRate, openLoopGain = 1e9, outputResistance = 0, inputCapacitance, offset = 0, high, low } = amplifier;
  const siemens = 2 * Math.PI * gainBandwidth * FARAD;
  const most = slewRate * FARAD;
  const outside = load.resistance === undefined ? Infinity : load.resistance + (load.isolation ?? 0);
  const restored = outside === Infinity ? 1 : (outside + outputResistance) / outside;
  const room = ({ volts, from, ohms }: LiveHeadroom, current: string): string => `(${volts}+${ohms}*max(${current}-${from},0))`;
  const behind = `${outputResistance}*i(vloop)`;
  const hold = (FARAD * slewRate * HOLDING).toExponential(6);
  return [
    ...drawn.lines,
    `voff pe ${drawn.plus} ${offset}`,
    `by 0 y0 i=min(max(${siemens}*(v(pe)-v(${drawn.minus})),${-most}),${most})`,
    `cy y0 0 ${FARAD}${initial === undefined ? '' : ` ic=${initial / restored}`}`,
    `vmid mid 0 ${driven.supply / 2}`,
    `ry y0 mid ${openLoopGain / siemens}`,
    'vhold y0 held 0',
    `bh held 0 i=${hold}*(max(${restored}*v(y0)-(${driven.supply}-${room(high, 'i(vloop)')}+${behind}),0)+min(${restored}*v(y0)-(${room(low, '-i(vloop)')}+${behind}),0))`,
    ...(pole === undefined ? ['vp y0 y1 0'] : ['ep q0 0 y0 0 1', 'rp q0 y1 1', `cp y1 0 ${1 / (2 * Math.PI * pole)}${initial === undefined ? '' : ` ic=${initial / restored}`}`]),
    `eout before 0 y1 0 ${restored}`,
    'vloop before behind 0',
    outputResistance === 0 ? 'vwo behind out 0' : `ropen behind out ${outputResistance}`,
    ...(inputCapacitance === undefined ? [] : [`cip ${drawn.plus} 0 ${inputCapacitance}`, `cin ${drawn.minus} 0 ${inputCapacitance}`]),
    ...loadLines(load),
    ...more,
  ];
}

const OPTIONS = '.options reltol=1e-6 abstol=1e-15 vntol=1e-9';

function run(stage: WholeStage, analysis: string): Promise<Analysis> {
  return spice(['* a stage with its amplifier', ...lines(stage), OPTIONS, analysis, '.end', ''].join('\n'));
}

/** Small-signal response at the output. */
export async function wholeResponse(stage: WholeStage, [from, to]: readonly [number, number]): Promise<Curve> {
  const result = await run(stage, `.ac dec 400 ${from} ${to}`);
  return { frequencies: result.real('frequency'), values: result.complex('v(out)') };
}

export interface Trace {
  readonly times: readonly number[];
  readonly output: readonly number[];
  /** Share of the time in which the integrator is held at one of its ends. */
  readonly held: number;
}

/** Of the slewing current: more than this holds the integrator. */
const AT_ITS_END = 1e-5;

function traceOf(result: Analysis, { amplifier }: WholeStage): Trace {
  const [times, holding] = [result.real('time'), result.real('i(vhold)')];
  const spent = times.reduce((sum, time, at) => (at > 0 && Math.abs(holding[at]!) > AT_ITS_END * amplifier.slewRate * FARAD ? sum + time - times[at - 1]! : sum), 0);
  return { times, output: result.real('v(out)'), held: spent / times.at(-1)! };
}

/** From the operating point of the sources' first values on. */
export async function wholeTransient(stage: WholeStage, duration: number, steps: number): Promise<Trace> {
  const step = duration / steps;
  const result = await run(stage, `.tran ${step} ${duration} 0 ${step}`);
  return traceOf(result, stage);
}

/** From nothing on, everything empty. */
export async function wholeStart(stage: WholeStage, duration: number, steps: number): Promise<Trace> {
  const step = duration / steps;
  const result = await run(stage, `.tran ${step} ${duration} 0 ${step} uic`);
  return traceOf(result, stage);
}

export interface Period {
  readonly output: readonly number[];
  /** Share of the period in which the integrator is held at one of its ends. */
  readonly held: number;
}

/** The last of `periods` periods at the output, on an even grid. */
export async function wholePeriod(stage: WholeStage, { frequency, periods, points }: { readonly frequency: number; readonly periods: number; readonly points: number }): Promise<Period> {
  const length = 1 / frequency;
  const result = await run(stage, `.tran ${length / points} ${(periods + 0.01) * length} ${(periods - 1.01) * length} ${length / points}`);
  const [times, span] = [result.real('time'), [(periods - 1) * length, length, points] as const];
  const holding = period(times, result.real('i(vhold)'), span);
  const least = AT_ITS_END * stage.amplifier.slewRate * FARAD;
  return { output: period(times, result.real('v(out)'), span), held: holding.filter((current) => Math.abs(current) > least).length / points };
}
