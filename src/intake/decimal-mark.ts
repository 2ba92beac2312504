import type { Delimiter, ListColumn, ListRecord } from './list.js';

/**
 * The decimal mark of a whole file. A comma only where the separator is not one and a cell proves it: no grouping ends in one, two
 * or four digits, or starts with 0. A file that also proves a point has no mark of its own, and each cell is read by itself.
 */
export function decimalMark(delimiter: Delimiter, columns: readonly ListColumn[], rows: readonly ListRecord[]): 'point' | 'comma' {
  if (delimiter === ',') return 'point';
  const numeric = columns.filter(({ reading }) => reading.kind === 'figure' || reading.kind === 'price');
  const proves = (proof: RegExp): boolean => rows.some(({ cells }) => numeric.some(({ number }) => proof.test(cells[number - 1] ?? '')));
  return proves(COMMA) && !proves(POINT) ? 'comma' : 'point';
}

const COMMA = /(?<![\d.,])(?:0,\d|\d+,(?:\d{1,2}|\d{4,})(?![\d,]))/u;
const POINT = /(?<![\d.,])(?:0\.\d|\d+\.(?:\d{1,2}|\d{4,})(?![\d.]))/u;
