import { cell, increase } from './cells.js';
import { requireNotNegative, requirePositive } from './domain.js';
import type { LoopAmplifier } from './feedback-loop.js';
import { halvedPanel, KRONROD_NODES, PANEL_POINTS } from './gauss-kronrod.js';
import type { NoiseGrid, NoiseSamples } from './noise-grid.js';
import { panelAxis, type Panel } from './panel-axis.js';

/** voltageNoise V/√Hz and currentNoise A/√Hz (white levels), noiseCorner and currentCorner Hz (default 0): all at least 0. */
export interface NoisyAmplifier extends LoopAmplifier {
  readonly voltageNoise: number;
  readonly noiseCorner: number;
  readonly currentNoise: number;
  readonly currentCorner?: number;
}

/** Volts rms at the output; the terms add as squares. */
export interface OutputNoise {
  readonly rms: number;
  readonly terms: readonly { readonly name: string; readonly rms: number }[];
}

/** Share of the whole by which the coarse rule may miss a panel; the fine one then misses far less, by about its power of 1.6. */
const RESOLVED = 1e-7;
/** A loop without any margin has no finite noise; halving ends here. */
const DEEPEST = 12;

/**
 * Output noise of a stage with one amplifier, from the lowest frequency of the grid up, good to 1e-7 of the whole: every source at
 * the amplifier's input times |1/(1/A + β)|², integrated over the frequency; a panel with a resonance of the loop is halved. The 1/f
 * parts are inside their terms: en²·(1 + fce/f), in²·(1 + fci/f). Means nothing for a loop that oscillates.
 * @param grid noiseGrid() of the stage
 * @param amplifier V/√Hz, A/√Hz, Hz
 * @returns V
 * @example follower, 10 nV/√Hz, 1 MHz, no other source: 12.53 µV
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 7; Motchenbacher & Connelly,
 * Low-Noise Electronic System Design (1993) (both from memory).
 */
export function outputNoise(grid: NoiseGrid, amplifier: NoisyAmplifier): OutputNoise {
  const { voltageNoise, noiseCorner, currentNoise, currentCorner = 0, gainBandwidth, poles = [] } = amplifier;
  requirePositive('outputNoise', { gainBandwidth });
  requireNotNegative('outputNoise', { voltageNoise, noiseCorner, currentNoise, currentCorner });
  for (const pole of poles) if (pole !== Infinity) requirePositive('outputNoise', { pole });
  const sums = new Float64Array(3 + grid.resistors.length);
  const task: Task = { grid, amplifier: { ...amplifier, currentCorner, poles }, sums };
  const gain = powerGain(grid, task.amplifier);
  const input = inputDensity(grid, task.amplifier);
  gather(task, { samples: grid, gain, input, depth: 0, allowed: RESOLVED * dot(grid.weight, gain, input) });
  const names = ['amplifier voltage noise', 'amplifier current noise, + input', 'amplifier current noise, − input', ...grid.resistors];
  const terms = names.map((name, k) => ({ name, rms: Math.sqrt(cell(sums, k)) }));
  return { rms: Math.sqrt(sums.reduce((sum, square) => sum + square, 0)), terms };
}

interface Task {
  readonly grid: NoiseGrid;
  readonly amplifier: Required<NoisyAmplifier>;
  /** V², term by term. */
  readonly sums: Float64Array;
}

interface Block {
  readonly samples: NoiseSamples;
  readonly gain: Float64Array;
  readonly input: Float64Array;
  readonly depth: number;
  readonly allowed: number;
}

/** Adds the panels that are resolved to the sums, and halves the others. */
function gather(task: Task, block: Block): void {
  const { samples, gain, input, depth, allowed } = block;
  const power = new Float64Array(gain.length);
  for (let i = 0; i < power.length; i += 1) power[i] = cell(gain, i) * cell(samples.weight, i);
  for (let from = 0; from + PANEL_POINTS <= gain.length; from += PANEL_POINTS) {
    let off = 0;
    for (let i = from; i < from + PANEL_POINTS; i += 1) off += cell(gain, i) * cell(input, i) * cell(samples.difference, i);
    if (Math.abs(off) <= allowed || depth >= DEEPEST) continue;
    power.fill(0, from, from + PANEL_POINTS);
    const halves = halved(task.grid, samples, from);
    const next = { samples: halves, gain: powerGain(halves, task.amplifier), input: inputDensity(halves, task.amplifier) };
    gather(task, { ...next, depth: depth + 1, allowed });
  }
  addTerms(task, samples, power);
}

