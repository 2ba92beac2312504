import { compareFigures } from '../parts/figure-order.js';
import type { ListColumn } from './list.js';

/** Columns whose cells hold figures that no header names one by one. */
const SEVERAL: ReadonlySet<string> = new Set(['measured', 'rail', 'load', 'known']);

/**
 * Each column with figures names one, in canonical order, as in the canonical CSV: then no cell can say what another has said, and
 * the figures of a row are in order as they are read.
 */
export function standInOrder(columns: readonly ListColumn[]): boolean {
  if (columns.some(({ reading }) => SEVERAL.has(reading.kind))) return false;
  const named = columns.flatMap(({ reading }) => (reading.kind === 'figure' ? [{ parameter: reading.parameter, kind: reading.limit, condition: reading.condition }] : []));
  return named.every((one, at) => {
    const next = named[at + 1];
    return next === undefined || compareFigures(one, next) < 0;
  });
}
