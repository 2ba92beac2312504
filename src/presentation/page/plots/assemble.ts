import type { Curves } from '../../../curves/index.js';
import { csvText } from '../../csv-cell.js';
import { sheetSvg } from '../drawing/svg.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';

/** A plot before it is put together. */
export interface Plot extends Pick<Figure, 'id' | 'title' | 'finding' | 'table'> {
  readonly width: number;
  readonly height: number;
  readonly body: string;
  /** Header and rows, SI units, unrounded; null: an empty cell. */
  readonly csv: readonly (readonly (string | number | null)[])[];
}

/** What every plot is given: the curves of the chosen part are reckoned once for all of them. */
export interface Drawing extends PageInput {
  readonly curves: Curves | null;
}

/** Width at which every plot has its text at full size: that of a printed page. */
export const WIDTH = 640;

export function figureOf({ id, title, finding, table, width, height, body, csv }: Plot): Figure {
  return { id, title, finding, table, svg: sheetSvg({ kind: 'plot', title, description: finding, width, height, body }), csv: csvText(csv) };
}
