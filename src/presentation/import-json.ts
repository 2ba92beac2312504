import type { Problem } from '../quantities/problem.js';
import type { ListDifference } from './import-difference.js';
import type { StageChange } from './import-stages.js';
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
  /** Against the list before; only when the two were compared. */
  readonly difference?: ListDifference;
  /** Saved stages before and after; only when there are some and the list was compared. */
  readonly stages?: readonly StageChange[];
  /** Only with --patch: cells and parts that were filled, and the list they were added to. */
  readonly patch?: { readonly cells: number; readonly parts: number; readonly list: string };
  /** Only when refused by a guard: the list reads, but changes more than it may without a word. */
  readonly held?: true;
  /** Only when refused for its cells: how many cells of how many parts stand in the way. */
  readonly refused?: { readonly cells: number; readonly parts: number };
}

export function importJson({ outcome, file, sha256, counts, problems, difference, stages, held, refused, patch }: ImportReport): string {
  return document('import', {
    outcome,
    file,
    sha256,
    counts,
    ...(patch === undefined ? {} : { patch }),
    ...(refused === undefined ? {} : { refused }),
    ...(held === undefined ? {} : { held }),
    problems: problems.map(problemJson),
    ...(difference === undefined ? {} : { difference }),
    ...(stages === undefined ? {} : { stages }),
  });
}
