import type { LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';

/** Columns of a part that are not figures, in the order `part-row.ts` writes them. */
export const IDENTITY_COLUMNS = [
  'tier', 'id', 'description', 'status', 'lifecycle', 'package', 'channels', 'qualification', 'class', 'family',
  'price_amount', 'price_currency', 'price_quantity', 'phase_reversal', 'input_clamp', 'input_type', 'crossover_free',
] as const;

export interface FigureColumn {
  readonly parameter: Parameter;
  /** null: the points of the parameter, figures under conditions, as JSON. */
  readonly kind: LimitKind | null;
  readonly name: string;
}

/** One column per parameter and kind for the figure without condition, then one for the points of the parameter. */
export const FIGURE_COLUMNS: readonly FigureColumn[] = (Object.keys(PARAMETERS) as Parameter[]).flatMap((parameter) => [
  ...PARAMETERS[parameter].kinds.map((kind) => ({ parameter, kind, name: `${snake(parameter)}_${kind}` })),
  { parameter, kind: null, name: `${snake(parameter)}_points` },
]);

export const PART_COLUMNS: readonly string[] = [...IDENTITY_COLUMNS, ...FIGURE_COLUMNS.map(({ name }) => name)];

function snake(parameter: string): string {
  return parameter.replace(/[A-Z]/gu, (letter) => `_${letter.toLowerCase()}`);
}
