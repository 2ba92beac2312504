import { cell, increase } from './cells.js';
import { requireNotNegative, requirePositive } from './domain.js';

/** A resistor (Ω) or capacitor (F) between two nodes; value above 0. */
export interface PassiveElement {
  readonly name: string;
  readonly kind: 'resistor' | 'capacitor';
  readonly value: number;
  readonly between: readonly [string, string];
}

/** Nodes held by something else: the amplifier's output, the signal, and every AC ground. */
export const HELD_NODES: readonly string[] = ['output', 'input', 'ground'];

/**
 * Branches of a passive network, node by node as square symmetric matrices: S and F. Order of `nodes`: the inner ones (their
 * number is `inner`), the kept one, then output, input, ground.
 */
export interface Mesh {
  readonly nodes: readonly string[];
  readonly inner: number;
  readonly conductance: Float64Array;
  readonly capacitance: Float64Array;
}

/**
 * What is left at one frequency: row k of an inner node holds its weights y_kj/Σy on the nodes after it, row `inner` the
 * admittances (S) from the kept node to output, input, ground.
 */
export interface ReducedMesh {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/**
 * A passive network as a mesh around one kept node, with a capacitor from that node to ground added.
 * @param elements resistors in Ω and capacitors in F, above 0
 * @param kept node that stays; none of output, input, ground
 * @param capacitance F, at least 0
 * @returns S and F between every two nodes
 * @example 1 kΩ ∥ 2 kΩ between two nodes make a branch of 1.5 mS
 * Source: parallel branches add.
 */
export function starMesh(elements: readonly PassiveElement[], kept: string, capacitance: number): Mesh {
  requireNotNegative('starMesh', { [`capacitance at ${kept}`]: capacitance });
  const inner = [...new Set(elements.flatMap(({ between }) => [...between]))].filter((node) => node !== kept && !HELD_NODES.includes(node));
  const nodes = [...inner, kept, ...HELD_NODES];
  const mesh = {
    nodes,
    inner: inner.length,
    conductance: new Float64Array(nodes.length ** 2),
    capacitance: new Float64Array(nodes.length ** 2),
  };
  const join = (matrix: Float64Array, [a, b]: readonly [string, string], value: number): void => {
    const [i, j] = [nodes.indexOf(a), nodes.indexOf(b)];
    if (i === j) return;
    increase(matrix, i * nodes.length + j, value);
    increase(matrix, j * nodes.length + i, value);
  };
  for (const { name, kind, value, between } of elements) {
    requirePositive('starMesh', { [name]: value });
    if (kind === 'resistor') join(mesh.conductance, between, 1 / value);
    else join(mesh.capacitance, between, value);
  }
  join(mesh.capacitance, [kept, 'ground'], capacitance);
  return mesh;
}

/**
 * Takes the inner nodes out one by one: the star of branches y_i at a node becomes the mesh y_i·y_j/Σy. This is Gauss
 * elimination that never forms the sums on the diagonal, so a small branch beside large ones keeps its digits.
 * @param mesh from starMesh()
 * @param frequency Hz, at least 0 (capacitors open)
 * @param into where the answer goes, from roomFor(); what was there is lost
 * @returns weights (1) of the inner nodes, admittances (S) of the kept one
 * @example input –1 kΩ– x –3 kΩ– pin leaves 0.25 mS from pin to input
 * Source: Rosen, A new network theorem, J. IEE 62, 1924 (from memory).
 * @throws RangeError naming a node that hangs on nothing at that frequency.
 */
export function reduceMesh(mesh: Mesh, frequency: number, into: ReducedMesh = roomFor(mesh)): ReducedMesh {
  // The test in front spares a million calls the looking up of names.
  if (!(frequency >= 0 && frequency < Infinity)) requireNotNegative('reduceMesh', { frequency });
  const size = mesh.nodes.length;
  const { re, im } = into;
  re.set(mesh.conductance);
  for (let at = 0; at < im.length; at += 1) im[at] = cell(mesh.capacitance, at) * 2 * Math.PI * frequency;
  for (let k = 0; k < mesh.inner; k += 1) {
    if (!toWeights({ re, im }, k * size + k + 1, (k + 1) * size)) refuse(mesh.nodes[k] ?? '', frequency);
    for (let i = k + 1; i <= mesh.inner; i += 1) spread({ re, im }, [i, k], size);
  }
  let isHeld = false;
  for (let at = mesh.inner * size + mesh.inner + 1; at < (mesh.inner + 1) * size; at += 1) isHeld ||= cell(re, at) !== 0 || cell(im, at) !== 0;
  if (!isHeld) refuse(mesh.nodes[mesh.inner] ?? '', frequency);
  return { re, im };
}

/**
 * Room for an answer of reduceMesh(): whoever asks for many frequencies makes it once, memory being dearer than the sums.
 * @param mesh from starMesh()
 * @returns zeros, S
 * @example roomFor(a mesh of five nodes).re has 25 cells
 * Source: own bookkeeping, no relation.
 */
export function roomFor({ nodes: { length } }: Mesh): ReducedMesh {
  return { re: new Float64Array(length ** 2), im: new Float64Array(length ** 2) };
}

/** Divides the cells of a row by their sum. @returns false when the sum is 0. */
function toWeights({ re, im }: ReducedMesh, from: number, to: number): boolean {
  let x = 0;
  let y = 0;
  for (let at = from; at < to; at += 1) {
    x += cell(re, at);
    y += cell(im, at);
  }
  const square = x * x + y * y;
  if (square === 0) return false;
  for (let at = from; at < to; at += 1) {
    const a = cell(re, at);
    const b = cell(im, at);
    re[at] = (a * x + b * y) / square;
    im[at] = (b * x - a * y) / square;
  }
  return true;
}

/** Adds y_ik·weight_kj to the branch between i and every later node j. Column k still holds the admittances themselves. */
function spread({ re, im }: ReducedMesh, [i, k]: readonly [number, number], size: number): void {
  const x = cell(re, i * size + k);
  const y = cell(im, i * size + k);
  if (x === 0 && y === 0) return;
  for (let j = i + 1; j < size; j += 1) {
    const a = cell(re, k * size + j);
    const b = cell(im, k * size + j);
    increase(re, i * size + j, x * a - y * b);
    increase(im, i * size + j, x * b + y * a);
    increase(re, j * size + i, x * a - y * b);
    increase(im, j * size + i, x * b + y * a);
  }
}

function refuse(node: string, frequency: number): never {
  const missing = frequency === 0 ? 'no path for direct current' : 'no path';
  const remedy = frequency === 0 ? ', so its voltage at 0 Hz is undefined; ask for a frequency above 0 or add a resistor' : '; connect it';
  throw new RangeError(`reduceMesh: node ${node} has ${missing} to output, input or ground${remedy}`);
}
