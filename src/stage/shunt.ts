import type { ShuntSpec } from '../spec/spec.js';

/** The shunt at both ends of its tolerance, Ω; once when it is exact. */
export function shuntEnds({ resistance, tolerance }: ShuntSpec): number[] {
  const share = tolerance?.value ?? 0;
  return share === 0 ? [resistance.value] : [resistance.value * (1 - share), resistance.value * (1 + share)];
}
