import { weakest, weaknessOf, type Basis } from './basis.js';
import { headroomPoints, pointCurrent, type HeadroomPoint, type Side } from './headroom.js';
import type { Outlook, PartUnderTest } from './reading.js';

/** Where the stage stands when it asks for head-room. */
export interface HeadroomQuestion {
  readonly supply: number;
  /** Towards the rail of this side, A, never negative. */
  readonly current: number;
  /** Ohm of a load that, with the whole current, pulls towards this rail; null when nothing helps. */
  readonly assistingLoad: number | null;
}

/** Head-room a part needs there. `value` null: unknown, then `bound` is the heaviest point's own (null without points). */
export interface HeadroomReading {
  readonly value: number | null;
  readonly bound: number | null;
  /** Heaviest current the points that count here were measured at, A; null without points, and for a value assumed at any current. */
  readonly covers: number | null;
  readonly basis: Basis;
  readonly slot: string | null;
  readonly how: string | null;
}

interface Placed {
  readonly current: number;
  readonly value: number;
  readonly basis: Basis;
  readonly slot: string;
  readonly how: string | null;
}

interface SetReading extends HeadroomReading {
  /** The set's heaviest point lies at or beyond the current asked. */
  readonly reached: boolean;
}

/** How far beyond its heaviest point a set may be drawn on, as a factor of that point's current. */
export const REACH = 1.5;
/** Threshold of a MOS output device that the supply scaling assumes, V (M6, common practice). */
const THRESHOLD = 0.7;
const TIGHT = 1e-9;

/** Reads a part's head-room curves once, then answers for any vertex. */
export function headroomCurve(test: PartUnderTest, side: Side): (question: HeadroomQuestion) => HeadroomReading {
  const points = headroomPoints(test, side);
  // Of several that hold at any current the worse: nothing says which one counts.
  const [assumed] = points.filter(({ anywhere }) => anywhere).sort((a, b) => b.value - a.value);
  if (assumed !== undefined) return () => ({ value: assumed.value, bound: null, covers: null, basis: assumed.basis, slot: assumed.slot, how: assumed.how });
  // The vertices of a stage share a few supplies: the sets are laid once for each.
  const known = new Map<string, readonly PointSet[]>();
  const setsFor = (question: HeadroomQuestion): readonly PointSet[] => {
    const key = `${question.supply} ${question.assistingLoad}`;
    const sets = known.get(key) ?? setsAround(points, { side, outlook: test.outlook }, question);
    known.set(key, sets);
    return sets;
  };
  return (question) => combine(setsFor(question).map((set) => readSet(set, test.outlook, question)));
}

/** The heaviest current any unassisted point of the side was measured at, A, of equal ones that on the stronger basis; points without a supply count as rated at `supply`. Null without points. */
export function heaviestPoint(test: PartUnderTest, side: Side, supply: number): { amperes: number; slot: string; basis: Basis } | null {
  const placed = headroomPoints(test, side)
    .filter((point) => !point.assisted)
    .map((point) => ({ amperes: pointCurrent(point, side, point.supply ?? supply), slot: point.slot, basis: point.basis }));
  const isHeavier = (next: (typeof placed)[number], best: (typeof placed)[number]): boolean =>
    next.amperes > best.amperes || (next.amperes === best.amperes && weaknessOf(next.basis) < weaknessOf(best.basis));
  return placed.reduce<(typeof placed)[number] | null>((best, next) => (best === null || isHeavier(next, best) ? next : best), null);
}

interface PointSet {
  /** As they count in the outlook. */
  readonly points: readonly Placed[];
  /** What was done to them, in words; none where the set is rated at or below the vertex' supply. */
  readonly scaled: readonly string[];
}

interface Read {
  readonly side: Side;
  readonly outlook: Outlook;
}

/** The sets that bound this vertex: rated nearest at or below its supply, and nearest above it. */
function setsAround(points: readonly HeadroomPoint[], { side, outlook }: Read, question: HeadroomQuestion): PointSet[] {
  const counting = points.filter((point) => counts(point, question));
  const ratings = [...new Set(counting.map((point) => point.supply ?? question.supply))].sort((a, b) => a - b);
  const below = ratings.filter((rating) => rating <= question.supply * (1 + TIGHT)).at(-1);
  const above = ratings.find((rating) => rating > question.supply * (1 + TIGHT));
  const set = (rating: number, scale: number): PointSet => scaledSet(place(counting.filter((point) => (point.supply ?? question.supply) === rating), side, rating), outlook, scale);
  const sets = below === undefined ? [] : [set(below, 1)];
  if (above === undefined || question.supply <= THRESHOLD) return sets;
  return [...sets, set(above, (above - THRESHOLD) / (question.supply - THRESHOLD))];
}

