import type { Miss } from '../screening/index.js';
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
export function conflictOf(misses: Iterable<Miss>, mayMove: (check: string) => boolean): Conflict | null {
  const groups = groupsOf(misses);
  if (groups.length === 0) return null;
  const parts = (holds: (fails: ReadonlySet<string>) => boolean): number => groups.reduce((sum, { fails, count }) => (holds(fails) ? sum + count : sum), 0);
  const counts = new Map([...new Set(groups.flatMap(({ fails }) => [...fails]))].map((check) => [check, parts((fails) => fails.has(check))]));
  const most = [...counts.keys()].sort((a, b) => (counts.get(b) ?? 0) - (counts.get(a) ?? 0) || (a < b ? -1 : 1));
  const movable = [...most.filter(mayMove), ...most.filter((check) => !mayMove(check))];
  const leavesSome = (checks: readonly string[]): boolean => groups.some(({ fails }) => checks.every((check) => !fails.has(check)));
  const found = [quickXplain(movable, leavesSome), quickXplain(most, leavesSome)].filter((one) => one !== null);
  const [checks] = found.sort((a, b) => a.length - b.length);
  if (checks === undefined) return null;
  const blamed = checks.map((check) => ({
    check,
    leaves: parts((fails) => !fails.has(check)),
    alone: parts((fails) => fails.size === 1 && fails.has(check)),
  }));
  return { blamed, nearest: nearestOn(misses, checks) };
}

/** Parts that fail the same checks. */
interface Group {
  readonly fails: ReadonlySet<string>;
  count: number;
}

function groupsOf(misses: Iterable<Miss>): Group[] {
  const groups = new Map<string, Group>();
  for (const { fails } of misses) {
    if (fails.length === 0) continue;
    const key = fails.join(' ');
    const group = groups.get(key) ?? { fails: new Set(fails), count: 0 };
    group.count += 1;
    groups.set(key, group);
  }
  return [...groups.values()];
}

/** On the check that fewest parts get to, the part of those that comes nearest; of equals the first of the catalog. */
function nearestOn(misses: Iterable<Miss>, checks: readonly string[]): Conflict['nearest'] {
  const [last, ...others] = [...checks].reverse();
  if (last === undefined) return null;
  let among = 0;
  let nearest: { readonly miss: Miss; readonly spare: number } | null = null;
  for (const miss of misses) {
    if (miss.fails.length === 0 || others.some((check) => miss.fails.includes(check))) continue;
    among += 1;
    const verdict = miss.verdict(last);
    if (typeof verdict?.offered !== 'number' || typeof verdict.required !== 'number' || verdict.spare === null) continue;
    if (nearest === null || !meets(verdict.spare, nearest.spare, 'at-least')) nearest = { miss, spare: verdict.spare };
  }
  const judged = nearest?.miss.judged();
  const verdict = judged?.verdicts.find(({ check }) => check === last);
  return judged === undefined || verdict === undefined ? null : { check: last, part: judged.part.id, among, verdict };
}
