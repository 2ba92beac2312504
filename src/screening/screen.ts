import { CHECK_IDS } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import { judgePart, type Judging } from './judge.js';
import type { JudgedPart } from './judged-part.js';
import { nearestOf } from './nearest.js';

/** How many parts fail a check; one part can count several times. */
export interface Rejection {
  readonly check: string;
  readonly parts: number;
}

/** The whole catalog judged. Parts keep the catalog's order within each group. */
export interface Screened {
  readonly fit: readonly JudgedPart[];
  readonly undecided: readonly JudgedPart[];
  readonly rejected: readonly JudgedPart[];
  /** Most frequent first. */
  readonly rejections: readonly Rejection[];
  /** Up to three rejected parts closest to fitting. */
  readonly nearest: readonly JudgedPart[];
}

export function screen(run: Judging, parts: readonly Part[]): Screened {
  const judged = parts.map((part) => judgePart(run, part));
  const rejected = judged.filter((one) => one.outcome === 'does-not-fit');
  return {
    fit: judged.filter((one) => one.outcome === 'fits'),
    undecided: judged.filter((one) => one.outcome === 'undecided'),
    rejected,
    rejections: tally(rejected),
    nearest: nearestOf(rejected, run.demands.operating.nominalSupply),
  };
}

function tally(rejected: readonly JudgedPart[]): Rejection[] {
  const counts = new Map<string, number>();
  for (const { verdicts } of rejected) {
    for (const { check, outcome } of verdicts) {
      if (outcome === 'fail') counts.set(check, (counts.get(check) ?? 0) + 1);
    }
  }
  return byFrequency(counts);
}

/** Most frequent first, then in the order of the checks. */
export function byFrequency(counts: ReadonlyMap<string, number>): Rejection[] {
  const order = (check: string): number => (CHECK_IDS as readonly string[]).indexOf(check);
  return [...counts].map(([check, parts]) => ({ check, parts })).sort((a, b) => b.parts - a.parts || order(a.check) - order(b.check));
}
