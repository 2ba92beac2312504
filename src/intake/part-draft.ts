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

/** The figures of a part while it is read, each with the column it stands in; one a slot. */
export class DraftFigures {
  readonly #sources = new Map<string, { readonly figure: Figure; readonly column: ListColumn }>();
  /** Words about the rails, with the column they stand in. */
  rails: { readonly words: RailWords; readonly column: ListColumn } | null = null;

  /** Keeps a figure; the one that is in its slot already when there is another, which then stays. */
  add(figure: Figure, column: ListColumn): { readonly figure: Figure; readonly column: ListColumn } | null {
    const slot = slotOf(figure);
    const earlier = this.#sources.get(slot);
    if (earlier !== undefined) return earlier;
    this.#sources.set(slot, { figure, column });
    return null;
  }

  /** True when a figure of the parameter was read. */
  has(parameter: Figure['parameter']): boolean {
    for (const { figure } of this.#sources.values()) if (figure.parameter === parameter) return true;
    return false;
  }

  all(): { readonly figure: Figure; readonly column: ListColumn }[] {
    return [...this.#sources.values()];
  }
}
