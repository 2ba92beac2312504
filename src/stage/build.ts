import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import { supplyContradictions } from '../spec/supply-contradictions.js';
import { assumptionsOf, gainCautions } from './assumptions.js';
import type { Circuit } from './circuit.js';
import { contradictionsOf } from './contradictions.js';
import { difference } from './difference.js';
import { excitation, type Excitation } from './excitation.js';
import { fitResistors, gainAgainstResistors, toleranceOf, writtenGain } from './fitted.js';
import { follower } from './follower.js';
import { inverting } from './inverting.js';
import { nonInverting } from './non-inverting.js';
import { GROUND, referenceAt } from './reference.js';
import { solvedReference, solveFromOutput } from './solve.js';
import type { Stage, StageResistors } from './stage.js';
import { surroundingsOf } from './surroundings.js';
import { currentPeaks, vertices } from './vertices.js';

export type StageResult =
  | { readonly ok: true; readonly stage: Stage }
  | { readonly ok: false; readonly problems: readonly Problem[] };

const WITH_RESISTORS = { 'non-inverting': nonInverting, inverting, difference } as const;

/** The circuit a specification implies, or every contradiction in it. Errors are problems, never exceptions. */
export function buildStage(spec: StageSpec): StageResult {
  const built = impliedBy(spec);
  if (!built.ok) return { ok: false, problems: [...built.problems, ...supplyContradictions(spec)] };
  const problems = contradictionsOf(spec, built.stage, rebuilt);
  return problems.length > 0 ? { ok: false, problems } : built;
}

function rebuilt(spec: StageSpec): Stage | null {
  const built = impliedBy(spec);
  return built.ok ? built.stage : null;
}

/** The circuit, wherever its output may lie. */
function impliedBy(spec: StageSpec): StageResult {
  const disagreement = gainAgainstResistors(spec);
  if (disagreement !== null) return { ok: false, problems: [disagreement] };
  const settled = settle(spec);
  if ('problem' in settled) return { ok: false, problems: [settled.problem] };
  const circuit = circuitOf(spec, settled);
  if ('problems' in circuit) return { ok: false, problems: circuit.problems };
  return { ok: true, stage: assemble(spec, { ...settled, ...circuit }) };
}

interface Settled {
  readonly gain: number;
  readonly reference: ReferenceSpec;
  readonly notes: readonly string[];
}

/** Gain and reference: as written, or solved from the wanted output. */
function settle(spec: StageSpec): Settled | { readonly problem: Problem } {
  const known = spec.topology === 'follower' ? 1 : (spec.gain?.value ?? writtenGain(spec));
  const reference = spec.reference ?? GROUND;
  const solvable = spec.signal.output !== undefined && spec.gain === undefined && spec.topology !== 'follower';
  if (!solvable) return known === null ? { problem: noGain(spec) } : { gain: known, reference, notes: [] };
  const solution = solveFromOutput(spec, known);
  if (solution === null || outsideSupply(spec, solution.reference)) return { problem: noSolution(spec, solution?.reference) };
  const gain = solution.gain;
  if (spec.topology === 'non-inverting' && gain < 1) return { problem: noSolution(spec, undefined) };
  const solvedGain = `gain ${formatQuantity(gain, 'V/V', { digits: 5 })} solved from signal.output`;
  const gainNote = known === null ? [solvedGain] : [];
  if (spec.reference !== undefined) return { gain, reference, notes: gainNote };
  const text = formatQuantity(solution.reference, 'V', { digits: 4 });
  const solved = solvedReference(solution.reference, spec.supply.nominal, text);
  return { gain, reference: solved, notes: [...gainNote, `reference ${solved.kind === 'ground' ? 'ground' : text} solved from signal.output`] };
}

function outsideSupply(spec: StageSpec, reference: number): boolean {
  return spec.reference === undefined && (reference < -1e-9 * spec.supply.nominal || reference > spec.supply.nominal);
}

function noGain(spec: StageSpec): Problem {
  return contradiction(spec, {
    code: 'S208',
    paths: ['topology'],
    message: `the gain of the ${spec.topology} stage is not given`,
    fix: 'write gain: 8, or resistors: {feedback: 70 kΩ, input: 10 kΩ}, or signal.output to have gain and reference solved',
  });
}

