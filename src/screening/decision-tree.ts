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
  /** The answer's number for each of the first `count` parts, or for those asked about. `codes(trait)` are theirs; `grow` answers for one of them. */
  classify(segment: Segment, into: Int32Array): void;
}

export interface Segment {
  readonly count: number;
  /** Places of the parts that are asked about; null: all of them. */
  readonly only: Int32Array | null;
  codes(trait: number): Int32Array;
  grow(at: number): Grown;
}

/** The children of the root, and of a node no wider than this, stand in a table; those of others in a hash. */
const NARROW = 32;

/** `width(trait)` is how many codes a trait has. */
export function decisionTree(width: (trait: number) => number): DecisionTree {
  const nodes: Node[] = [];
  const sparse = sparseChildren();
  let table = new Int32Array(1 << 10);
  let used = 0;
  // A child is a node's number + 1, or an answer's number as -1 - leaf.
  let root = 0;

  const nodeFor = (trait: number): number => {
    const wide = width(trait);
    const isDense = nodes.length === 0 || wide <= NARROW;
    if (isDense && used + wide > table.length) {
      const larger = new Int32Array(Math.max(table.length * 2, used + wide));
      larger.set(table);
      table = larger;
    }
    nodes.push({ trait, base: isDense ? used : -1 });
    if (isDense) used += wide;
    return nodes.length;
  };
  const childOf = (node: number, code: number): number => {
    const base = nodes[node - 1]?.base ?? -1;
    return base < 0 ? sparse.get(node, code) : (table[base + code] ?? 0);
  };
  const setChild = (parent: Parent, child: number): void => {
    if (parent === null) root = child;
    else if ((nodes[parent.node - 1]?.base ?? -1) < 0) sparse.set(parent.node, parent.code, child);
    else table[(nodes[parent.node - 1]?.base ?? 0) + parent.code] = child;
  };
  const insert = ({ path, leaf }: Grown): void => {
    let parent: Parent = null;
    for (const { trait, code } of path) {
      let node: number = parent === null ? root : childOf(parent.node, parent.code);
      if (node === 0) {
        node = nodeFor(trait);
        setChild(parent, node);
      }
      if (nodes[node - 1]?.trait !== trait) throw new RangeError('a check looked at other traits after the same findings');
      parent = { node, code };
    }
    setChild(parent, -1 - leaf);
  };
  /** The answer for one part, growing the tree where it ends; 0: it was grown. */
  const descend = (segment: Segment, at: number): number => {
    let child = root;
    while (child > 0) {
      const { trait, base } = nodes[child - 1] ?? NO_NODE;
      const code = segment.codes(trait)[at] ?? 0;
      child = base < 0 ? sparse.get(child, code) : (table[base + code] ?? 0);
    }
    if (child < 0) return child;
    const grown = segment.grow(at);
    insert(grown);
    return -1 - grown.leaf;
  };
  return {
    classify(segment, into) {
      const { only } = segment;
      const asked = only?.length ?? segment.count;
      if (asked === 0) return;
      const first = descend(segment, only?.[0] ?? 0);
      const start = nodes[root - 1] ?? null;
      if (start === null || start.base < 0) {
        for (let place = 0; place < asked; place += 1) {
          const at = only === null ? place : (only[place] ?? 0);
          into[at] = -1 - (start === null ? first : descend(segment, at));
        }
        return;
      }
      const codes = segment.codes(start.trait);
      for (let place = 0; place < asked; place += 1) {
        const at = only === null ? place : (only[place] ?? 0);
        const child = table[start.base + (codes[at] ?? 0)] ?? 0;
        into[at] = -1 - (child < 0 ? child : descend(segment, at));
      }
    },
  };
}

/** Stands for what cannot be: a child that is no node. */
const NO_NODE: Node = { trait: 0, base: -1 };

interface Node {
  readonly trait: number;
  /** Where its children start in the table; -1: in the hash. */
  readonly base: number;
}

type Parent = { readonly node: number; readonly code: number } | null;
