import type { Draft } from './draft.js';
import { readLimits } from './limits.js';
import type { LimitsSpec, Override, StageSpec } from './spec.js';
import { leafText, type Leaf } from './tree.js';

/** A reading that had no faults, with the draft it was read from and the options it was read under. */
export interface Reading {
  readonly overrides: readonly Override[];
  readonly draft: Draft;
  readonly spec: StageSpec;
}

/**
 * The spec under options that differ from those of a reading in the value of one limit alone: no other field depends on what a limit says,
 * only on whether it is written, so that the limits alone are read again. Null where that does not hold, or where the value is refused.
 */
export function limitMoved(reading: Reading, overrides: readonly Override[]): StageSpec | null {
  const moved = movedIn(reading, overrides);
  if (moved === null || limitsIn(reading.draft) === null) return null;
  const leaf: Leaf = { kind: 'leaf', text: moved.text.trim(), at: { option: moved.option } };
  const limits = limitsIn({ ...reading.draft, fields: new Map(reading.draft.fields).set(moved.path, leaf) });
  return limits === null ? null : { ...reading.spec, limits };
}

/** A map, a list or a quoted text is read as YAML. */
const NOT_PLAIN = /^\s*[[{"']/u;

function movedIn({ overrides: before, draft }: Reading, overrides: readonly Override[]): Override | null {
  const [last, was] = [overrides.at(-1), before.at(-1)];
  if (last === undefined || last.path !== was?.path || last.option !== was.option || overrides.length !== before.length) return null;
  if (!last.path.startsWith('limits.') || NOT_PLAIN.test(last.text) || leafText(draft.fields, last.path) !== was.text.trim()) return null;
  return overrides.slice(0, -1).every((one, at) => one === before[at]) ? last : null;
}

/** The limits of a draft; null where there is anything to say about them. */
function limitsIn(draft: Draft): LimitsSpec | null {
  const told = { ...draft, problems: [], notes: [] };
  const limits = readLimits(told);
  return told.problems.length + told.notes.length > 0 ? null : limits;
}
