import type { Stage } from '../stage/index.js';
import { circuitMark, type Limits, markOf, unbudgeted } from './circuit-mark.js';

/**
 * What was worked out for stages of one circuit that differ in what their budgets say and in nothing else: a sweep and a search for
 * changes ask for hundreds of them in a row.
 */
export interface OneCircuit {
  /** As circuitMark(). */
  readonly mark: () => string;
  /** What `derive` makes of the stage: made before, where every limit it looked at says the same. */
  derived<Made>(name: string, stage: Stage, derive: (stage: Stage) => Made): Made;
}

interface Known extends OneCircuit {
  readonly stage: Stage;
}

interface Derived {
  readonly made: unknown;
  /** Limits that were looked at, by name, with what they said; added to when something made looks at one later. */
  readonly looked: ReadonlyMap<string, string>;
}

/** By the vertices, which stages of one circuit share. */
const KNOWN = new WeakMap<Stage['vertices'], Known>();

export function oneCircuit(stage: Stage): OneCircuit {
  const before = KNOWN.get(stage.vertices);
  if (before !== undefined && isOneCircuit(before.stage, stage)) return before;
  const known = knownOf(stage);
  KNOWN.set(stage.vertices, known);
  return known;
}

function knownOf(stage: Stage): Known {
  let mark: string | null = null;
  const made = new Map<string, Derived>();
  return {
    stage,
    mark: () => (mark ??= circuitMark(stage)),
    derived<Made>(name: string, asked: Stage, derive: (stage: Stage) => Made): Made {
      const before = made.get(name);
      if (before !== undefined && saysSame(before.looked, asked.asked.limits)) return before.made as Made;
      const looked = new Map<string, string>();
      const now = derive({ ...asked, asked: { ...asked.asked, limits: watched(asked.asked.limits, looked) } });
      made.set(name, { made: now, looked });
      return now;
    },
  };
}

/** The very same but for the limits, and of these but for the budgets. */
function isOneCircuit(one: Stage, other: Stage): boolean {
  if (one === other) return true;
  return isShared(one, other, 'asked') && isShared(one.asked, other.asked, 'limits') && circuitLimits(one) === circuitLimits(other);
}

const circuitLimits = ({ asked: { limits } }: Stage): string => markOf([Object.keys(limits), unbudgeted(limits)], '');

function isShared<Whole extends object>(one: Whole, other: Whole, but: keyof Whole): boolean {
  const names = [...new Set([...Object.keys(one), ...Object.keys(other)])] as (keyof Whole)[];
  return names.every((name) => name === but || one[name] === other[name]);
}

const saysSame = (looked: ReadonlyMap<string, string>, limits: Limits): boolean => [...looked].every(([name, said]) => saidBy(limits, name) === said);

const saidBy = (limits: Limits, name: string): string => markOf([(limits as Readonly<Record<string, unknown>>)[name] ?? null], '');

/** The same limits, taking note of which are looked at; of all of them where they are listed. */
function watched(limits: Limits, looked: Map<string, string>): Limits {
  const note = (name: string | symbol): void => {
    if (typeof name === 'string') looked.set(name, saidBy(limits, name));
  };
  return new Proxy(limits, {
    get(target, name, receiver): unknown {
      note(name);
      return Reflect.get(target, name, receiver);
    },
    has(target, name) {
      note(name);
      return Reflect.has(target, name);
    },
    ownKeys(target) {
      Object.keys(target).forEach(note);
      return Reflect.ownKeys(target);
    },
  });
}
