import type { Probe } from '../screening/index.js';
import { allPass, boundaryOf, type Errand } from './boundary.js';
import type { Move } from './changing.js';
import { factorOf, textAt, type Mover } from './movers.js';
import { EXACT, fewDigits, printedAs } from './printed-value.js';
import { setting } from './changing.js';
import { wordMove } from './word-move.js';

/** Something that can be done, and which checks it brings round by itself. */
export interface Reacher {
  readonly path: string;
  readonly reach: ReadonlySet<string>;
  /** Looks for the least value; or what is done as it is (preferred values, connections). */
  readonly does: { readonly mover: Mover; readonly boundaries: ReadonlyMap<string, number> } | { readonly moves: readonly Move[] };
  readonly design: string | null;
}

/** Which of the checks this mover can bring round by itself. */
export function reaching(mover: Mover, errand: Errand): Reacher {
  const asked = errand.checks.filter((check) => (mover.touches === null || mover.touches.includes(check)) && isOpenToMoves(errand.bench.tried([]), check));
  const boundaries = new Map<string, number>();
  for (const check of asked) {
    const boundary = mover.end === 'words' ? wordBoundary(mover, errand, check) : boundaryOf(mover, { ...errand, checks: [check] });
    if (boundary !== null) boundaries.set(check, boundary);
  }
  return { path: mover.path, reach: new Set(boundaries.keys()), does: { mover, boundaries }, design: mover.design ?? null };
}

const wordBoundary = (mover: Mover, errand: Errand, check: string): number | null => (wordMove(mover, errand, check) === null ? null : 0);

/** A figure that is missing is missing whatever the stage asks. */
function isOpenToMoves(probe: Probe | null, check: string): boolean {
  const finding = probe?.check(check)?.worst;
  if (finding === undefined) return false;
  return !(finding.kind === 'undecided' || (finding.kind === 'bound' && finding.cause === 'missing-figure'));
}

/** What a reacher does to bring these checks round; null when it cannot. */
export function movesOf({ does }: Reacher, errand: Errand): readonly Move[] | null {
  if ('moves' in does) return does.moves;
  const { mover, boundaries } = does;
  const [check] = errand.checks;
  const move = mover.end === 'words' ? (check === undefined ? null : wordMove(mover, errand, check)) : bounded(mover, boundaries, errand);
  return move === null ? null : [move];
}

/** With nothing moved before, several checks turn where the last of them does. */
function bounded(mover: Mover, known: ReadonlyMap<string, number>, errand: Errand): Move | null {
  const each = errand.before.length > 0 ? [undefined] : errand.checks.map((check) => known.get(check));
  const farthest = each.includes(undefined) ? null : mover.direction === 'up' ? Math.max(...each.map(Number)) : Math.min(...each.map(Number));
  const boundary = farthest ?? boundaryOf(mover, errand);
  return boundary === null ? null : rounded(mover, errand, boundary);
}

/** The boundary with few digits, on the safe side; more where the checks would not pass with fewer. */
function rounded(mover: Mover, { bench, checks, before }: Errand, boundary: number): Move | null {
  const { input, path, direction } = mover;
  if (input.form === 'words') return null;
  for (let digits = fewDigits(boundary, input.unit, direction); digits <= EXACT; digits++) {
    const text = textAt(mover, boundary, digits);
    const probe = bench.tried([...before, setting(path, text)]);
    if (probe === null || !allPass(probe, checks)) continue;
    const value = digits === EXACT ? boundary : printedAs(boundary, input.unit, { digits, round: direction });
    return { path, text, was: input.text, written: input.written, value, boundary, direction, factor: factorOf(mover, value, bench.stage) };
  }
  return null;
}
