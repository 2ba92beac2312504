import type { Problem } from '../quantities/problem.js';
import { document } from './json.js';
import { problemJson } from './problem-json.js';

export interface ImportCounts {
  readonly rows: number;
  readonly added: number;
  readonly changed: number;
  readonly removed: number;
  readonly unchanged: number;
}

/** A field of a part that another list says differently: canonical header and cells; null where a list says nothing. */
export interface PartChange {
  readonly part: string;
  readonly field: string;
  readonly was: string | null;
  readonly now: string | null;
}

export interface ImportReport {
  readonly outcome: 'imported' | 'no-change' | 'refused' | 'dry-run' | 'undone';
  readonly file: string;
  readonly sha256: string | null;
  readonly counts: ImportCounts;
  readonly problems: readonly Problem[];
  /** For the text only: what changed, and the ids withdrawn. */
  readonly changes?: readonly PartChange[];
  readonly withdrawn?: readonly string[];
  /** Only when refused: how many cells of how many parts stand in the way. */
  readonly refused?: { readonly cells: number; readonly parts: number };
}

export function importJson({ problems, changes: _changes, withdrawn: _withdrawn, ...report }: ImportReport): string {
  return document('import', { ...report, problems: problems.map(problemJson) });
}
