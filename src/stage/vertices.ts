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

/** Every corner of supply, reference, resistor ratios and signal (method.md 0, rule 2: exact extremes are at the corners). */
export function vertices(corners: Corners): Vertex[] {
  return rails(corners).flatMap((rail) =>
    corners.circuit.corners.flatMap((ratio) =>
      corners.excitation.points.map((inputs) => vertexAt(corners, { ...rail, ratio, inputs })),
    ),
  );
}

/** Peak output currents at every corner of supply and reference, nominal resistors (method.md 6). `frequency` in Hz, null without one. */
export function currentPeaks(corners: Corners, frequency: number | null): CurrentPeak[] {
  const capacitance = corners.load?.capacitance?.value ?? 0;
  return rails(corners).map((rail) => {
    const at = (inputs: InputPoint): Vertex => vertexAt(corners, { ...rail, ratio: corners.circuit.nominal, inputs });
    const centre = at(corners.excitation.centre);
    const ends = corners.excitation.steps.map((step) => at(moved(corners.excitation.centre, step)));
    const resistive = sum(ends.map((end) => Math.abs(current(end) - current(centre))));
    const peak = sum(ends.map((end) => Math.abs(end.output - centre.output)));
    const capacitive = 2 * Math.PI * (frequency ?? 0) * capacitance * peak;
    return { ...rail, centre: current(centre), swing: Math.hypot(resistive, capacitive) };
  });
}

function rails(corners: Corners): Rails[] {
  const { min, max } = corners.supply;
  return (min === max ? [min] : [min, max]).flatMap((supply) =>
    referenceEnds(corners.reference, supply).map((reference) => ({ supply, reference })),
  );
}

function vertexAt(corners: Corners, at: Rails & { ratio: RatioCorner; inputs: InputPoint }): Vertex {
  const { circuit, load } = corners;
  const output = at.ratio.output(at.inputs, at.reference);
  const commonMode = at.ratio.commonMode(at.inputs, at.reference);
  const resistance = load?.resistance?.value;
  return {
    supply: at.supply,
    reference: at.reference,
    inputs: at.inputs,
    output,
    commonMode,
    loadCurrent: resistance === undefined ? 0 : (output - loadEnd(load, at)) / resistance,
    networkCurrent: (output - circuit.networkEnd(commonMode, at.reference)) * circuit.networkConductance,
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
