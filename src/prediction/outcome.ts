import { magnitude, phase } from '../formulas/complex.js';
import type { Part } from '../parts/part.js';
import type { ReadingRules } from '../parts/reading.js';
import type { Stage } from '../stage/index.js';
import { amplifierOf, type Amplifier, type Outcome } from './amplifier.js';
import { circuitAround, type Around } from './circuit.js';
import { cornerOf, levelAt, type Corner } from './corner.js';
import { idealTransfer, linearStage, type LinearStage } from './equations.js';
import { isLoadUnknown, loopFrequency } from './loop-facts.js';
import { noiseAt } from './noise.js';
import { notesOf } from './notes.js';
import { once } from '../quantities/once.js';
import { overTime, type OverTime } from './over-time.js';
import type { Form, Predicted, Results } from './prediction.js';
import type { Run } from './run.js';
import { bandOf, gainAtRest, isStable, transferAt, type Band } from './small-signal.js';
import { words } from './reasons.js';

/** One outcome in full: its table, its wave and its equations. */
export interface Told {
  readonly form: Form;
  readonly over: OverTime | null;
  readonly linear: LinearStage | null;
  readonly around: Around | null;
}

/** The stage with one outcome of the part's figures. */
export function outcomeOf(stage: Stage, part: Part, { form: outcome, rules }: { readonly form: Outcome; readonly rules: ReadingRules }): Told {
  const corner = cornerOf(stage, outcome);
  const kelvin = Math.max(Math.abs(stage.temperature.min - 25), Math.abs(stage.temperature.max - 25));
  const amplifier = amplifierOf(part, rules, { form: outcome, place: { kelvin, supply: stage.supply.min } });
  const at = { supply: corner.supply, reference: corner.reference };
  if (amplifier.gainBandwidth === null) {
    return { form: { at, figures: amplifier.used, results: nothing(stage, words.missing(['gainBandwidth'])), notes: [] }, over: null, linear: null, around: null };
  }
  const { around, linear } = equationsOf(stage, amplifier, amplifier.gainBandwidth);
  const stable = stage.response.kind === 'oscillator' || isStable(linear);
  const run = runOf({ stage, form: outcome, amplifier, around, linear, corner });
  const over = stable ? overTime(run) : null;
  const form = once((): Form => {
    const small = stage.response.kind === 'oscillator' ? {} : smallSignal(run, stable);
    return { at, figures: amplifier.used, results: { ...small, ...(over?.results ?? unstableResults(stage)) }, notes: notesOf(run) };
  });
  return { get form() { return form(); }, over, linear: stable ? linear : null, around };
}

function equationsOf(stage: Stage, amplifier: Amplifier, gainBandwidth: number): { around: Around; linear: LinearStage } {
  const around = circuitAround(stage, amplifier, gainBandwidth);
  return { around, linear: linearStage(around, { ...amplifier, gainBandwidth }) };
}

function runOf(of: Pick<Run, 'stage' | 'form' | 'amplifier' | 'around' | 'linear' | 'corner'>): Run {
  const { stage, amplifier, corner } = of;
  const { readings } = amplifier;
  const levels = { low: levelAt(stage, corner, { side: 'low', readings }), high: levelAt(stage, corner, { side: 'high', readings }) };
  const isTopTight = corner.supply - corner.high.output < corner.low.output;
  const adds = stage.response.kind === 'integrator' || stage.response.kind === 'oscillator';
  const size = adds ? amplifier.offset : stage.dcNoiseGain.nominal * amplifier.offset;
  return { ...of, levels, slew: slewOf(stage, amplifier, corner), shift: isTopTight ? size : -size };
}

/** What the part slews at, and what current is left to charge the load capacitance with (M2: SR_eff = min(SR, (I − I_R)/CL)). */
function slewOf({ load }: Stage, { slewRate, outputCurrent }: Amplifier, { low, high }: Corner): Run['slew'] {
  if (slewRate === null) return { up: NaN, down: NaN };
  if (load === null || load.capacitance === 0 || outputCurrent === null) return { up: slewRate, down: slewRate };
  const resistive = Math.max(...[low, high].map(({ loadCurrent, networkCurrent }) => Math.abs(loadCurrent + networkCurrent)));
  const charging = Math.max(0, outputCurrent - resistive) / load.capacitance;
  return { up: Math.min(slewRate, charging), down: Math.min(slewRate, charging) };
}

const absent = (reason: string): Predicted => ({ value: null, reason });

/** Bandwidth, peaking, gain and phase at the top frequency, noise. */
function smallSignal(run: Run, stable: boolean): Results {
  const { stage, amplifier, linear, around, form } = run;
  if (!stable) return { bandwidth: absent(words.unstable), peaking: absent(words.unstable), gain: absent(words.unstable), noise: absent(words.unstable) };
  const noise = noiseAt(stage, amplifier, { form, capacitor: around.chosenCapacitor });
  return {
    ...atTop(run),
    ...bandResults(run, bandOf(linear, loopFrequency(stage, amplifier))),
    noise: 'rms' in noise ? { value: noise.rms } : absent(words.missing(noise.missing)),
  };
}

function atTop({ stage, linear, around }: Run): Results {
  const { frequency } = stage;
  if (frequency === null) return {};
  const value = transferAt(linear, frequency);
  const ideal = idealTransfer(around, 2 * Math.PI * frequency);
  if (value === null || ideal === null) return {};
  const turn = phase(value) - phase(ideal);
  return { gain: { value: magnitude(value) }, phase: { value: turn - 360 * Math.round(turn / 360) } };
}

function bandResults(run: Run, band: Band | null): Results {
  const { stage } = run;
  if (gainAtRest(run.linear) === null || (stage.response.kind === 'integrator' && stage.resistors === null)) return { bandwidth: absent(words.noPassBand), peaking: absent(words.noPassBand) };
  if (band === null) return { bandwidth: absent(words.neverFalls), peaking: absent(words.neverFalls) };
  return { bandwidth: { value: band.bandwidth }, peaking: peakingOf(run, Math.max(band.peaking, fastest(run))) };
}

/** The part with the most gain bandwidth may peak more: the worst form takes the larger. */
function fastest({ stage, amplifier, form }: Run): number {
  const most = amplifier.gainBandwidthMost;
  if (form === 'typical' || most === null || most === amplifier.gainBandwidth) return 1;
  const { linear } = equationsOf(stage, amplifier, most);
  return isStable(linear) ? (bandOf(linear, most / stage.noiseGain.nominal)?.peaking ?? 1) : Infinity;
}

function peakingOf({ stage, amplifier }: Run, ratio: number): Predicted {
  if (ratio === Infinity) return absent(words.unstable);
  if (isLoadUnknown(stage, amplifier)) return absent(words.missing(['outputResistance']));
  if (stage.response.kind === 'amplifier' && amplifier.unknown.has('phaseMargin')) return absent(words.missing(['phaseMargin']));
  return { value: 20 * Math.log10(ratio) };
}

function unstableResults({ response }: Stage): Results {
  return response.kind === 'oscillator' ? {} : { outputHigh: absent(words.unstable), outputLow: absent(words.unstable), settling: absent(words.unstable) };
}

function nothing({ response }: Stage, reason: string): Results {
  if (response.kind === 'oscillator') return { frequency: absent(reason), duty: absent(reason), rise: absent(reason), fall: absent(reason), outputHigh: absent(reason), outputLow: absent(reason) };
  return { outputHigh: absent(reason), outputLow: absent(reason), bandwidth: absent(reason), peaking: absent(reason), gain: absent(reason), settling: absent(reason), noise: absent(reason) };
}
