import type { Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';

/** Why a unit cannot stand in the header of this parameter; null when it can. Any unit of its kind may: `(nA)` as well as `(pA)`. */
export function readHeaderUnit(unit: string, parameter: Parameter): string | null {
  const { field, headerUnit } = PARAMETERS[parameter];
  if (unit === '') return `the parentheses are empty; ${headerUnit} is usual`;
  const result = parseQuantity('1', field, { headerUnit: unit });
  // One of the unit may be an implausible amount (1 F, 1 V/s) in a unit that is right.
  if (result.ok || result.problem.code === IMPLAUSIBLE) return null;
  return `(${unit}) is not a unit of ${PARAMETERS[parameter].words}: ${result.problem.message}`;
}

const IMPLAUSIBLE = 'Q010';
