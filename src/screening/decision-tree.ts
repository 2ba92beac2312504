import { SparseChildren } from './sparse-children.js';

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

export interface Segment {
  readonly count: number;
  /** Places of the parts that are asked about; null: all of them. */
  readonly only: Int32Array | null;
  code(trait: number, at: number): number;
  /** The same codes, all of a trait together; null: they come one by one. */
  readonly columns: ((trait: number) => Int32Array) | null;
  /** Answers for one part. */
  grow(at: number): Grown;
}

/** What one part is asked. */
export type Asked = Pick<Segment, 'code' | 'columns' | 'grow'>;

/** The children of the root, and of a node no wider than this, stand in a table; those of others in a hash. */
const NARROW = 32;

/**
 * Answers by codes. Whoever answers looks at one trait after the other, and which comes next depends only on what was found: so the
 * answers form a tree, grown as combinations turn up, and each combination that is really looked at is answered once.
 *
 * A class, as few things are here: there is one for each question, millions of parts go through each, and what all share by its prototype
 * the engine compiles once.
 */
export class DecisionTree {
  private readonly width: (trait: number) => number | null;
  private readonly sparse = new SparseChildren();
  // Nodes by number, from 1: the trait looked at, and where its children start in the table; -1: in the hash.
  private traits = new Uint16Array(1 << 6);
  private bases = new Int32Array(1 << 6);
  private nodes = 0;
  private table = new Int32Array(1 << 10);
  private used = 0;
  // A child is a node's number, or an answer's number as -1 - leaf; 0: none yet.
  private root = 0;

  /** `width(trait)` is how many codes a trait has; null: not known beforehand. */
  constructor(width: (trait: number) => number | null) {
    this.width = width;
  }

  /** The answer's number for each of the first `count` parts, or for those asked about, written to its place. */
  classify(segment: Segment, into: Int32Array): void {
    const { only } = segment;
    const asked = only?.length ?? segment.count;
    if (asked === 0) return;
    // Whoever is asked first plants the root.
    this.descend(segment, only?.[0] ?? 0, this.root);
    const base = this.root > 0 ? this.baseOf(this.root) : -1;
    const column = base < 0 ? null : (segment.columns?.(this.traitOf(this.root)) ?? null);
    // Most questions look at one trait for most parts: there the answer stands in a table, one look away.
    for (let place = 0; place < asked; place += 1) {
      const at = only === null ? place : (only[place] ?? 0);
      const child = column === null ? this.root : (this.table[base + (column[at] ?? 0)] ?? 0);
      into[at] = -1 - (child < 0 ? child : this.descend(segment, at, child));
    }
  }

  /** The number of the answer for one part. */
  answer(asked: Asked, at: number): number {
    return -1 - this.descend(asked, at, this.root);
  }

  /** The answer for one part as a child, from this child on; the tree grows where it ends. */
  private descend(asked: Asked, at: number, from: number): number {
    const { columns } = asked;
    let child = from;
    while (child > 0) {
      const trait = this.traitOf(child);
      const code = columns === null ? asked.code(trait, at) : (columns(trait)[at] ?? 0);
      child = this.childOf(child, code);
    }
    if (child < 0) return child;
    const grown = asked.grow(at);
    this.insert(grown);
    return -1 - grown.leaf;
  }

  private insert({ path, leaf }: Grown): void {
    let [parent, parentCode] = [0, 0];
    for (const { trait, code } of path) {
      let node = parent === 0 ? this.root : this.childOf(parent, parentCode);
      if (node === 0) {
        node = this.addNode(trait);
        this.setChild(parent, parentCode, node);
      }
      if (this.traitOf(node) !== trait) throw new RangeError('a check looked at other traits after the same findings');
      [parent, parentCode] = [node, code];
    }
    this.setChild(parent, parentCode, -1 - leaf);
  }

  private traitOf(node: number): number {
    return this.traits[node - 1] ?? 0;
  }

  private baseOf(node: number): number {
    return this.bases[node - 1] ?? -1;
  }

  private childOf(node: number, code: number): number {
    const base = this.baseOf(node);
    return base < 0 ? this.sparse.get(node, code) : (this.table[base + code] ?? 0);
  }

  /** Parent 0: the root. */
  private setChild(parent: number, code: number, child: number): void {
    if (parent === 0) this.root = child;
    else if (this.baseOf(parent) < 0) this.sparse.set(parent, code, child);
    else this.table[this.baseOf(parent) + code] = child;
  }

  private addNode(trait: number): number {
    const wide = this.width(trait);
    const isDense = wide !== null && (this.nodes === 0 || wide <= NARROW);
    if (isDense && this.used + wide > this.table.length) this.table = enlarged(this.table, new Int32Array(Math.max(this.table.length * 2, this.used + wide)));
    if (this.nodes === this.traits.length) {
      this.traits = enlarged(this.traits, new Uint16Array(this.nodes * 2));
      this.bases = enlarged(this.bases, new Int32Array(this.nodes * 2));
    }
    this.traits[this.nodes] = trait;
    this.bases[this.nodes] = isDense ? this.used : -1;
    if (isDense) this.used += wide;
    this.nodes += 1;
    return this.nodes;
  }
}

function enlarged<Numbers extends Uint16Array | Int32Array>(before: Numbers, larger: Numbers): Numbers {
  larger.set(before);
  return larger;
}
