import { formatDecibels, formatPercent, formatQuantity } from '../quantities/format.js';
import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Circuit } from './circuit.js';
import type { Excitation } from './excitation.js';
import { referenceEnds } from './reference.js';
import type { InputPoint } from './stage.js';

/** Less than this share of the swing is not worth a word (own choice); of no limit, so that the stage is the same whatever is allowed. */
const WORTH_TELLING = 0.001;

/**
 * What the resistors of a difference stage let through of what both inputs share. The demands on head-room count it, as they stand at the
 * corners of the resistors; the DC error, which is the amplifier's, does not. Own algebra: with both inputs at V the output is
 * Vref + Acm·(V − Vref); Acm by Pallas-Areny & Webster, IEEE Trans. Instrum. Meas. 40(4), 1991 (from memory).
 */
export function rejectionCautions(spec: StageSpec, circuit: Circuit, { excitation, reference }: { readonly excitation: Excitation; readonly reference: ReferenceSpec }): string[] {
  const { resistorRejection: rejection, resistors } = circuit;
  if (rejection === null || resistors === null || !Number.isFinite(rejection)) return [];
  const shared = excitation.points.map(sharedBy);
  const passed = largestShift(spec, circuit, { shared, reference });
  const outputs = excitation.points.map((point) => circuit.nominal.output(point, referenceEnds(reference, spec.supply.nominal)[0] ?? 0, spec.supply.nominal));
  if (passed <= WORTH_TELLING * (Math.max(...outputs) - Math.min(...outputs))) return [];
  return [`the network with its resistors of ±${formatPercent(resistors.tolerance)} leaves ${formatDecibels(rejection)} of common-mode rejection: the voltage both inputs share moves the output by up to ${formatQuantity(passed, 'V', { round: 'up' })}, whatever the amplifier; it is not in the DC error`];
}

/** Both inputs where their middle is; a shunt without current. */
function sharedBy(point: InputPoint): InputPoint {
  const { positive, negative } = point;
  if (positive === undefined || negative === undefined) return { ...point, current: 0 };
  const middle = (positive + negative) / 2;
  return { ...point, positive: middle, negative: middle };
}

function largestShift({ supply }: StageSpec, { corners }: Circuit, { shared, reference }: { readonly shared: readonly InputPoint[]; readonly reference: ReferenceSpec }): number {
  const shifts = [supply.min, supply.max].flatMap((volts) =>
    referenceEnds(reference, volts).flatMap((at) => corners.flatMap((corner) => shared.map((point) => Math.abs(corner.output(point, at, volts) - at)))),
  );
  return Math.max(...shifts);
}
