import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import { referenceAt } from './reference.js';

/** What stands at the outer ends of the stage, as a drawing shows it; the numbers it is judged with are elsewhere. SI units. */
export interface StageEnds {
  readonly reference: 'ground' | 'mid-supply' | 'voltage';
  /** Of the reference at the nominal supply, V. */
  readonly referenceVoltage: number;
  /** Capacitance across the reference, F; 0 without. */
  readonly bypass: number;
  /** Shunt, Ω, nominal; null without. */
  readonly shunt: number | null;
  /** Where the legs of a summing stage come from, by name, in the order written. */
  readonly legs: readonly { readonly name: string; readonly from: 'signal' | 'supply' | 'reference' }[];
}

export function endsOf(spec: StageSpec, reference: ReferenceSpec): StageEnds {
  return {
    reference: reference.kind,
    referenceVoltage: referenceAt(reference, spec.supply.nominal, 'nominal'),
    bypass: reference.bypass?.value ?? 0,
    shunt: spec.shunt?.resistance.value ?? null,
    legs: (spec.legs ?? []).map(({ name, level }) => ({ name, from: level.kind })),
  };
}
