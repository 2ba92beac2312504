import type { Figure } from '../parts/figures.js';
import type { Part, Tier } from '../parts/part.js';
import type { CellFault } from './cell-fault.js';

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
    class: null, family: null, price: null, phaseReversal: null, inputClamp: null, inputType: null, figures: [],
  };
}
