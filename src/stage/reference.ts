import type { ReferenceSpec } from '../spec/spec.js';

/** The reference voltages that go with one supply voltage: its ends, once when they are equal. Mid-supply moves with the supply. */
export function referenceEnds(reference: ReferenceSpec, supply: number): number[] {
  const low = referenceAt(reference, supply, 'min');
  const high = referenceAt(reference, supply, 'max');
  return low === high ? [low] : [low, high];
}

/** One end (or the nominal value) of the reference at a supply voltage, volts. */
export function referenceAt(reference: ReferenceSpec, supply: number, end: 'min' | 'nominal' | 'max'): number {
  if (reference.kind === 'ground') return 0;
  if (reference.kind === 'mid-supply') return (supply / 2) * reference.value[end];
  return reference.value[end];
}

export const GROUND: ReferenceSpec = { kind: 'ground', value: { min: 0, nominal: 0, max: 0, text: 'ground' } };
