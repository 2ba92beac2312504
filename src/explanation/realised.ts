import type { Probe } from '../screening/index.js';
import type { Override } from '../spec/spec.js';
import { allPass, type Errand } from './boundary.js';
import { setting, type Change, type Move } from './changing.js';
import { movesOf, type Reacher } from './reacher.js';

/**
 * The moves of one set: those that change many checks first, then the limits that stand in the way of what is left, each with what
 * moved before it. One that turns out not to be needed is left out; null when it does not come
 * out.
 */
export function realised(set: readonly Reacher[], errand: Errand, isIn: (probe: Probe) => boolean): Change | null {
  const ordered = [...set].sort((a, b) => orderOf(a) - orderOf(b));
  const moves: Move[] = [];
  const used: Reacher[] = [];
  let before: readonly Override[] = errand.before;
  for (const [at, one] of ordered.entries()) {
    const probe = errand.bench.tried(before);
    if (probe === null) return null;
    const reached = errand.checks.filter((check) => one.reach.has(check) && !allPass(probe, [check]));
    const own = reached.filter((check) => !ordered.slice(at + 1).some((later) => later.reach.has(check)));
    // What moved before has done it already.
    if (reached.length === 0) continue;
    const made = movesOf(one, { ...errand, checks: own.length > 0 ? own : reached, before });
    if (made === null) return null;
    moves.push(...made);
    used.push(one);
    before = [...before, ...made.map(({ path, text }) => setting(path, text))];
  }
  const last = errand.bench.tried(before);
  const factor = Math.max(...moves.map((move) => move.factor));
  if (last === null || !isIn(last) || !Number.isFinite(factor)) return null;
  return { moves, design: designOf(used), factor };
}

function designOf(set: readonly Reacher[]): string | null {
  const words = set.flatMap(({ design }) => design ?? []);
  return words.length === 0 ? null : words.join('; ');
}

/** Connections and preferred values, then what the circuit is asked to do, then limits. */
function orderOf({ does, path }: Reacher): number {
  if ('moves' in does) return 0;
  return /^(?:limits|wishes|margins)\./u.test(path) ? 2 : 1;
}
