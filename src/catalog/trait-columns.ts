import { compareFigures } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import { isParameter, pieceOf, TRAITS, type Piece, type Trait } from '../parts/traits.js';
import { FIGURE_COLUMNS, IDENTITY_COLUMNS, PART_COLUMNS, type FigureColumn } from './part-columns.js';
import { addFigures, identityOf, type Cell } from './part-row.js';

/** Columns that are not called as their trait. */
const NAMES: Partial<Record<Trait, string>> = { inputType: 'input_type', inputClamp: 'input_clamp', phaseReversal: 'phase_reversal', crossoverFree: 'crossover_free' };

/** Places in `PART_COLUMNS` of the cells a trait is made of. */
export const TRAIT_COLUMNS: ReadonlyMap<Trait, readonly number[]> = new Map(TRAITS.map((trait) => [trait, columnsOf(trait)]));

function columnsOf(trait: Trait): number[] {
  if (isParameter(trait)) return FIGURE_COLUMNS.flatMap(({ parameter }, at) => (parameter === trait ? [IDENTITY_COLUMNS.length + at] : []));
  const names: readonly string[] = trait === 'price' ? ['price_amount', 'price_currency', 'price_quantity'] : [NAMES[trait] ?? trait];
  return names.map((name) => PART_COLUMNS.indexOf(name));
}

/** Of a parameter: what its cells hold. */
const FIGURES_OF = new Map<Trait, FigureColumn[]>();
for (const column of FIGURE_COLUMNS) FIGURES_OF.set(column.parameter, [...(FIGURES_OF.get(column.parameter) ?? []), column]);

/** The piece of a part whose row has these cells in the columns of the trait. */
export function pieceFrom(trait: Trait, cells: readonly Cell[]): Piece {
  if (!isParameter(trait)) {
    const columns = TRAIT_COLUMNS.get(trait) ?? [];
    const row = new Array<Cell>(PART_COLUMNS.length).fill(null);
    columns.forEach((column, at) => { row[column] = cells[at] ?? null; });
    return pieceOf({ ...identityOf(row), figures: [] }, trait);
  }
  const figures: Figure[] = [];
  const columns = FIGURES_OF.get(trait) ?? [];
  for (let at = 0; at < columns.length; at += 1) {
    const [column, cell] = [columns[at], cells[at] ?? null];
    if (cell !== null && column !== undefined) addFigures(figures, column, cell);
  }
  return { figures: figures.length < 2 ? figures : figures.sort(compareFigures) };
}
