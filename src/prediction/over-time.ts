import { magnitude } from '../formulas/complex.js';
import type { Parameter } from '../parts/figures.js';
import { idealTransfer } from './equations.js';
import { oscillation } from './oscillation.js';
import { isLoadUnknown, loopFrequency } from './loop-facts.js';
import { once } from '../quantities/once.js';
import type { Predicted, Results, Waveform } from './prediction.js';
import { rampRun } from './ramp.js';
import { words } from './reasons.js';
import type { Run, Wave } from './run.js';
import { sineRun } from './sine.js';
import { bandOf, gainAtRest } from './small-signal.js';
import { stepRun, type StepRun } from './step.js';

/** What one outcome does over time; the wave null where it cannot be told. */
export interface OverTime {
  readonly results: Results;
  readonly wave: Wave | null;
  readonly kind: Waveform['kind'];
}

const absent = (reason: string): Predicted => ({ value: null, reason });
/** Without a limit on settling, how near it counts as settled (common practice). */
const DEFAULT_TOLERANCE = 1e-3;

/** Sine, step, ramp or oscillation, as the stage has it. */
export function overTime(run: Run): OverTime {
  const { stage, slew } = run;
  if (Math.min(slew.up, slew.down) <= 0) return { ...without(TOLD[waveOf(stage)], words.noCurrent), kind: waveOf(stage) };
  if (stage.response.kind === 'oscillator') return oscillating(run);
  if (stage.response.kind === 'integrator' && stage.response.window !== null) return ramping(run);
  const isEdge = stage.shape === 'step' || stage.shape === 'pulse';
  const stepped = once(() => (stage.response.kind === 'integrator' && stage.resistors === null ? { results: { settling: absent(words.noRest) }, wave: null } : stepping(run)));
  if (isEdge) return { ...stepped(), kind: 'step' };
  const waved = sine(run);
  return { get results() { return { ...stepped().results, ...waved.results }; }, wave: waved.wave, kind: 'sine' };
}

/** What a wave tells. */
const TOLD: Readonly<Record<Waveform['kind'], readonly (keyof Results)[]>> = {
  sine: ['settling', 'rise', 'fall', 'outputHigh', 'outputLow', 'clipped', 'slewing', 'distortion'],
  step: ['settling', 'rise', 'fall', 'outputHigh', 'outputLow', 'clipped'],
  ramp: ['settling', 'outputHigh', 'outputLow', 'clipped', 'slewing'],
  oscillation: ['frequency', 'duty', 'rise', 'fall', 'outputHigh', 'outputLow'],
};

function waveOf({ response, shape }: Run['stage']): Waveform['kind'] {
  if (response.kind === 'oscillator') return 'oscillation';
  if (response.kind === 'integrator' && response.window !== null) return 'ramp';
  return shape === 'step' || shape === 'pulse' ? 'step' : 'sine';
}

/** What every wave needs: the slew rate, the current into a load capacitance. */
function unknownSpeed({ stage, amplifier }: Run): Parameter[] {
  const charges = stage.load !== null && stage.load.capacitance > 0;
  return [...(amplifier.slewRate === null ? (['slewRate'] as const) : []), ...(charges && amplifier.outputCurrent === null ? (['outputCurrent'] as const) : [])];
}

function unknownLevels({ levels }: Run): Parameter[] {
  return [...(levels.low.level === null ? (['outputLowHeadroom'] as const) : []), ...(levels.high.level === null ? (['outputHighHeadroom'] as const) : [])];
}

function sine(run: Run): { readonly results: Results; readonly wave: Wave | null } {
  const { stage, corner } = run;
  const missing = [...unknownSpeed(run), ...unknownLevels(run)];
  if (missing.length > 0) return without(['outputHigh', 'outputLow', 'clipped', 'slewing', 'distortion'], words.missing(missing));
  const { frequency } = stage;
  if (frequency === null) return { results: {}, wave: null };
  const amplitude = inputAmplitude(run);
  if (amplitude === null) return { results: {}, wave: null };
  const centre = stage.response.kind === 'integrator' ? corner.reference : (corner.low.output + corner.high.output) / 2;
  const found = sineRun(run, { frequency, amplitude, centre });
  if (found === null) return without(['outputHigh', 'outputLow', 'clipped', 'slewing', 'distortion'], words.notPeriodic);
  const { wave, distortion } = found;
  return {
    results: {
      outputHigh: { value: Math.max(...wave.output) },
      outputLow: { value: Math.min(...wave.output) },
      clipped: { value: wave.clipped },
      slewing: { value: wave.slewing },
      distortion: { value: distortion },
    },
    wave,
  };
}

const without = (names: readonly (keyof Results)[], reason: string): { readonly results: Results; readonly wave: null } => ({ results: Object.fromEntries(names.map((name) => [name, absent(reason)])), wave: null });

/** V or A at the input that makes the swing of this corner about an ideal amplifier; its sign is that of the gain. */
function inputAmplitude({ stage, corner, around }: Run): number | null {
  const half = (corner.high.output - corner.low.output) / 2;
  if (stage.response.kind === 'integrator') return (inputOf(corner.high.inputs) - inputOf(corner.low.inputs)) / 2;
  const ideal = idealTransfer(around, 0);
  if (ideal === null || magnitude(ideal) === 0) return null;
  const growth = stage.response.kind === 'low-pass' ? stage.response.growth : 1;
  return half / growth / ideal.re;
}

