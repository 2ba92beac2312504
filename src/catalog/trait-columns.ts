import { compareFigures } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import { isParameter, pieceOf, TRAITS, type Piece, type Trait } from '../parts/traits.js';
import { FIGURE_COLUMNS, IDENTITY_COLUMNS, PART_COLUMNS } from './part-columns.js';
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

/** The piece of a part whose row has these cells in the columns of the trait. */
export function pieceFrom(trait: Trait, cells: readonly Cell[]): Piece {
  const columns = TRAIT_COLUMNS.get(trait) ?? [];
  if (!isParameter(trait)) {
    const row = new Array<Cell>(PART_COLUMNS.length).fill(null);
    columns.forEach((column, at) => { row[column] = cells[at] ?? null; });
    return pieceOf({ ...identityOf(row), figures: [] }, trait);
  }
  const figures: Figure[] = [];
  for (const [at, cell] of cells.entries()) {
    const figureColumn = cell === null ? undefined : FIGURE_COLUMNS[(columns[at] ?? 0) - IDENTITY_COLUMNS.length];
    if (cell !== null && figureColumn !== undefined) addFigures(figures, figureColumn, cell);
  }
  return { figures: figures.length < 2 ? figures : figures.sort(compareFigures) };
}
