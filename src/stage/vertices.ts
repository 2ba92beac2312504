import { edgePeakSlewRate } from '../formulas/edges.js';
import type { LoadSpec, ReferenceSpec } from '../spec/spec.js';
import type { Circuit, RatioCorner } from './circuit.js';
import { moved, type Excitation } from './excitation.js';
import { referenceEnds } from './reference.js';
import type { CurrentPeak, InputPoint, Span, Vertex } from './stage.js';

/** What the corners are enumerated over. */
export interface Corners {
  readonly circuit: Circuit;
  readonly excitation: Excitation;
  readonly supply: Span;
  readonly reference: ReferenceSpec;
  readonly load: LoadSpec | null;
}

interface Rails {
  readonly supply: number;
  readonly reference: number;
}

/** Every corner of supply, reference, resistor ratios and signal (output and pins are multilinear or monotone in all of them: exact extremes are at the corners). */
export function vertices(corners: Corners): Vertex[] {
  return rails(corners).flatMap((rail) =>
    corners.circuit.corners.flatMap((ratio) =>
      corners.excitation.points.map((inputs) => vertexAt(corners, { ...rail, ratio, inputs })),
    ),
  );
}

/** How the output moves: as a sine of this top frequency (Hz; null: not said), or in steps (V) with edges (10..90 %, s; null: not said). */
export type Motion =
  | { readonly kind: 'sine'; readonly frequency: number | null }
  | {
      readonly kind: 'edge';
      readonly step: number;
      readonly edge: number | null;
      /** How the edge runs: decaying into its end, or straight as an amplifier slews. */
      readonly form: 'singlePole' | 'ramp';
      /** Where the edge starts at worst, from the centre against its direction, as a share of the amplitude: 1 at the other end. */
      readonly start: number;
    };

/** Peak output currents at every corner of supply and reference, nominal resistors: resistive, and what charges the capacitances of load and network. */
export function currentPeaks(corners: Corners, motion: Motion): CurrentPeak[] {
  const loading = loadingOf(corners, motion);
  return rails(corners).map((rail) => {
    const at = (inputs: InputPoint): Vertex => vertexAt(corners, { ...rail, ratio: corners.circuit.nominal, inputs });
    const { centre, resistive, peak } = amplitudes(corners.excitation, at);
    return { ...rail, centre, swing: swingOf(motion, { resistive: resistive + loading.conductance * peak, peak, capacitance: loading.capacitance }) };
  });
}

/** Of a sine the network's own capacitors count too; what they take in an edge the filter makes itself is left out. */
function loadingOf({ circuit, load }: Corners, motion: Motion): { conductance: number; capacitance: number } {
  const capacitance = load?.capacitance?.value ?? 0;
  if (motion.kind === 'edge' || motion.frequency === null) return { conductance: 0, capacitance };
  const own = circuit.capacitiveLoading?.(motion.frequency);
  return { conductance: own?.conductance ?? 0, capacitance: capacitance + (own?.capacitance ?? 0) };
}

/** Resistive current (A) at the centre of the signal, its amplitude and that of the output (V) about it. */
function amplitudes({ points, centre, steps }: Excitation, at: (inputs: InputPoint) => Vertex): { centre: number; resistive: number; peak: number } {
  if (steps.length === 0) {
    const ends = points.map(at);
    const [currents, outputs] = [ends.map(current), ends.map(({ output }) => output)];
    const half = (values: readonly number[]): number => (Math.max(...values) - Math.min(...values)) / 2;
    return { centre: (Math.max(...currents) + Math.min(...currents)) / 2, resistive: half(currents), peak: half(outputs) };
  }
  const middle = at(centre);
  const ends = steps.map((step) => at(moved(centre, step)));
  return {
    centre: current(middle),
    resistive: sum(ends.map((end) => Math.abs(current(end) - current(middle)))),
    peak: sum(ends.map((end) => Math.abs(end.output - middle.output))),
  };
}

/** Sine: the two are 90° apart. Edge: it is steepest where it starts, with the resistive current still at the other end. */
function swingOf(motion: Motion, { resistive, peak, capacitance }: { resistive: number; peak: number; capacitance: number }): number {
  if (motion.kind === 'sine') return Math.hypot(resistive, 2 * Math.PI * (motion.frequency ?? 0) * capacitance * peak);
  if (motion.edge === null || capacitance === 0) return resistive;
  return Math.max(resistive, capacitance * edgePeakSlewRate(motion.step, motion.edge, motion.form) - motion.start * resistive);
}

function rails(corners: Corners): Rails[] {
  const { min, max } = corners.supply;
  return (min === max ? [min] : [min, max]).flatMap((supply) =>
    referenceEnds(corners.reference, supply).map((reference) => ({ supply, reference })),
  );
}

function vertexAt(corners: Corners, at: Rails & { ratio: RatioCorner; inputs: InputPoint }): Vertex {
  const { circuit, load } = corners;
  const output = at.ratio.output(at.inputs, at.reference, at.supply);
  const commonMode = at.ratio.commonMode(at.inputs, at.reference, at.supply);
  const resistance = load?.resistance?.value;
  return {
    supply: at.supply,
    reference: at.reference,
    inputs: at.inputs,
    output,
    commonMode,
    loadCurrent: resistance === undefined ? 0 : (output - loadEnd(load, at)) / (resistance + (load?.isolation?.value ?? 0)),
    networkCurrent:
      circuit.networkCurrent?.({ inputs: at.inputs, output, reference: at.reference, supply: at.supply }) ??
      (output - circuit.networkEnd(commonMode, at.reference)) * circuit.networkConductance,
  };
}

/** Voltage at the far end of the load. */
function loadEnd(load: LoadSpec | null, at: Rails): number {
  if (load?.to === 'supply') return at.supply;
  if (load?.to === 'reference') return at.reference;
  return 0;
}

const current = (vertex: Vertex): number => vertex.loadCurrent + vertex.networkCurrent;
const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
