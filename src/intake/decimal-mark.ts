import type { Delimiter, ListColumn, ListRecord } from './list.js';

/** What is settled about the decimal mark: null when each cell is read by itself. */
export type DecimalRule = 'point' | 'comma' | null;

export interface DecimalMark {
  readonly mark: 'point' | 'comma';
  readonly rule: DecimalRule;
  /** Cells that can be read with this mark only, and with the other only. */
  readonly proofs: number;
  readonly against: number;
  /** The first proof, as written. */
  readonly sample: string | null;
  readonly given: boolean;
}

/**
 * The decimal mark of a whole file. A comma only where the separator is not one and a cell proves it: no grouping ends in one, two
 * or four digits, or starts with 0. A file that also proves a point has no mark of its own, and each cell is read by itself.
 */
export function decimalMark(delimiter: Delimiter, columns: readonly ListColumn[], { rows, given }: { readonly rows: readonly ListRecord[]; readonly given?: 'point' | 'comma' | undefined }): DecimalMark {
  const numeric = columns.filter(({ reading }) => NUMERIC.has(reading.kind));
  const [commas, points] = proofsIn(rows, numeric);
  const isComma = given === 'comma' || (given === undefined && delimiter !== ',' && commas.count > 0 && points.count === 0);
  const [own, other] = isComma ? [commas, points] : [points, commas];
  return { mark: isComma ? 'comma' : 'point', rule: given ?? (isComma ? 'comma' : null), proofs: own.count, against: other.count, sample: own.first, given: given !== undefined };
}

interface Proofs {
  count: number;
  first: string | null;
}

/** Cells that prove a comma, and a point, row by row. Most cells of a long list have neither mark in them. */
function proofsIn(rows: readonly ListRecord[], numeric: readonly ListColumn[]): [commas: Proofs, points: Proofs] {
  const [commas, points]: [Proofs, Proofs] = [{ count: 0, first: null }, { count: 0, first: null }];
  for (const { cells } of rows) {
    for (const { number } of numeric) {
      const cell = cells[number - 1] ?? '';
      if (cell === '') continue;
      if (cell.includes(',') && COMMA.test(cell)) add(commas, cell);
      if (cell.includes('.') && POINT.test(cell)) add(points, cell);
    }
  }
  return [commas, points];
}

function add(proofs: Proofs, cell: string): void {
  proofs.count += 1;
  proofs.first ??= cell;
}

const NUMERIC: ReadonlySet<string> = new Set(['figure', 'price', 'measured', 'load']);

const COMMA = /(?<![\d.,])(?:0,\d|\d+,(?:\d{1,2}|\d{4,})(?![\d,]))/u;
const POINT = /(?<![\d.,])(?:0\.\d|\d+\.(?:\d{1,2}|\d{4,})(?![\d.]))/u;
