import type { Problem } from '../quantities/problem.js';
import type { StageSpec, Topology } from '../spec/spec.js';
import { hazardContradictions } from '../spec/hazard-contradictions.js';
import { supplyContradictions } from '../spec/supply-contradictions.js';
import { makeDifference, makeFollower, makeInverting, makeNonInverting } from './amplifier-makers.js';
import { assumptionsOf, bypassCautions, gainCautions } from './assumptions.js';
import type { Circuit, RatioCorner } from './circuit.js';
import { contradictionsOf } from './contradictions.js';
import { endsOf } from './ends.js';
import type { Excitation } from './excitation.js';
import { capacitorTolerance } from './filter-response.js';
import { gainAgainstResistors, toleranceOf } from './fitted.js';
import { makeHighSideSense } from './high-side-sense.js';
import { makeIntegrator } from './integrator.js';
import { makeLowSideSense } from './low-side-sense.js';
import type { Made, Maker, Settled } from './making.js';
import { makeMultipleFeedback } from './multiple-feedback-low-pass.js';
import { makeOscillator } from './relaxation-oscillator.js';
import { referenceAt, referenceEnds } from './reference.js';
import { rejectionCautions } from './rejection.js';
import { rippleCautions } from './ripple.js';
import { makeSallenKey } from './sallen-key-low-pass.js';
import { settle } from './settle.js';
import type { Stage } from './stage.js';
import { makeSumming } from './summing.js';
import { surroundingsOf } from './surroundings.js';
import { makeTransimpedance } from './transimpedance.js';
import { currentPeaks, vertices, type Corners, type Motion } from './vertices.js';

export type StageResult =
  | { readonly ok: true; readonly stage: Stage }
  | { readonly ok: false; readonly problems: readonly Problem[] };

const MAKERS: Readonly<Record<Topology, Maker>> = {
  follower: makeFollower,
  'non-inverting': makeNonInverting,
  inverting: makeInverting,
  summing: makeSumming,
  difference: makeDifference,
  transimpedance: makeTransimpedance,
  'low-side-sense': makeLowSideSense,
  'high-side-sense': makeHighSideSense,
  'sallen-key-low-pass': makeSallenKey,
  'multiple-feedback-low-pass': makeMultipleFeedback,
  integrator: makeIntegrator,
  'relaxation-oscillator': makeOscillator,
};

/** The circuit a specification implies, or every contradiction in it. Errors are problems, never exceptions. */
export function buildStage(spec: StageSpec): StageResult {
  const built = impliedBy(spec);
  if (!built.ok) return { ok: false, problems: [...built.problems, ...supplyContradictions(spec), ...hazardContradictions(spec)] };
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
  const making = MAKERS[spec.topology](spec, settled, surroundingsOf(spec, settled.reference));
  if (!making.ok) return making;
  return { ok: true, stage: assemble(spec, settled, making.made) };
}

function assemble(spec: StageSpec, settled: Settled, made: Made): Stage {
  const { reference } = settled;
  const { circuit, excitation: drive } = made;
  const corners = { circuit, excitation: drive, supply: spec.supply, reference, load: spec.load ?? null };
  const all = vertices(corners);
  const outputs = all.map((vertex) => vertex.output);
  const pins = all.map((vertex) => vertex.commonMode);
  const peak = largestPeak(circuit.corners, drive, corners);
  const signalPeak = Math.max(peak, largestPeak(circuit.signalCorners ?? [], drive, corners));
  return {
    ...placeOf(spec),
    ...electrical(circuit),
    ...loadOf(spec),
    vertices: all,
    peaks: currentPeaks(corners, motionOf(spec, made, 2 * peak * drive.stepShare)),
    output: { min: Math.min(...outputs), max: Math.max(...outputs) },
    outputNominal: nominalOutput(circuit, drive, { reference: referenceAt(reference, spec.supply.nominal, 'nominal'), supply: spec.supply.nominal }),
    commonMode: { min: Math.min(...pins), max: Math.max(...pins) },
    outputPeak: peak,
    signalPeak,
    outputStep: 2 * signalPeak * drive.stepShare,
    response: made.response,
    resistorTolerance: toleranceOf(spec),
    capacitorTolerance: hasCapacitors(circuit) ? capacitorTolerance(spec) : 0,
    sourceSpread: spec.signal.coupling === 'ac' ? 0 : (spec.source?.resistance.value ?? 0) * (spec.source?.tolerance?.value ?? 0),
    referenceTolerance: reference.value.nominal === 0 ? 0 : (reference.value.max - reference.value.min) / 2 / reference.value.nominal,
    referenceResistance: reference.resistance?.value ?? 0,
    ends: endsOf(spec, reference),
    asked: askedOf(spec),
    cautions: [...gainCautions(spec, circuit), ...bypassCautions(spec, circuit, { direct: peak, signal: signalPeak }), ...rippleCautions(spec, circuit, { reference, centre: drive.centre }), ...rejectionCautions(spec, circuit, { excitation: drive, reference }), ...made.cautions],
    assumptions: assumptionsOf(spec, circuit, [...settled.notes, ...made.fitNotes]),
  };
}

