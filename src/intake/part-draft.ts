import type { Figure } from '../parts/figures.js';
import type { Part, Tier } from '../parts/part.js';
import type { CellFault } from './cell-fault.js';
import type { ListColumn } from './list.js';
import type { RailWords } from './rail-words.js';
import { slotOf } from './slot.js';

type Mutable<T> = { -readonly [Key in keyof T]: T[Key] };

/** A part while its cells are being read. */
export type Draft = Mutable<Omit<Part, 'figures'>> & { figures: Figure[] };

export type CellReport = (fault: CellFault, severity: 'error' | 'warning') => void;

/** Reads one cell into the draft, or reports what is wrong with it. */
export type CellReader = (draft: Draft, cell: string, report: CellReport) => void;

/** A part about which nothing is known yet. */
export function emptyDraft(tier: Tier): Draft {
  return {
    id: '', tier, description: null, status: null, lifecycle: null, package: null, channels: null, qualification: null,
    class: null, family: null, price: null, phaseReversal: null, inputClamp: null, inputType: null, crossoverFree: null, figures: [],
  };
}

/** A figure and the column it stands in. */
export interface PlacedFigure {
  readonly figure: Figure;
  readonly column: ListColumn;
}

/** The figures of a part while it is read, each with the column it stands in; one a slot. */
export class DraftFigures {
  readonly figures: Figure[] = [];
  /** `columns[i]` is that of `figures[i]`. */
  readonly columns: ListColumn[] = [];
  /** Where in the lists a slot is; null where no two columns name the same one (`standInOrder`). */
  readonly #slots: Map<string, number> | null;
  /** Words about the rails, with the column they stand in. */
  rails: { readonly words: RailWords; readonly column: ListColumn } | null = null;

  constructor(isInOrder: boolean) {
    this.#slots = isInOrder ? null : new Map<string, number>();
  }

  /** Keeps a figure; the one that is in its slot already when there is another, which then stays. */
  add(figure: Figure, column: ListColumn): PlacedFigure | null {
    const earlier = this.#earlier(figure);
    if (earlier !== null) return earlier;
    this.figures.push(figure);
    this.columns.push(column);
    return null;
  }

  /** True when a figure of the parameter was read. */
  has(parameter: Figure['parameter']): boolean {
    return this.figures.some((figure) => figure.parameter === parameter);
  }

  #earlier(figure: Figure): PlacedFigure | null {
    if (this.#slots === null) return null;
    const slot = slotOf(figure);
    const at = this.#slots.get(slot);
    if (at === undefined) this.#slots.set(slot, this.figures.length);
    const [known, column] = at === undefined ? [] : [this.figures[at], this.columns[at]];
    return known === undefined || column === undefined ? null : { figure: known, column };
  }
}
