import type { JudgedPart } from '../screening/index.js';
import { meets } from '../verdicts/compare.js';
import type { Verdict } from '../verdicts/verdict.js';
import { quickXplain } from './quick-xplain.js';

/** One of the checks that together rule out every part. */
export interface Blamed {
  readonly check: string;
  /** Of the parts that do not fit, how many this check alone leaves. */
  readonly leaves: number;
  /** How many fail nothing but this check. */
  readonly alone: number;
}

/** Why nothing fits. */
export interface Conflict {
  /** None of them superfluous. */
  readonly blamed: readonly Blamed[];
  /** Of the parts all the others leave, the one that comes nearest on the last. */
  readonly nearest: { readonly check: string; readonly part: string; readonly among: number; readonly verdict: Verdict } | null;
}

/** The checks that together rule out every part that does not fit; those whose limit may move come first. Null without such parts. */
export function conflictOf(rejected: readonly JudgedPart[], mayMove: (check: string) => boolean): Conflict | null {
  if (rejected.length === 0) return null;
  const fails = rejected.map(failing);
  const counts = new Map<string, number>();
  for (const check of fails.flatMap((set) => [...set])) counts.set(check, (counts.get(check) ?? 0) + 1);
  const most = [...counts.keys()].sort((a, b) => (counts.get(b) ?? 0) - (counts.get(a) ?? 0) || (a < b ? -1 : 1));
  const movable = [...most.filter(mayMove), ...most.filter((check) => !mayMove(check))];
  const leavesSome = (checks: readonly string[]): boolean => fails.some((set) => checks.every((check) => !set.has(check)));
  const found = [quickXplain(movable, leavesSome), quickXplain(most, leavesSome)].filter((one) => one !== null);
  const [checks] = found.sort((a, b) => a.length - b.length);
  if (checks === undefined) return null;
  const blamed = checks.map((check) => ({
    check,
    leaves: fails.filter((set) => !set.has(check)).length,
    alone: fails.filter((set) => set.size === 1 && set.has(check)).length,
  }));
  return { blamed, nearest: nearestOn(rejected, checks) };
}

const failing = ({ verdicts }: JudgedPart): Set<string> => new Set(verdicts.filter(({ outcome }) => outcome === 'fail').map(({ check }) => check));

/** On the check that fewest parts get to, the part of those that comes nearest. */
function nearestOn(rejected: readonly JudgedPart[], checks: readonly string[]): Conflict['nearest'] {
  const [last, ...others] = [...checks].reverse();
  if (last === undefined) return null;
  const among = rejected.filter((one) => others.every((check) => !failing(one).has(check)));
  const found = among.flatMap((one) => {
    const verdict = one.verdicts.find(({ check }) => check === last);
    return typeof verdict?.offered === 'number' && typeof verdict.required === 'number' ? [{ part: one.part.id, verdict, offered: verdict.offered }] : [];
  });
  const [first] = found.sort((a, b) => (a.offered === b.offered ? (a.part < b.part ? -1 : 1) : isBetter(a.verdict, b.verdict) ? -1 : 1));
  return first === undefined ? null : { check: last, part: first.part, among: among.length, verdict: first.verdict };
}

function isBetter(one: Verdict, other: Verdict): boolean {
  if (typeof one.offered !== 'number' || typeof other.offered !== 'number' || (one.sense !== 'at-least' && one.sense !== 'at-most')) return false;
  return one.spare !== null && other.spare !== null && !meets(one.spare, other.spare, 'at-least');
}
