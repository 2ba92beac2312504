import type { Problem } from '../quantities/problem.js';
import { formatQuantity } from '../quantities/format.js';
import { contradiction } from '../spec/contradiction.js';
import type { StageSpec } from '../spec/spec.js';
import { gainForm } from './gain-form.js';
import { choosePair, type Pair } from './resistors.js';
import type { StageResistors } from './stage.js';

/** The resistors a stage is built with, and what was done to find them. */
export type Fitted =
  | { readonly ok: true; readonly resistors: StageResistors; readonly notes: readonly string[] }
  | { readonly ok: false; readonly problems: readonly Problem[] };

const DEFAULT_TOLERANCE = 0.01;

/** Gain magnitude a feedback and an input resistor give, before series resistances. */
function gainOf(spec: StageSpec, pair: Pair): number {
  const ratio = pair.feedback / pair.input;
  return gainForm(spec.topology) === 'non-inverting' ? 1 + ratio : ratio;
}

/** Gain of the resistors as written; null unless both are. */
export function writtenGain(spec: StageSpec): number | null {
  const { feedback, input } = spec.resistors ?? {};
  return feedback === undefined || input === undefined ? null : gainOf(spec, { feedback: feedback.value, input: input.value });
}

export function toleranceOf(spec: StageSpec): number {
  return spec.resistors?.tolerance?.value ?? DEFAULT_TOLERANCE;
}

/** Finds the resistors: as written, one derived exactly from the other and the gain, or the E96 pair nearest the gain. */
export function fitResistors(spec: StageSpec, gain: number): Fitted {
  const written = spec.resistors;
  const tolerance = toleranceOf(spec);
  const ratio = gainForm(spec.topology) === 'non-inverting' ? gain - 1 : gain;
  const pair = pairOf(spec, ratio);
  if (pair === null) return { ok: false, problems: [noPair(spec, gain)] };
  const notes = pairNotes(spec, pair);
  if (gainForm(spec.topology) !== 'difference') return { ok: true, resistors: { ...pair, tolerance }, notes };
  const toReference = written?.toReference?.value ?? pair.feedback;
  // After a change of gain the kept resistor to the reference rules its own leg.
  const positiveInput = written?.positiveInput?.value ?? (spec.keepFeedback === true ? toReference / ratio : pair.input);
  return { ok: true, resistors: { ...pair, positiveInput, toReference, tolerance }, notes };
}

function pairOf(spec: StageSpec, ratio: number): Pair | null {
  const feedback = spec.resistors?.feedback?.value;
  const input = spec.resistors?.input?.value;
  if (feedback !== undefined && input !== undefined) return { feedback, input };
  if (feedback !== undefined) return { feedback, input: feedback / ratio };
  if (input !== undefined) return { feedback: input * ratio, input };
  const sumsUp = gainForm(spec.topology) === 'non-inverting';
  return choosePair({ ratio, path: (rf, rg) => (sumsUp ? rf + rg : rf) });
}

function pairNotes(spec: StageSpec, pair: Pair): string[] {
  const { feedback, input } = spec.resistors ?? {};
  const ohms = (value: number): string => formatQuantity(value, 'Ω', { digits: 4 });
  if (feedback !== undefined && input !== undefined) return [];
  const gives = `gain ${formatQuantity(gainOf(spec, pair), 'V/V', { digits: 5 })}`;
  if (feedback !== undefined) return [`input resistor ${ohms(pair.input)}, exactly what the gain asks of the feedback resistor given`];
  if (input !== undefined) return [`feedback resistor ${ohms(pair.feedback)}, exactly what the gain asks of the input resistor given`];
  return [`resistors chosen from E96: feedback ${ohms(pair.feedback)}, input ${ohms(pair.input)}, ${gives}`];
}

function noPair(spec: StageSpec, gain: number): Problem {
  return contradiction(spec, {
    code: 'S209',
    paths: ['gain', 'signal.output'],
    message: `no pair of E96 resistors with a feedback path of 50 kΩ..200 kΩ gives a gain of ${formatQuantity(gain, 'V/V', { digits: 4 })}`,
    fix: 'write resistors: {feedback: …, input: …}',
  });
}

/** Gain and resistors both written must agree within the tolerance, before series resistances are added. */
export function gainAgainstResistors(spec: StageSpec): Problem | null {
  const fromResistors = writtenGain(spec);
  const gain = spec.gain?.value;
  if (fromResistors === null || gain === undefined) return null;
  if (Math.abs(fromResistors / gain - 1) <= toleranceOf(spec) * (1 + 1e-9) + 1e-12) return null;
  const text = formatQuantity(fromResistors, 'V/V', { digits: 4 });
  return contradiction(spec, {
    code: 'S203',
    paths: ['gain', 'resistors'],
    message: `gain ${spec.gain?.text ?? ''} and resistors disagree: the resistors give ${text}, more than their tolerance away`,
    fix: `write gain: ${Number(fromResistors.toPrecision(6))}, or leave the gain out`,
  });
}
