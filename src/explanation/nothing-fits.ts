import { demandsWhenAsked, oneCircuit } from '../demands/index.js';
import type { PartSource } from '../parts/part.js';
import { type Order, outlinesIn } from '../ranking/index.js';
import { type JudgedPart, lendersOf, type Miss } from '../screening/index.js';
import type { Stage } from '../stage/index.js';
import { changesFor } from './changes.js';
import { setting, type Change, type Changing } from './changing.js';
import { conflictOf, type Conflict } from './conflict.js';
import { moversOf, WORD_CHECKS, type Mover } from './movers.js';
import { widerOf } from './wider.js';

/** A change with what it does to the whole catalog. */
export interface CountedChange extends Change {
  /** How many parts fit with it. */
  readonly lets: number;
  /** The first of them. */
  readonly first: string;
}

/** Why nothing fits, and the smallest changes that let something in. */
export interface NothingFits {
  readonly conflict: Conflict | null;
  /** Giving up swing at the rails first where the stage leaves no room there; then by factor. */
  readonly changes: readonly CountedChange[];
  /** Changes were looked for with so many of the parts, those nearest first. */
  readonly looked: number;
}

/** What the answer that nothing fits was made of. */
export interface EmptySearch {
  readonly stage: Stage;
  readonly source: PartSource;
  /** The parts that do not fit, then those that cannot be decided. */
  readonly misses: Iterable<Miss>;
  readonly strict: boolean;
  readonly order: Order;
}

const MOST_OPTIONS = 4;
/** Of so many it is counted what they let in. */
const MOST_COUNTED = 6;
/** Parts a change is looked for with: the nearest of each way to fail. */
const LOOKED = 10;
const EACH_WAY = 2;

/** Looks among the nearest parts for the smallest changes, and counts what each lets in. */
export function whyNothingFits(search: EmptySearch, changing: Changing): NothingFits {
  const { stage, source, misses, strict } = search;
  const movers = moversOf(changing, stage);
  const mayMove = (check: string): boolean => movers.some(({ touches }) => touches?.includes(check) === true);
  const looked = nearestEachWay(misses, movers);
  const found = looked.flatMap(({ part }) => changesFor({ stage, part, parts: lendersOf(source), strict }, changing).options);
  const rails = isRailWanted(stage);
  const options = smallestEach(found).sort((a, b) => (rails ? Number(isSwing(b)) - Number(isSwing(a)) : 0) || a.factor - b.factor || a.moves.length - b.moves.length);
  const outline = outlinesIn(source, search);
  const count = (option: Change): CountedChange | null => countedOf(option, changing, outline);
  const counted = withoutLarger(options.slice(0, MOST_COUNTED).flatMap((option) => count(option) ?? []));
  const changes = counted.flatMap((least, at) => [least, ...(at === 0 ? widened(least, { movers, search, count }) : [])]);
  return { conflict: conflictOf(misses, mayMove), changes: changes.slice(0, MOST_OPTIONS), looked: looked.length };
}

interface Widening {
  readonly movers: readonly Mover[];
  readonly search: EmptySearch;
  readonly count: (option: Change) => CountedChange | null;
}

/** The first change a little wider, where that lets more in. */
function widened(least: CountedChange, { movers, search, count }: Widening): CountedChange[] {
  const mover = movers.find(({ path }) => path === least.moves[0]?.path);
  const option = mover === undefined ? null : widerOf(least, mover, search);
  const counted = option === null ? null : count(option);
  return counted === null || counted.lets <= least.lets ? [] : [counted];
}

/** A change that moves all that another moves, and more, is told only where it lets more in. */
function withoutLarger(changes: readonly CountedChange[]): CountedChange[] {
  const pathsOf = ({ moves }: Change): string[] => moves.map(({ path }) => path);
  const contains = (larger: Change, smaller: Change): boolean => larger !== smaller && pathsOf(smaller).every((path) => pathsOf(larger).includes(path));
  return changes.filter((one) => !changes.some((other) => contains(one, other) && other.lets >= one.lets));
}

/** A stage whose output is asked to a rail leaves no amplifier any room. */
export function isRailWanted({ vertices, asked }: Stage): boolean {
  const loss = asked.limits.swingLoss?.value ?? 0;
  return vertices.some(({ output, supply }) => Math.min(output, supply - output) + loss <= NO_ROOM * supply);
}

/** Less than this share of the supply is reached by nothing but the rail itself. */
const NO_ROOM = 1e-3;

export const isSwing = ({ moves }: Change): boolean => moves.length === 1 && moves[0]?.path === 'limits.swingLoss';

/** The parts that no fixed input keeps out, nearest first, a few of each set of failing checks; of equals the first of the catalog. */
function nearestEachWay(misses: Iterable<Miss>, movers: readonly Mover[]): JudgedPart[] {
  const any = movers.some(({ touches }) => touches === null);
  const touched = new Set(movers.flatMap(({ touches }) => touches ?? []));
  const operating = movers.some(({ path }) => /^(?:supply|temperature)/u.test(path));
  const mayTurn = (check: string): boolean => touched.has(check) || (any && (operating || !OWN_LIMIT.has(check)));
  const ways = new Map<string, Far[]>();
  for (const miss of misses) {
    if (!miss.unmet.every(mayTurn)) continue;
    const way = miss.unmet.join(' ');
    const nearest = ways.get(way) ?? [];
    ways.set(way, nearest);
    const far = farOf(miss);
    const last = nearest[EACH_WAY - 1];
    if (last !== undefined && far >= last.far) continue;
    const before = nearest.findIndex((one) => far < one.far);
    nearest.splice(before < 0 ? nearest.length : before, 0, { miss, far });
    nearest.splice(EACH_WAY);
  }
  // Sorting leaves equals in their order.
  return [...ways.values()].flat().sort((a, b) => a.far - b.far).slice(0, LOOKED).map(({ miss }) => miss.judged());
}

interface Far {
  readonly miss: Miss;
  readonly far: number;
}

/** Checks that turn with their own limit alone, at the same supply and temperature: no signal and no resistor helps them. */
const OWN_LIMIT: ReadonlySet<string> = new Set(['supply-current', 'price', ...Object.values(WORD_CHECKS)]);

/** The largest ratio by which a check misses, as a logarithm; head-rooms by their share of the swing asked. */
function farOf(miss: Miss): number {
  let far = 0;
  for (const check of miss.unmet) {
    const verdict = miss.verdict(check);
    const margin = verdict?.margin ?? null;
    far = Math.max(far, margin !== null && margin > 0 ? Math.abs(Math.log(margin)) : Math.abs(verdict?.spare ?? 1));
  }
  return far;
}

/** Of changes that move the same fields the one with the least factor. */
function smallestEach(options: readonly Change[]): Change[] {
  const least = new Map<string, Change>();
  for (const option of options) {
    const key = option.moves.map(({ path }) => path).sort((a, b) => (a < b ? -1 : 1)).join(' ');
    const known = least.get(key);
    if (known === undefined || option.factor < known.factor) least.set(key, option);
  }
  return [...least.values()];
}

/** The whole catalog under the change: what was found out of it serves again but for the checks the change touches. */
function countedOf(option: Change, changing: Changing, outline: ReturnType<typeof outlinesIn>): CountedChange | null {
  const moved = changing.rerun(option.moves.map(({ path, text }) => setting(path, text)));
  if (moved === null) return null;
  const { counts, first } = outline({ demands: demandsWhenAsked(moved), circuit: oneCircuit(moved).mark() });
  return first === null ? null : { ...option, lets: counts.fit, first };
}
