import { oscillatorPeriod, oscillatorThresholds } from '../formulas/oscillator.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { OscillatorSpec, StageSpec } from '../spec/spec.js';
import { chooseTiming, type Timing } from './choose-timing.js';
import { inputOf, UNITY, type Circuit, type RatioCorner } from './circuit.js';
import type { Excitation } from './excitation.js';
import { capacitorTolerance, grid, toleranceEnds } from './filter-response.js';
import { toleranceOf } from './fitted.js';
import type { Maker } from './making.js';
import type { OscillatorResponse } from './response.js';

/** Threshold resistors to the supply, to ground and to the output, Ω. */
interface Ladder {
  readonly toSupply: number;
  readonly toGround: number;
  readonly toOutput: number;
}

const DEFAULT_THRESHOLD = 100e3;
const DEFAULT_EDGE = 0.05;
/** Between these shares of its supply CMOS logic may read either level (common practice). */
const LOGIC = { low: 0.3, high: 0.7 };

/**
 * Square-wave oscillator: the output charges the capacitor at the − input between two thresholds at the + input, which three
 * resistors take from supply, ground and output (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed.
 * 2002, ch. 10, from memory). What the stage asks of the output are the levels the logic after it needs.
 */
export const makeOscillator: Maker = (spec) => {
  const { oscillator } = spec;
  if (oscillator === undefined) throw new RangeError('a relaxation oscillator without a frequency reached the circuit');
  const ladder = ladderOf(oscillator);
  const timing = timingOf(spec, oscillator, ladder);
  if ('code' in timing) return { ok: false, problems: [timing] };
  const spread = spreadOf(spec, ladder, timing);
  const given = periodOf(ladder, timing);
  const problem = frequencyDisagrees(spec, oscillator, { given: 1 / given, spread });
  if (problem !== null) return { ok: false, problems: [problem] };
  const levels = spec.drives === undefined ? LOGIC : { low: spec.drives.threshold.min, high: spec.drives.threshold.max };
  const response = {
    kind: 'oscillator',
    frequency: oscillator.frequency.value,
    edge: (oscillator.edge?.value ?? DEFAULT_EDGE) / (2 * oscillator.frequency.value),
    ...ladder,
    ...timing,
    timeConstant: timing.resistance * timing.capacitance,
    spread,
    drives: spec.drives === undefined ? null : { ...levels, maxEdge: spec.drives.maxEdge?.value ?? null },
  } satisfies OscillatorResponse;
  const circuit = oscillating(ladder, timing, { levels, tolerance: toleranceOf(spec) });
  return { ok: true, made: { circuit, excitation: driveOf(levels), response, fitNotes: notesOf(spec, oscillator, { timing, given: 1 / given, spread }), cautions: [] } };
};

function ladderOf({ toSupply, toGround, toOutput }: OscillatorSpec): Ladder {
  return { toSupply: toSupply?.value ?? DEFAULT_THRESHOLD, toGround: toGround?.value ?? DEFAULT_THRESHOLD, toOutput: toOutput?.value ?? DEFAULT_THRESHOLD };
}

/** One period with an output that reaches both rails, s: 2·RC·ln 2 with three equal resistors. Independent of the supply. */
function periodOf(ladder: Ladder, { resistance, capacitance }: Timing): number {
  const { up, down } = oscillatorPeriod({ supply: 1, high: 1, low: 0, ...ladder }, resistance * capacitance);
  return up + down;
}

function timingOf(spec: StageSpec, { frequency, resistance, capacitance }: OscillatorSpec, ladder: Ladder): Timing | Problem {
  if (resistance !== undefined && capacitance !== undefined) return { resistance: resistance.value, capacitance: capacitance.value };
  const wanted = 1 / (frequency.value * periodOf(ladder, { resistance: 1, capacitance: 1 }));
  const written = { ...(resistance === undefined ? {} : { resistance: resistance.value }), ...(capacitance === undefined ? {} : { capacitance: capacitance.value }) };
  return (
    chooseTiming(wanted, written) ??
    contradiction(spec, {
      code: 'S210',
      paths: ['oscillator.frequency', 'oscillator.resistance', 'oscillator.capacitance', 'oscillator'],
      message: `no E96 resistor of 10 kΩ..1 MΩ with an E24 capacitor gives ${formatQuantity(frequency.value, 'Hz')}: R·C must be ${formatQuantity(wanted, 's', { digits: 4 })}`,
      fix: 'write oscillator.resistance and oscillator.capacitance',
    })
  );
}

/** How far tolerances of timing and threshold components move the frequency at worst, relative: at all their ends. */
function spreadOf(spec: StageSpec, { toSupply, toGround, toOutput }: Ladder, { resistance, capacitance }: Timing): number {
  const [t, tc] = [toleranceOf(spec), capacitorTolerance(spec)];
  const nominal = periodOf({ toSupply, toGround, toOutput }, { resistance, capacitance });
  const all = grid([toleranceEnds(toSupply, t), toleranceEnds(toGround, t), toleranceEnds(toOutput, t), toleranceEnds(resistance, t), toleranceEnds(capacitance, tc)]);
  return Math.max(...all.map(([supply = 0, ground = 0, output = 0, r = 0, c = 0]) => Math.abs(nominal / periodOf({ toSupply: supply, toGround: ground, toOutput: output }, { resistance: r, capacitance: c }) - 1)));
}

