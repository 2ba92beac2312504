import type { Sense } from './finding.js';

const RELATIVE = 1e-9;
const ABSOLUTE = 1e-12;

/** Met exactly is a pass: equal within 1e-9 relative or 1e-12 absolute counts as met. */
export function meets(required: number, offered: number, sense: Sense): boolean {
  if (equal(required, offered)) return true;
  return sense === 'at-least' ? offered > required : offered < required;
}

export function equal(a: number, b: number): boolean {
  if (a === b) return true;
  if (!Number.isFinite(a) || !Number.isFinite(b)) return false;
  const difference = Math.abs(a - b);
  return difference <= ABSOLUTE || difference <= RELATIVE * Math.max(Math.abs(a), Math.abs(b));
}

/** What is left, negative when short. */
export function spareOf(required: number, offered: number, sense: Sense): number {
  return sense === 'at-least' ? offered - required : required - offered;
}

/** offered/required for at-least, required/offered for at-most; null where the ratio says nothing. */
export function marginOf(required: number, offered: number, sense: Sense): number | null {
  const ratio = sense === 'at-least' ? offered / required : required / offered;
  return Number.isFinite(ratio) ? ratio : null;
}
