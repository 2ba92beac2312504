import { formatQuantity } from '../quantities/format.js';
import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Circuit } from './circuit.js';
import type { InputPoint } from './stage.js';

/**
 * Half of the supply carries half of its ripple into the stage, whatever the amplifier: α·A/|1 + jωRC| at the reference, times the gain
 * from there to the output at DC, which is the largest it has (own algebra).
 */
export function rippleCautions(spec: StageSpec, circuit: Circuit, { reference, centre }: { readonly reference: ReferenceSpec; readonly centre: InputPoint }): string[] {
  const { supplyRipple: ripple, supply } = spec;
  if (ripple === undefined || reference.kind !== 'mid-supply') return [];
  const at = (volts: number): number => circuit.nominal.output(centre, volts, supply.nominal);
  const gain = Math.abs(at(1) - at(0));
  const timeConstant = spec.signal.coupling === 'ac' ? 0 : (reference.resistance?.value ?? 0) * (reference.bypass?.value ?? 0);
  const passed = (ripple.amplitude.value / 2) * gain / Math.hypot(1, 2 * Math.PI * ripple.frequency.value * timeConstant);
  if (passed === 0) return [];
  const cure = timeConstant > 0 ? 'behind its bypass' : 'which no bypass holds back';
  return [`of the ripple on the supply up to ${formatQuantity(passed, 'V', { round: 'up' })} peak reaches the output through the mid-supply reference, ${cure}, whatever the amplifier; it is not charged to the part`];
}
