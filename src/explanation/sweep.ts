import { toldTurn, turnsBetween, type Turn } from './turns.js';

/** What holds at one value: the answer in short, or why there is none. */
export type SweptState =
  | SweptAnswer
  /** The stage contradicts itself there, in words. */
  | { readonly contradiction: string };

/** The answer in short. */
interface SweptAnswer {
  readonly counts: Counts;
  readonly first: string | null;
  /** Ids of what fits, by rank. */
  readonly fit: readonly string[];
  /** By view, the places of what fits. */
  readonly fitting: readonly Int32Array[];
  /** Ids, by rank, of what fits here and not there. */
  readonly beyond: (other: Pick<SweptAnswer, 'fitting'>) => readonly string[];
}

interface Counts {
  readonly parts: number;
  readonly fit: number;
  readonly undecided: number;
  readonly rejected: number;
}

export interface SweptPoint {
  readonly value: number;
  readonly state: SweptState;
}

/** What the values of one field cost: the answer at each, and where it turns between them. */
export interface Swept {
  readonly points: readonly SweptPoint[];
  readonly turns: readonly SweptTurn[];
  /** `first`: how many fit changes so often on a long list that only the turns of the first choice are told. */
  readonly turnsOf: 'any' | 'first';
}

/** A turn, with the ids that come in and go out at it. */
export interface SweptTurn extends Turn<SweptState> {
  readonly gained: readonly string[];
  readonly lost: readonly string[];
}

/** Asks at every value, rising, and looks for the turns between neighbours whose answers differ. */
export function sweep(values: readonly number[], stateAt: (value: number) => SweptState, asked: Swept['turnsOf'] = 'any'): Swept {
  const points = values.map((value) => ({ value, state: stateAt(value) }));
  const turnsOf = asked === 'any' && comingAndGoing(points) > MOST_COUNTED ? 'first' : asked;
  const looking = { stateAt, isSame: turnsOf === 'first' ? isSameFirst : isSameAnswer };
  const turns = points.slice(1).flatMap((point, at) => {
    const before = points[at];
    return before === undefined ? [] : turnsBetween(before, point, looking).map((turn) => withParts(toldTurn(turn, looking)));
  });
  return { points, turns, turnsOf };
}

/** So many parts coming and going are told one turn after the other; nobody reads more. */
const MOST_COUNTED = 150;

/** By how many parts the count of fits moves from value to value, all in all. */
function comingAndGoing(points: readonly SweptPoint[]): number {
  const counts = points.map(({ state }) => fitCount(state));
  return counts.reduce((sum, count, at) => sum + Math.abs(count - (counts[at - 1] ?? count)), 0);
}

const fitCount = (state: SweptState): number => ('contradiction' in state ? 0 : state.counts.fit);

/** An answer turns with how many parts fit, with the first choice, and where the stage stops being one. */
export function isSameAnswer(one: SweptState, other: SweptState): boolean {
  if ('contradiction' in one || 'contradiction' in other) return 'contradiction' in one && 'contradiction' in other;
  return one.counts.fit === other.counts.fit && one.first === other.first;
}

/** An answer turns with the first choice alone, and where the stage stops being one. */
function isSameFirst(one: SweptState, other: SweptState): boolean {
  if ('contradiction' in one || 'contradiction' in other) return 'contradiction' in one && 'contradiction' in other;
  return one.first === other.first;
}

function withParts(turn: Turn<SweptState>): SweptTurn {
  return { ...turn, gained: beyond(turn.to, turn.from), lost: beyond(turn.from, turn.to) };
}

/** What fits in one state and not in the other; in a contradiction nothing does. */
function beyond(one: SweptState, other: SweptState): readonly string[] {
  if ('contradiction' in one) return [];
  return 'contradiction' in other ? one.fit : one.beyond(other);
}

/** Values from one end to the other, both included, rising: even steps, or even ratios rounded to four digits. */
export function sweptValues({ from, to, steps, scale }: { readonly from: number; readonly to: number; readonly steps: number; readonly scale: 'linear' | 'log' }): number[] {
  const inner = Array.from({ length: Math.max(0, steps - 2) }, (_, at) => {
    const share = (at + 1) / (steps - 1);
    return scale === 'log' ? Number((from * (to / from) ** share).toPrecision(4)) : Number((from + (to - from) * share).toPrecision(12));
  });
  return [...new Set([from, ...inner.filter((value) => value > from && value < to), to])];
}
