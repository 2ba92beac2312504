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

export interface ImportReport {
  readonly outcome: 'imported' | 'no-change' | 'refused' | 'dry-run' | 'undone';
  readonly file: string;
  readonly sha256: string | null;
  readonly counts: ImportCounts;
  readonly problems: readonly Problem[];
  /** Only when refused: how many cells of how many parts stand in the way. */
  readonly refused?: { readonly cells: number; readonly parts: number };
}

export function importJson({ problems, ...report }: ImportReport): string {
  return document('import', { ...report, problems: problems.map(problemJson) });
}
