import { sparseChildren } from './sparse-children.js';

/** One trait that was looked at and the code found there. */
export interface Step {
  readonly trait: number;
  readonly code: number;
}

/** What became of a part nobody had looked at before: the traits that were looked at, in their order, and the number of the answer. */
export interface Grown {
  readonly path: readonly Step[];
  readonly leaf: number;
}

/**
 * Answers by codes. Whoever answers looks at one trait after the other, and which comes next depends only on what was found: so the
 * answers form a tree, grown as combinations turn up, and each combination that is really looked at is answered once.
 */
export interface DecisionTree {
  /** The answer's number for each of the first `count` parts, or for those asked about. `code(trait, at)` is what one of them has there; `grow` answers for it. */
  classify(segment: Segment, into: Int32Array): void;
  /** The number of the answer for one part. */
  answer(segment: Pick<Segment, 'code' | 'grow'>, at: number): number;
}

export interface Segment {
  readonly count: number;
  /** Places of the parts that are asked about; null: all of them. */
  readonly only: Int32Array | null;
  code(trait: number, at: number): number;
  /** The same codes, all of a trait together; null: they come one by one. */
  readonly columns: ((trait: number) => Int32Array) | null;
  grow(at: number): Grown;
}

/** The children of the root, and of a node no wider than this, stand in a table; those of others in a hash. */
const NARROW = 32;

/** `width(trait)` is how many codes a trait has; null: not known beforehand. */
export function decisionTree(width: (trait: number) => number | null): DecisionTree {
  const nodes = nodeList();
  const sparse = sparseChildren();
  let table = new Int32Array(1 << 10);
  let used = 0;
  // A child is a node's number + 1, or an answer's number as -1 - leaf.
  let root = 0;

  const nodeFor = (trait: number): number => {
    const wide = width(trait);
    const isDense = wide !== null && (nodes.count() === 0 || wide <= NARROW);
    if (isDense && used + wide > table.length) {
      const larger = new Int32Array(Math.max(table.length * 2, used + wide));
      larger.set(table);
      table = larger;
    }
    const node = nodes.add(trait, isDense ? used : -1);
    if (isDense) used += wide;
    return node;
  };
  const childOf = (node: number, code: number): number => {
    const base = nodes.base(node);
    return base < 0 ? sparse.get(node, code) : (table[base + code] ?? 0);
  };
  const setChild = (parent: Parent, child: number): void => {
    if (parent === null) root = child;
    else if (nodes.base(parent.node) < 0) sparse.set(parent.node, parent.code, child);
    else table[nodes.base(parent.node) + parent.code] = child;
  };
  const insert = ({ path, leaf }: Grown): void => {
    let parent: Parent = null;
    for (const { trait, code } of path) {
      let node: number = parent === null ? root : childOf(parent.node, parent.code);
      if (node === 0) {
        node = nodeFor(trait);
        setChild(parent, node);
      }
      if (nodes.trait(node) !== trait) throw new RangeError('a check looked at other traits after the same findings');
      parent = { node, code };
    }
    setChild(parent, -1 - leaf);
  };
  /** The answer for one part, from this child of the tree on; the tree grows where it ends. */
  const descend = (segment: Pick<Segment, 'code' | 'grow'>, at: number, from: number): number => {
    let child = from;
    while (child > 0) {
      const base = nodes.base(child);
      const code = segment.code(nodes.trait(child), at);
      child = base < 0 ? sparse.get(child, code) : (table[base + code] ?? 0);
    }
    if (child < 0) return child;
    const grown = segment.grow(at);
    insert(grown);
    return -1 - grown.leaf;
  };
  return {
    answer: (segment, at) => -1 - descend(segment, at, root),
    classify(segment, into) {
      const { only } = segment;
      const asked = only?.length ?? segment.count;
      if (asked === 0) return;
      // Whoever is asked first plants the root.
      descend(segment, only?.[0] ?? 0, root);
      const base = root > 0 ? nodes.base(root) : -1;
      const column = base < 0 ? null : (segment.columns?.(nodes.trait(root)) ?? null);
      // Most questions look at one trait for most parts: there the answer stands in a table, one look away.
      for (let place = 0; place < asked; place += 1) {
        const at = only === null ? place : (only[place] ?? 0);
        const child = column === null ? root : (table[base + (column[at] ?? 0)] ?? 0);
        into[at] = -1 - (child < 0 ? child : descend(segment, at, child));
      }
    },
  };
}

/** Nodes by number, from 1: the trait looked at, and where its children start in the table; -1: in the hash. */
function nodeList() {
  let traits = new Uint16Array(1 << 6);
  let bases = new Int32Array(1 << 6);
  let count = 0;
  return {
    count: (): number => count,
    trait: (node: number): number => traits[node - 1] ?? 0,
    base: (node: number): number => bases[node - 1] ?? -1,
    add(trait: number, base: number): number {
      if (count === traits.length) {
        traits = doubled(traits, new Uint16Array(count * 2));
        bases = doubled(bases, new Int32Array(count * 2));
      }
      traits[count] = trait;
      bases[count] = base;
      return ++count;
    },
  };
}

function doubled<Numbers extends Uint16Array | Int32Array>(before: Numbers, larger: Numbers): Numbers {
  larger.set(before);
  return larger;
}

type Parent = { readonly node: number; readonly code: number } | null;
