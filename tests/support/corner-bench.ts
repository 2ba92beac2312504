import { corners } from './corners.js';
import type { Bench } from './netlists.js';

/** Resistors of a bench that have a tolerance; the resistance of the source is exact unless it is given one. */
const FITTED = ['feedback', 'input', 'positiveInput', 'toReference'] as const;

/** The bench with every fitted resistor at one end of its tolerance (fraction) or the other: all 2ⁿ of them. */
export function cornerBenches(bench: Bench, tolerance: number, sourceTolerance = 0): Bench[] {
  const names = [...FITTED, ...(sourceTolerance > 0 ? (['source'] as const) : [])].filter((name) => bench[name] !== undefined);
  return corners(names.length).map((signs) => {
    const moved = names.map((name, k) => [name, bench[name]! * (1 + signs[k]! * (name === 'source' ? sourceTolerance : tolerance))] as const);
    return { ...bench, ...Object.fromEntries(moved) };
  });
}