function noSolution(spec: StageSpec, reference: number | undefined): Problem {
  const why =
    reference === undefined ? 'no gain of this topology does it' : `it would need a reference of ${formatQuantity(reference, 'V', { digits: 4 })}, outside the supply`;
  return contradiction(spec, {
    code: 'S205',
    paths: ['signal.output', 'signal.input', 'signal.amplitude', 'signal.differential', 'signal.positive'],
    message: `no ${spec.topology} stage maps this input onto output ${spec.signal.output?.text ?? ''}: ${why}`,
    fix: 'write the gain and the reference, or another output range',
  });
}

interface Fitted {
  readonly circuit: Circuit;
  readonly fitNotes: readonly string[];
}

function circuitOf(spec: StageSpec, settled: Settled): Fitted | { readonly problems: readonly Problem[] } {
  const around = surroundingsOf(spec, settled.reference);
  if (spec.topology === 'follower') return { circuit: follower(around), fitNotes: [] };
  const fitted = fitResistors(spec, settled.gain);
  if (!fitted.ok) return { problems: fitted.problems };
  return { circuit: WITH_RESISTORS[spec.topology](fitted.resistors, around), fitNotes: fitted.notes };
}

function assemble(spec: StageSpec, made: Settled & Fitted): Stage {
  const { circuit, reference } = made;
  const drive = excitation(spec.signal);
  const corners = { circuit, excitation: drive, supply: spec.supply, reference, load: spec.load ?? null };
  const all = vertices(corners);
  const frequency = spec.signal.frequency?.top ?? null;
  const temperature = spec.temperature ?? { min: 25, nominal: 25, max: 25 };
  const outputs = all.map((vertex) => vertex.output);
  const pins = all.map((vertex) => vertex.commonMode);
  return {
    name: spec.name ?? null,
    topology: spec.topology,
    coupling: spec.signal.coupling,
    supply: { min: spec.supply.min, nominal: spec.supply.nominal, max: spec.supply.max },
    supplyPeak: spec.supplyPeak?.value ?? spec.supply.max,
    temperature: { min: temperature.min, nominal: temperature.nominal, max: temperature.max },
    gain: circuit.gain,
    noiseGain: circuit.noiseGain,
    dcNoiseGain: circuit.dcNoiseGain,
    resistors: circuit.resistors satisfies StageResistors | null,
    vertices: all,
    peaks: currentPeaks(corners, frequency),
    output: { min: Math.min(...outputs), max: Math.max(...outputs) },
    outputNominal: nominalOutput(circuit, drive, referenceAt(reference, spec.supply.nominal, 'nominal')),
    commonMode: { min: Math.min(...pins), max: Math.max(...pins) },
    outputPeak: largestPeak(circuit, drive),
    frequency,
    seriesPositive: circuit.seriesPositive,
    seriesNegative: circuit.seriesNegative,
    resistorTolerance: toleranceOf(spec),
    sourceSpread: spec.signal.coupling === 'ac' ? 0 : (spec.source?.resistance.value ?? 0) * (spec.source?.tolerance?.value ?? 0),
    load: spec.load === undefined ? null : { resistance: spec.load.resistance?.value ?? null, to: spec.load.to, capacitance: spec.load.capacitance?.value ?? 0 },
    loadConductance: spec.load?.resistance === undefined ? 0 : 1 / spec.load.resistance.value,
    networkConductance: circuit.networkConductance,
    resistorRejection: circuit.resistorRejection,
    asked: { limits: spec.limits, wishes: spec.wishes, margins: spec.margins, avoid: spec.avoid },
    referenceTolerance: reference.value.nominal === 0 ? 0 : (reference.value.max - reference.value.min) / 2 / reference.value.nominal,
    referenceResistance: reference.resistance?.value ?? 0,
    cautions: gainCautions(spec, circuit),
    assumptions: assumptionsOf(spec, circuit, [...made.notes, ...made.fitNotes]),
  };
}

function nominalOutput(circuit: Circuit, drive: Excitation, reference: number): { min: number; max: number } {
  const outputs = drive.points.map((point) => circuit.nominal.output(point, reference));
  return { min: Math.min(...outputs), max: Math.max(...outputs) };
}

/** Half the output span at one corner; the corner with the highest gain has the largest. The reference does not change it. */
function largestPeak(circuit: Circuit, drive: Excitation): number {
  const peaks = circuit.corners.map((corner) => {
    const outputs = drive.points.map((point) => corner.output(point, 0));
    return (Math.max(...outputs) - Math.min(...outputs)) / 2;
  });
  return Math.max(...peaks);
}