/** `scale`: factor of the pessimistic reading when the set is rated above the vertex' supply. */
function scaledSet(points: readonly Placed[], outlook: Outlook, scale: number): PointSet {
  const taken = outlook === 'optimistic' ? 1 : scale;
  const words = taken === 1 ? 'rated at a higher supply, as printed' : `scaled from a higher supply × ${Number(scale.toPrecision(4))}`;
  return { points: points.map((point) => ({ ...point, value: point.value * taken })), scaled: scale === 1 ? [] : [words] };
}

function counts(point: HeadroomPoint, question: HeadroomQuestion): boolean {
  if (!point.assisted) return true;
  if (question.assistingLoad === null || point.load.kind !== 'resistance') return false;
  return question.assistingLoad <= point.load.ohms * (1 + TIGHT);
}

/** Points by rising current; at equal current the larger head-room counts. */
function place(points: readonly HeadroomPoint[], side: Side, supply: number): Placed[] {
  const placed = points
    .map((point) => ({ current: pointCurrent(point, side, supply), value: point.value, basis: point.basis, slot: point.slot, how: point.how }))
    .sort((a, b) => a.current - b.current || b.value - a.value);
  return placed.filter((point, at) => at === 0 || point.current > (placed[at - 1]?.current ?? 0));
}

function readSet({ points, scaled }: PointSet, outlook: Outlook, question: HeadroomQuestion): SetReading {
  const heaviest = points.at(-1);
  if (heaviest === undefined) throw new RangeError('a head-room set without points');
  const estimated: Basis[] = scaled.length === 0 ? [] : ['estimated'];
  const reached = question.current <= heaviest.current * (1 + TIGHT);
  const inside = reached ? interpolate(points, question.current) : beyond(points, outlook, question.current);
  return {
    reached,
    covers: heaviest.current,
    value: inside.value,
    bound: heaviest.value,
    basis: weakest([...inside.basis, ...estimated]),
    slot: inside.slot,
    how: joined([...inside.how, ...scaled]),
  };
}

interface Inside {
  readonly value: number | null;
  readonly basis: readonly Basis[];
  readonly slot: string;
  readonly how: readonly (string | null)[];
}

function interpolate(points: readonly Placed[], current: number): Inside {
  const at = points.findIndex((point) => point.current >= current * (1 - TIGHT));
  const upper = points[at];
  if (upper === undefined) throw new RangeError(`no head-room point at or above ${current} A`);
  const lower = points[at - 1];
  if (lower === undefined || upper.current <= current * (1 + TIGHT)) return { value: upper.value, basis: [upper.basis], slot: upper.slot, how: [upper.how] };
  const share = (current - lower.current) / (upper.current - lower.current);
  const value = lower.value + share * (upper.value - lower.value);
  return { value, basis: [lower.basis, upper.basis], slot: upper.slot, how: [upper.how, 'between two load points'] };
}

/** A straight line on from the last two points (one point: through the origin), never below the heaviest point's own value. */
function beyond(points: readonly Placed[], outlook: Outlook, current: number): Inside {
  const heaviest = points.at(-1);
  if (heaviest === undefined) throw new RangeError('a head-room set without points');
  const before = points.at(-2) ?? { current: 0, value: 0, basis: heaviest.basis };
  const known = { basis: [heaviest.basis, before.basis, 'estimated'] as const, slot: heaviest.slot };
  if (current > heaviest.current * REACH * (1 + TIGHT)) return { ...known, value: null, how: [heaviest.how, 'beyond 1.5 × the heaviest load point'] };
  const slope = (heaviest.value - before.value) / (heaviest.current - before.current);
  const line = heaviest.value + slope * (current - heaviest.current);
  const value = outlook === 'optimistic' ? heaviest.value : Math.max(heaviest.value, line);
  const drawn = outlook === 'optimistic' ? 'the heaviest load point, as printed' : 'drawn on beyond the heaviest load point';
  return { ...known, value, how: [heaviest.how, drawn] };
}

/** The smaller of the bounding sets; one that ends before the current counts only if all do. */
function combine(sets: readonly SetReading[]): HeadroomReading {
  const covering = sets.filter((set) => set.reached);
  const counting = covering.length > 0 ? covering : sets;
  const size = (set: SetReading): number => set.value ?? Number.POSITIVE_INFINITY;
  const least = counting.reduce<SetReading | null>((best, next) => (best === null || size(next) < size(best) ? next : best), null);
  if (least === null) return { value: null, bound: null, covers: null, basis: 'guaranteed', slot: null, how: null };
  if (least.value !== null) return least;
  const lowest = counting.reduce((best, next) => ((next.bound ?? 0) < (best.bound ?? 0) ? next : best));
  return { ...lowest, covers: Math.max(...counting.map((set) => set.covers ?? 0)) };
}

function joined(steps: readonly (string | null)[]): string | null {
  const said = steps.filter((step) => step !== null);
  return said.length === 0 ? null : said.join(', ');
}
