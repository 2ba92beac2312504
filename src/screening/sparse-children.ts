const FIRST_SIZE = 1 << 10;
/** Filled further than this the table is doubled. */
const FULL = 0.6;

/** Children of tree nodes too wide for a table: (node, code) → child, open addressing on three arrays of numbers. */
export class SparseChildren {
  private nodes = new Int32Array(FIRST_SIZE);
  private codes = new Int32Array(FIRST_SIZE);
  private children = new Int32Array(FIRST_SIZE);
  private filled = 0;

  /** 0: none yet. */
  get(node: number, code: number): number {
    return this.children[this.placeOf(node, code)] ?? 0;
  }

  set(node: number, code: number, child: number): void {
    this.filled += 1;
    if (this.filled > FULL * this.children.length) this.grow();
    this.put(node, code, child);
  }

  private grow(): void {
    const { nodes, codes, children } = this;
    const size = children.length * 2;
    [this.nodes, this.codes, this.children] = [new Int32Array(size), new Int32Array(size), new Int32Array(size)];
    for (let at = 0; at < children.length; at += 1) {
      const child = children[at] ?? 0;
      if (child !== 0) this.put(nodes[at] ?? 0, codes[at] ?? 0, child);
    }
  }

  private put(node: number, code: number, child: number): void {
    const at = this.placeOf(node, code);
    this.nodes[at] = node;
    this.codes[at] = code;
    this.children[at] = child;
  }

  /** The place of the pair, or the free one where it would go. Multiplicative hashing (Knuth, The Art of Computer Programming 3, 6.4). */
  private placeOf(node: number, code: number): number {
    const { nodes, codes, children } = this;
    const mask = children.length - 1;
    let at = (Math.imul(node, 0x9e3779b1) ^ Math.imul(code, 0x85ebca6b)) >>> 0;
    at = (at ^ (at >>> 15)) & mask;
    while (children[at] !== 0 && !(nodes[at] === node && codes[at] === code)) at = (at + 1) & mask;
    return at;
  }
}
