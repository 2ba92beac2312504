import type { Part } from '../parts/part.js';
import type { ScaledColumn } from './scaling.js';

/** What a new list may only do when that is said in so many words. */
export const GUARDS = ['removed', 'scaled', 'lifecycle', 'older'] as const;
export type GuardName = (typeof GUARDS)[number];

/** What stands against a list, in numbers; the words are made where they are shown. */
export type Guard =
  /** More than a fifth of the list in force is gone. */
  | { readonly name: 'removed'; readonly removed: number; readonly of: number }
  /** Whole columns moved by a power of ten. */
  | { readonly name: 'scaled'; readonly columns: readonly ScaledColumn[] }
  /** The lifecycle of many parts got better, which seldom happens to one. */
  | { readonly name: 'lifecycle'; readonly better: readonly string[]; readonly of: number }
  /** The same bytes were in force before, and another list since. */
  | { readonly name: 'older'; readonly since: string };

/** What the guards look at. */
export interface Guarded {
  /** Parts of the list in force. */
  readonly inForce: number;
  readonly removed: number;
  readonly scaled: readonly ScaledColumn[];
  readonly lifecycle: { readonly better: readonly string[]; readonly known: number };
  /** File in force, when the new one is older than it. */
  readonly olderThan: string | null;
}

/** More than this part of a list. */
const MANY = 0.2;
/** A single part may well be made again. */
const BULK = 2;

/** Every guard a list runs into, the one that explains most first. */
export function guardsOf({ inForce, removed, scaled, lifecycle, olderThan }: Guarded): Guard[] {
  const guards: Guard[] = [];
  if (olderThan !== null) guards.push({ name: 'older', since: olderThan });
  if (removed > MANY * inForce) guards.push({ name: 'removed', removed, of: inForce });
  if (scaled.length > 0) guards.push({ name: 'scaled', columns: scaled });
  const { better, known } = lifecycle;
  if (better.length >= BULK && better.length > MANY * known) guards.push({ name: 'lifecycle', better, of: known });
  return guards;
}

/** From the end of its life back towards the middle. A preliminary part that becomes active is the ordinary course. */
export function isLifecycleBetter(before: Part, after: Part): boolean {
  const [was, now] = [before.lifecycle, after.lifecycle];
  return was !== null && now !== null && was in STANDING && now in STANDING && (STANDING[now] ?? 0) > (STANDING[was] ?? 0);
}

/** Higher is longer to live. */
const STANDING: Readonly<Record<string, number>> = { obsolete: 0, 'last-time-buy': 1, nrnd: 2, active: 3 };