const inputOf = (inputs: Readonly<Record<string, number>>): number => inputs['input'] ?? 0;

function stepping(run: Run): { readonly results: Results; readonly wave: Wave | null } {
  const { stage, amplifier, linear, corner } = run;
  const missing = unknownSpeed(run);
  if (missing.length > 0) return without(['settling', 'rise', 'fall'], words.missing(missing));
  const gain = gainAtRest(linear);
  const band = bandOf(linear, loopFrequency(stage, amplifier));
  if (gain === null || gain === 0 || band === null) return without(['settling'], words.noRest);
  const centre = (corner.high.output + corner.low.output) / 2;
  const ideal = idealTransfer(run.around, 0)?.re ?? gain;
  const half = Math.abs((inputAmplitude(run) ?? 0) * ideal);
  if (half === 0) return { results: {}, wave: null };
  const pace = 1 / (2 * Math.PI * Math.max(band.bandwidth, band.peakAt ?? 0));
  const shape = { gain: ideal, tolerance: stage.asked.limits.settling?.to.value ?? DEFAULT_TOLERANCE, pace };
  const up = stepRun(run, { ...shape, from: centre - half, to: centre + half });
  const down = stepRun(run, { ...shape, from: centre + half, to: centre - half });
  if (up === null || down === null) return without(['settling'], words.noRest);
  return { results: { ...levelResults(run, up, down), ...timeResults(run, up, down) }, wave: up.wave };
}

function levelResults(run: Run, up: StepRun, down: StepRun): Results {
  const unknown = unknownLevels(run);
  if (unknown.length > 0) return without(['outputHigh', 'outputLow', 'clipped'], words.missing(unknown)).results;
  return { outputHigh: { value: Math.max(up.high, down.high) }, outputLow: { value: Math.min(up.low, down.low) }, clipped: { value: Math.max(up.wave.clipped, down.wave.clipped) } };
}

function timeResults({ stage, amplifier }: Run, up: StepRun, down: StepRun): Results {
  const told = (value: number | null, reason: string): Predicted => (value === null ? absent(reason) : { value });
  const both = up.settling === null || down.settling === null ? null : Math.max(up.settling, down.settling);
  const isHeld = up.wave.clipped > 0 || down.wave.clipped > 0;
  return {
    settling: isLoadUnknown(stage, amplifier) ? absent(words.missing(['outputResistance'])) : told(both, isHeld ? words.clipped : words.never),
    rise: told(up.edge, isHeld ? words.clipped : words.never),
    fall: told(down.edge, isHeld ? words.clipped : words.never),
  };
}

/** From the reset on, towards each end of the ideal output. */
function ramping(run: Run): OverTime {
  const { stage, corner } = run;
  if (stage.response.kind !== 'integrator' || stage.response.window === null) throw new RangeError('a ramp is of an integrator with a window');
  const { window, resistance, capacitance } = stage.response;
  const missing = [...unknownSpeed(run), ...unknownLevels(run)];
  if (missing.length > 0) return { ...without(['outputHigh', 'outputLow', 'clipped'], words.missing(missing)), kind: 'ramp' };
  const bleed = stage.resistors === null ? Infinity : stage.resistors.feedback * capacitance;
  const toEnd = (output: number): Wave => {
    const reach = Number.isFinite(bleed) ? -bleed * Math.expm1(-window / bleed) : window;
    const rate = (output - corner.reference) / reach;
    return rampRun(run, { window, input: -rate * resistance * capacitance, reference: corner.reference, rate, bleed });
  };
  const waves = [corner.high.output, corner.low.output].map(toEnd);
  const longest = Math.abs(corner.high.output - corner.reference) >= Math.abs(corner.low.output - corner.reference) ? waves[0] : waves[1];
  const all = waves.flatMap(({ output }) => output);
  const results: Results = {
    outputHigh: { value: Math.max(...all) },
    outputLow: { value: Math.min(...all) },
    clipped: { value: Math.max(...waves.map(({ clipped }) => clipped)) },
    slewing: { value: Math.max(...waves.map(({ slewing }) => slewing)) },
    settling: absent(words.noRest),
  };
  return { results, wave: longest ?? null, kind: 'ramp' };
}

function oscillating(run: Run): OverTime {
  const { stage, levels } = run;
  const missing = [...unknownSpeed(run), ...unknownLevels(run)];
  const names = ['frequency', 'duty', 'rise', 'fall', 'outputHigh', 'outputLow'] as const;
  if (missing.length > 0 || levels.low.level === null || levels.high.level === null) return { ...without(names, words.missing(missing)), kind: 'oscillation' };
  if (stage.response.kind !== 'oscillator') throw new RangeError('an oscillation is of an oscillator');
  const found = oscillation(run, { low: levels.low.level, high: levels.high.level, response: stage.response });
  if (found === null) return { ...without(names, words.noOscillation), kind: 'oscillation' };
  const { wave, frequency, duty, rise, fall } = found;
  return {
    results: {
      outputHigh: { value: Math.max(...wave.output) },
      outputLow: { value: Math.min(...wave.output) },
      rise: { value: rise },
      fall: { value: fall },
      frequency: { value: frequency },
      duty: { value: duty },
    },
    wave,
    kind: 'oscillation',
  };
}