function addTerms({ amplifier, sums }: Task, samples: NoiseSamples, power: Float64Array): void {
  const { voltageNoise, noiseCorner, currentNoise, currentCorner } = amplifier;
  let voltage = 0;
  let plus = 0;
  let minus = 0;
  for (let i = 0; i < power.length; i += 1) {
    const inverse = 1 / cell(samples.frequency, i);
    const currents = cell(power, i) * (1 + currentCorner * inverse);
    voltage += cell(power, i) * (1 + noiseCorner * inverse);
    plus += currents * cell(samples.plusSquare, i);
    minus += currents * cell(samples.minusSquare, i);
  }
  increase(sums, 0, voltageNoise ** 2 * voltage);
  increase(sums, 1, currentNoise ** 2 * plus);
  increase(sums, 2, currentNoise ** 2 * minus);
  samples.thermal.forEach((row, k) => {
    let sum = 0;
    for (let i = 0; i < power.length; i += 1) sum += cell(power, i) * cell(row, i);
    increase(sums, 3 + k, sum);
  });
}

/** |F/(1/A + β)|², V²/V². */
function powerGain(samples: NoiseSamples, { gainBandwidth, poles }: Required<NoisyAmplifier>): Float64Array {
  const gain = new Float64Array(samples.frequency.length);
  for (let i = 0; i < gain.length; i += 1) {
    const frequency = cell(samples.frequency, i);
    let re = 0;
    let im = frequency / gainBandwidth;
    for (const pole of poles) {
      const x = frequency / pole;
      const turned = re - im * x;
      im += re * x;
      re = turned;
    }
    re += cell(samples.feedbackRe, i);
    im += cell(samples.feedbackIm, i);
    gain[i] = cell(samples.filter, i) / (re * re + im * im);
  }
  return gain;
}

/** All sources together at the amplifier's input, V²/Hz. */
function inputDensity(samples: NoiseSamples, amplifier: Required<NoisyAmplifier>): Float64Array {
  const { voltageNoise, noiseCorner, currentNoise, currentCorner } = amplifier;
  const [voltage, current] = [voltageNoise ** 2, currentNoise ** 2];
  const density = new Float64Array(samples.frequency.length);
  for (let i = 0; i < density.length; i += 1) {
    const inverse = 1 / cell(samples.frequency, i);
    const impedances = cell(samples.plusSquare, i) + cell(samples.minusSquare, i);
    density[i] = voltage * (1 + noiseCorner * inverse) + current * (1 + currentCorner * inverse) * impedances + cell(samples.thermalSum, i);
  }
  return density;
}

/** The two halves of one panel. What the network does is smooth in ln f and is interpolated; the filter is worked out anew. */
function halved({ following }: NoiseGrid, samples: NoiseSamples, from: number): NoiseSamples {
  const middle = Math.log(cell(samples.frequency, from + (PANEL_POINTS - 1) / 2));
  const end = Math.log(cell(samples.frequency, from + PANEL_POINTS - 1));
  const reach = (end - middle) / (KRONROD_NODES.at(-1) ?? NaN);
  const panels: readonly Panel[] = [[middle - reach, middle], [middle, middle + reach]];
  const half = (row: Float64Array): Float64Array => halvedPanel(row, from);
  return {
    ...panelAxis(panels, following),
    feedbackRe: half(samples.feedbackRe),
    feedbackIm: half(samples.feedbackIm),
    plusSquare: half(samples.plusSquare),
    minusSquare: half(samples.minusSquare),
    thermal: samples.thermal.map(half),
    thermalSum: half(samples.thermalSum),
  };
}

function dot(weight: Float64Array, one: Float64Array, other: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < weight.length; i += 1) sum += cell(weight, i) * cell(one, i) * cell(other, i);
  return sum;
}
