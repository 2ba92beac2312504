import type { FieldKind } from '../quantities/kinds.js';
import { parseQuantity } from '../quantities/parse.js';

export interface UnitFault {
  readonly kind: 'problem';
  readonly reason: string;
}

/** Why a unit cannot stand over figures of this kind; null when it can, or when there is none. */
export function unitFault(unit: string | null, field: FieldKind, words: string): UnitFault | null {
  if (unit === null) return null;
  const result = parseQuantity('1', field, { headerUnit: unit });
  // One of the unit may be an implausible amount (1 F, 1 V/s) in a unit that is right.
  if (result.ok || result.problem.code === 'Q010') return null;
  return { kind: 'problem', reason: `(${unit}) is not a unit of ${words}: ${result.problem.message}` };
}
