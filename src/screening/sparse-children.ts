/** Children of tree nodes too wide for a table: (node, code) → child, open addressing on three arrays of numbers. */
export interface SparseChildren {
  /** 0: none yet. */
  get(node: number, code: number): number;
  set(node: number, code: number, child: number): void;
}

const FIRST_SIZE = 1 << 10;
/** Filled further than this the table is doubled. */
const FULL = 0.6;

export function sparseChildren(): SparseChildren {
  let slots = emptySlots(FIRST_SIZE);
  let filled = 0;
  const grow = (): void => {
    const old = slots;
    slots = emptySlots(old.children.length * 2);
    for (let at = 0; at < old.children.length; at += 1) {
      const child = old.children[at] ?? 0;
      if (child !== 0) put(slots, { node: old.nodes[at] ?? 0, code: old.codes[at] ?? 0, child });
    }
  };
  return {
    get: (node, code) => slots.children[placeOf(slots, node, code)] ?? 0,
    set(node, code, child) {
      filled += 1;
      if (filled > FULL * slots.children.length) grow();
      put(slots, { node, code, child });
    },
  };
}

interface Slots {
  readonly nodes: Int32Array;
  readonly codes: Int32Array;
  readonly children: Int32Array;
}

function emptySlots(size: number): Slots {
  return { nodes: new Int32Array(size), codes: new Int32Array(size), children: new Int32Array(size) };
}

function put(slots: Slots, { node, code, child }: { node: number; code: number; child: number }): void {
  const at = placeOf(slots, node, code);
  slots.nodes[at] = node;
  slots.codes[at] = code;
  slots.children[at] = child;
}

/** The place of the pair, or the free one where it would go. Multiplicative hashing (Knuth, The Art of Computer Programming 3, 6.4). */
function placeOf({ nodes, codes, children }: Slots, node: number, code: number): number {
  const mask = children.length - 1;
  let at = (Math.imul(node, 0x9e3779b1) ^ Math.imul(code, 0x85ebca6b)) >>> 0;
  at = (at ^ (at >>> 15)) & mask;
  while (children[at] !== 0 && !(nodes[at] === node && codes[at] === code)) at = (at + 1) & mask;
  return at;
}