/** Timing components written beside the frequency must give it within their tolerances. */
function frequencyDisagrees(spec: StageSpec, { frequency, resistance, capacitance }: OscillatorSpec, { given, spread }: { given: number; spread: number }): Problem | null {
  if (resistance === undefined || capacitance === undefined || Math.abs(given / frequency.value - 1) <= spread * (1 + 1e-9) + 1e-12) return null;
  return contradiction(spec, {
    code: 'S210',
    paths: ['oscillator.frequency', 'oscillator.resistance', 'oscillator.capacitance', 'oscillator'],
    message: `frequency and components disagree: ${resistance.text} and ${capacitance.text} give ${formatQuantity(given, 'Hz', { digits: 4 })}, more than their tolerances (${formatPercent(spread)}) away from ${frequency.text}`,
    fix: `write frequency: ${formatQuantity(given, 'Hz', { digits: 3 })}, or leave one of the two out`,
  });
}

interface Levels {
  readonly low: number;
  readonly high: number;
}

/** Both inputs run between the thresholds of an output that reaches both rails; the output must reach the levels of the logic. */
function oscillating(ladder: Ladder, { resistance }: Timing, { levels, tolerance }: { levels: Levels; tolerance: number }): Circuit {
  const { toSupply, toGround, toOutput } = ladder;
  const ends = grid([toSupply, toGround, toOutput].map((ohms) => toleranceEnds(ohms, tolerance)));
  const corners = ends.map(([supply = 0, ground = 0, output = 0]) => cornerOf({ toSupply: supply, toGround: ground, toOutput: output }, levels));
  const thresholds = oscillatorThresholds({ supply: 1, high: 1, low: 0, ...ladder });
  const ladderConductance = 1 / toSupply + 1 / toGround + 1 / toOutput;
  return {
    gain: 0,
    gainUnit: null,
    noiseGain: UNITY,
    dcNoiseGain: UNITY,
    resistors: null,
    nominal: cornerOf(ladder, levels),
    corners,
    networkConductance: (1 - 1 / toOutput / ladderConductance) / toOutput + 1 / resistance,
    networkEnd: (commonMode) => commonMode,
    // Threshold resistors as they stand at this output, and the capacitor still at the threshold it comes from.
    networkCurrent: ({ inputs, output, supply }) => {
      const pin = (supply / toSupply + output / toOutput) / ladderConductance;
      const from = supply * (inputOf(inputs, 'level') === 1 ? thresholds.lower : thresholds.upper);
      return (output - pin) / toOutput + (output - from) / resistance;
    },
    seriesPositive: 1 / ladderConductance,
    seriesNegative: resistance,
    resistorRejection: null,
    network: null,
    notes: [],
  };
}

function cornerOf(ladder: Ladder, { low, high }: Levels): RatioCorner {
  const { upper, lower } = oscillatorThresholds({ supply: 1, high: 1, low: 0, ...ladder });
  return {
    noiseGain: 1,
    output: (point, _reference, supply) => supply * (low + (high - low) * inputOf(point, 'level')),
    commonMode: (point, _reference, supply) => supply * (lower + (upper - lower) * inputOf(point, 'level')),
  };
}

/** The two levels; a step goes from rail to rail, not only from one level of the logic to the other. */
function driveOf({ low, high }: Levels): Excitation {
  return { points: [{ level: 0 }, { level: 1 }], centre: { level: 0.5 }, steps: [], stepShare: 1 / (high - low) };
}

function notesOf(spec: StageSpec, { resistance, capacitance, toSupply, toGround, toOutput, edge }: OscillatorSpec, { timing, given, spread }: { timing: Timing; given: number; spread: number }): string[] {
  const chosen = [
    ...(resistance === undefined ? [`timing resistor ${formatQuantity(timing.resistance, 'Ω', { digits: 4 })} from E96`] : []),
    ...(capacitance === undefined ? [`timing capacitor ${formatQuantity(timing.capacitance, 'F', { digits: 4 })} from E24`] : []),
  ];
  return [
    ...chosen,
    ...([toSupply, toGround, toOutput].includes(undefined) ? ['threshold resistors 100 kΩ where none is written'] : []),
    `with an output that reaches both rails the components give ${formatQuantity(given, 'Hz', { digits: 4 })}, within ${formatPercent(spread)} by their tolerances`,
    ...(edge === undefined ? ['longest edge 5 % of the half period (common practice)'] : []),
    ...(spec.drives === undefined ? ['logic levels 0.3 and 0.7 of the supply: CMOS logic, common practice'] : []),
    'the output must pass the levels of the logic it drives; the figures of output stand for these',
  ];
}