/** An oscillator, whose network is no linear one, has its timing capacitor. */
function hasCapacitors({ network }: Circuit): boolean {
  return network === null || [network.plus, network.minus].some(({ elements }) => elements.some(({ kind }) => kind === 'capacitor'));
}

/** What stands in the file as it is: name, surroundings, signal. */
function placeOf(spec: StageSpec) {
  const temperature = spec.temperature ?? { min: 25, nominal: 25, max: 25 };
  return {
    name: spec.name ?? null,
    topology: spec.topology,
    coupling: spec.signal.coupling,
    supply: { min: spec.supply.min, nominal: spec.supply.nominal, max: spec.supply.max },
    supplyPeak: spec.supplyPeak?.value ?? spec.supply.max,
    temperature: { min: temperature.min, nominal: temperature.nominal, max: temperature.max },
    frequency: spec.signal.frequency?.top ?? null,
    shape: spec.signal.shape,
    edge: spec.signal.edge?.value ?? null,
    observation: spec.signal.observation?.value ?? null,
  };
}

function electrical(circuit: Circuit) {
  const { gain, gainUnit, noiseGain, dcNoiseGain, resistors, seriesPositive, seriesNegative, networkConductance, resistorRejection, network } = circuit;
  return { gain, gainUnit, noiseGain, dcNoiseGain, resistors, seriesPositive, seriesNegative, networkConductance, resistorRejection, network };
}

function loadOf({ load }: StageSpec): Pick<Stage, 'load' | 'loadConductance'> {
  if (load === undefined) return { load: null, loadConductance: 0 };
  const isolation = load.isolation?.value ?? 0;
  const resistance = load.resistance?.value ?? null;
  return {
    load: { resistance, to: load.to, capacitance: load.capacitance?.value ?? 0, isolation },
    loadConductance: resistance === null ? 0 : 1 / (resistance + isolation),
  };
}

function motionOf(spec: StageSpec, { response, excitation: drive }: Made, step: number): Motion {
  const { shape, edge, frequency } = spec.signal;
  // An oscillator's edges are its amplifier slewing from one level to the other.
  if (response.kind === 'oscillator') return { kind: 'edge', step, edge: response.edge, form: 'ramp', start: 1 };
  if (shape !== 'step' && shape !== 'pulse') return { kind: 'sine', frequency: frequency?.top ?? null };
  // A step may start anywhere between the lowest level and where its own size still ends at the highest.
  return { kind: 'edge', step, edge: edge?.value ?? null, form: 'singlePole', start: 2 * drive.stepShare - 1 };
}

function askedOf(spec: StageSpec): Stage['asked'] {
  const { limits, wishes, margins, avoid, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle } = spec;
  return {
    limits, wishes, margins, avoid, following: following ?? null, converter: converter ?? null, battery: battery ?? null,
    overdrive: overdrive ?? null, sequencing: sequencing ?? null, supplyRipple: supplyRipple ?? null, dutyCycle: dutyCycle ?? null,
  };
}

function nominalOutput(circuit: Circuit, drive: Excitation, at: { reference: number; supply: number }): { min: number; max: number } {
  const outputs = drive.points.map((point) => circuit.nominal.output(point, at.reference, at.supply));
  return { min: Math.min(...outputs), max: Math.max(...outputs) };
}

/**
 * Half the output span at one corner; the corner with the highest gain has the largest. The reference moves all points alike, save
 * where the signal is measured from it (integrator).
 */
function largestPeak(ratios: readonly RatioCorner[], drive: Excitation, { supply, reference }: Pick<Corners, 'supply' | 'reference'>): number {
  const references = drive.steps.length > 0 ? [0] : [supply.min, supply.max].flatMap((volts) => referenceEnds(reference, volts));
  const peaks = references.flatMap((at) =>
    ratios.map((corner) => {
      const outputs = drive.points.map((point) => corner.output(point, at, supply.max));
      return (Math.max(...outputs) - Math.min(...outputs)) / 2;
    }),
  );
  return Math.max(0, ...peaks);
}
