import type { Problem } from '../quantities/problem.js';
import type { Position } from './spec.js';
import type { Fields } from './tree.js';

/** The written fields while they are gathered and read: file first, then options, then one field after the other. */
export interface Draft {
  readonly fields: Fields;
  readonly positions: Map<string, Position>;
  readonly file: string | undefined;
  /** False when options say it all: fixes are then options, not lines. */
  readonly hasFile: boolean;
  readonly problems: Problem[];
  readonly notes: string[];
  keepFeedback: boolean;
}

export function emptyDraft(file: string | undefined, hasFile: boolean): Draft {
  return { fields: new Map(), positions: new Map(), file, hasFile, problems: [], notes: [], keepFeedback: false };
}
