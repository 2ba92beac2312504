import { type Line, familyKey } from './family.js';
import type { PlacedFit } from './placed-fit.js';
import { compareIn, compareRoughly, type Order } from './rank.js';

/**
 * What fits in order, one line a family. Parts that only their estimates or ids tell apart stand together until one of their lines is looked
 * at: telling them apart takes reading them.
 */
export interface SurveyOrder {
  /** As they were given. */
  readonly all: readonly PlacedFit[];
  readonly ties: readonly Tie[];
  /** How many lines. */
  readonly length: number;
  line(at: number): Line<PlacedFit>;
  /** The place of the line the first such part stands in; null without one. */
  lineWith(isIt: (one: PlacedFit) => boolean): number | null;
  /** Some of the parts, as they come when one line is told after the other with its variants behind its first. */
  sorted(some: readonly PlacedFit[]): PlacedFit[];
}

/** Lines that stand next to each other, and share what can be told without reading. */
interface Tie {
  /** Any of these may come first in its line. */
  readonly members: readonly PlacedFit[];
  /** The first of each line, in order; made when it is first asked for. */
  readonly firsts: () => readonly PlacedFit[];
  /** Place of the first of them. */
  readonly from: number;
}

interface Family {
  readonly members: PlacedFit[];
  /** Number of the tie its line stands in. */
  readonly tie: number;
}

type Families = Map<string | PlacedFit, Family>;

export function surveyOrder(placed: readonly PlacedFit[], order: Order): SurveyOrder {
  const families: Families = new Map();
  const ties: Tie[] = [];
  const tieOf: number[] = [];
  for (const together of tied(placed, order)) {
    const { members, lines } = leading(together, ties.length, families);
    if (lines === 0) continue;
    const from = tieOf.length;
    for (let line = 0; line < lines; line += 1) tieOf.push(ties.length);
    ties.push({ members, from, firsts: once(() => firstsOf(members, order)) });
  }
  const familyOf = (one: PlacedFit): readonly PlacedFit[] => [...(families.get(keyOf(one))?.members ?? [])].sort((a, b) => compareIn(order, a, b));
  const lineOf = (one: PlacedFit): number => {
    const tie = ties[families.get(keyOf(one))?.tie ?? -1];
    return tie === undefined ? ties.length : tie.from + tie.firsts().findIndex((first) => keyOf(first) === keyOf(one));
  };
  return {
    all: placed,
    ties,
    length: tieOf.length,
    line(at) {
      const tie = ties[tieOf[at] ?? -1];
      const first = tie?.firsts()[at - tie.from];
      if (first === undefined) throw new RangeError(`no line ${at} of ${tieOf.length}`);
      return { first, variants: familyOf(first).slice(1) };
    },
    lineWith(isIt) {
      const one = placed.find(isIt);
      return one === undefined ? null : lineOf(one);
    },
    sorted: (some) => some.map((one) => ({ one, line: lineOf(one) })).sort((a, b) => a.line - b.line || compareIn(order, a.one, b.one)).map(({ one }) => one),
  };
}

/** A part without a family is one by itself. */
const keyOf = (one: PlacedFit): string | PlacedFit => familyKey(one) ?? one;

/** In rough order, with what is equal there together. */
function tied(placed: readonly PlacedFit[], order: Order): PlacedFit[][] {
  const groups: PlacedFit[][] = [];
  let group: PlacedFit[] = [];
  for (const one of [...placed].sort((a, b) => compareRoughly(order, a, b))) {
    const [before] = group;
    if (before !== undefined && compareRoughly(order, before, one) === 0) group.push(one);
    else groups.push((group = [one]));
  }
  return groups;
}

/** Those whose family has not come before, and how many families that are. All are entered with their families. */
function leading(together: readonly PlacedFit[], tie: number, families: Families): { readonly members: readonly PlacedFit[]; readonly lines: number } {
  const members: PlacedFit[] = [];
  let lines = 0;
  for (const one of together) {
    const key = keyOf(one);
    const family = families.get(key) ?? { members: [], tie };
    if (family.members.push(one) === 1) {
      families.set(key, family);
      lines += 1;
    }
    if (family.tie === tie) members.push(one);
  }
  return { members, lines };
}

function firstsOf(members: readonly PlacedFit[], order: Order): readonly PlacedFit[] {
  const seen = new Set<string | PlacedFit>();
  return [...members].sort((a, b) => compareIn(order, a, b)).filter((one) => !seen.has(keyOf(one)) && seen.add(keyOf(one)).size > 0);
}

function once<Made>(make: () => Made): () => Made {
  let made: { readonly it: Made } | null = null;
  return () => (made ??= { it: make() }).it;
}
