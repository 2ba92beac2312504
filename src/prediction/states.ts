import type { PassiveElement } from '../formulas/pin-network.js';
import { against, dot, matrixOf, solveReal, times, zeros, type Matrix, type Vector } from './dense.js';

/** Resistors and capacitors between nodes; `held` nodes have a voltage of their own, `fed` ones a current driven into them. */
export interface Network {
  readonly elements: readonly PassiveElement[];
  /** `ground` is held at 0 and not among them. */
  readonly held: readonly string[];
  readonly fed: readonly string[];
  /** Nodes whose voltages are wanted. */
  readonly taps: readonly string[];
}

/**
 * The network as first-order equations: q' = rates·(q, held, fed), tap voltages = volts·(q, held, fed). The states q are voltages
 * less what the held nodes push through capacitors, so that no derivative of a source is needed.
 */
export interface NetworkStates {
  readonly order: number;
  readonly rates: Matrix;
  readonly volts: Matrix;
}

/** Of the largest capacitance: less is none. */
const NOTHING = 1e-12;

/**
 * C·v' + G·v = i of nodal analysis, with C brought to a diagonal by congruence (Lagrange's reduction of a quadratic form): what has no
 * capacitance there is eliminated through its resistors. Source: nodal analysis, any text on linear circuits; own algebra.
 */
export function networkStates({ elements, held, fed, taps }: Network): NetworkStates {
  const nodes = innerNodes(elements, held);
  const [c, g] = (['capacitor', 'resistor'] as const).map((kind) => nodal(elements.filter((one) => one.kind === kind), nodes, held)) as [Nodal, Nodal];
  const { basis, sizes } = diagonal(c.inner);
  const dynamic = sizes.map((size) => size > 0);
  const conductance = against(basis, against(basis, g.inner));
  const [gHeld, cHeld] = [timesEach(basis, g.held), timesEach(basis, c.held)];
  const order = dynamic.filter(Boolean).length;
  const voltagesOf = (input: Vector): number[] => {
    const [q, h, i] = [input.slice(0, order), input.slice(order, order + held.length), input.slice(order + held.length)];
    const into = times(basis, nodes.map((node) => dot(fed.map((one) => (one === node ? 1 : 0)), i)));
    return inBasis({ q, h, into }, { dynamic, sizes, conductance, gHeld, cHeld });
  };
  const width = order + held.length + fed.length;
  const rates = matrixOf(width, (input) => {
    const w = voltagesOf(input);
    const h = input.slice(order, order + held.length);
    const into = times(basis, nodes.map((node) => dot(fed.map((one) => (one === node ? 1 : 0)), input.slice(order + held.length))));
    return sizes.flatMap((size, k) => (size > 0 ? [((into[k] ?? 0) - dot(conductance[k] ?? [], w) - dot(gHeld[k] ?? [], h)) / size] : []));
  });
  const volts = matrixOf(width, (input) => {
    const v = nodes.map((_, node) => dot(basis.map((row) => row[node] ?? 0), voltagesOf(input)));
    return taps.map((tap) => (tap === 'ground' ? 0 : held.includes(tap) ? (input[order + held.indexOf(tap)] ?? 0) : (v[nodes.indexOf(tap)] ?? NaN)));
  });
  return { order, rates, volts };
}

interface Reduced {
  readonly dynamic: readonly boolean[];
  readonly sizes: Vector;
  readonly conductance: Matrix;
  readonly gHeld: Matrix;
  readonly cHeld: Matrix;
}

/** Voltages in the new basis: the dynamic ones from their states, the others from what flows through resistors. */
function inBasis({ q, h, into }: { readonly q: Vector; readonly h: Vector; readonly into: Vector }, reduced: Reduced): number[] {
  const { dynamic, sizes, conductance, gHeld, cHeld } = reduced;
  const w = zeros(sizes.length);
  let state = 0;
  sizes.forEach((size, k) => {
    if (size > 0) w[k] = (q[state++] ?? 0) - dot(cHeld[k] ?? [], h) / size;
  });
  const rest = sizes.flatMap((_, k) => (dynamic[k] === true ? [] : [k]));
  if (rest.length === 0) return w;
  const right = rest.map((k) => (into[k] ?? 0) - dot(gHeld[k] ?? [], h) - dot(conductance[k] ?? [], w));
  const found = solveReal(rest.map((k) => rest.map((j) => conductance[k]?.[j] ?? 0)), right);
  if (found === null) throw new RangeError('networkStates: a node has no path through resistors');
  rest.forEach((k, at) => { w[k] = found[at] ?? 0; });
  return w;
}

function innerNodes(elements: readonly PassiveElement[], held: readonly string[]): string[] {
  return [...new Set(elements.flatMap(({ between }) => between))].filter((node) => node !== 'ground' && !held.includes(node));
}

interface Nodal {
  readonly inner: Matrix;
  readonly held: Matrix;
}

/** Admittances (S or F) between inner nodes, and from them to the held ones. */
function nodal(elements: readonly PassiveElement[], nodes: readonly string[], held: readonly string[]): Nodal {
  const inner = nodes.map(() => zeros(nodes.length));
  const outer = nodes.map(() => zeros(held.length));
  for (const { kind, value, between: [a, b] } of elements) {
    const size = kind === 'resistor' ? 1 / value : value;
    for (const [from, to] of [[a, b], [b, a]] as const) {
      const row = nodes.indexOf(from);
      if (row < 0) continue;
      increase(inner[row], row, size);
      increase(inner[row], nodes.indexOf(to), -size);
      increase(outer[row], held.indexOf(to), -size);
    }
  }
  return { inner, held: outer };
}

function increase(row: number[] | undefined, at: number, more: number): void {
  if (row !== undefined && at >= 0) row[at] = (row[at] ?? 0) + more;
}

/** Rows of a basis in which the form has no mixed terms, and its size along each; 0: none. */
function diagonal(form: Matrix): { readonly basis: Matrix; readonly sizes: Vector } {
  const size = form.length;
  const basis = zeros(size).map((_, at) => zeros(size).map((_zero, k) => (k === at ? 1 : 0)));
  const left = form.map((row) => [...row]);
  const least = NOTHING * Math.max(0, ...form.map((row, at) => row[at] ?? 0));
  const done = new Set<number>();
  const sizes = zeros(size);
  for (let round = 0; round < size; round += 1) {
    const open = left.map((_, at) => at).filter((at) => !done.has(at));
    const pivot = open.reduce((best, at) => ((left[at]?.[at] ?? 0) > (left[best]?.[best] ?? 0) ? at : best), open[0] ?? 0);
    const value = left[pivot]?.[pivot] ?? 0;
    if (!(value > least)) break;
    sizes[pivot] = value;
    done.add(pivot);
    for (const at of open) if (at !== pivot) clear({ left, basis }, { at, pivot, factor: (left[at]?.[pivot] ?? 0) / value });
  }
  return { basis, sizes };
}

/** Takes the pivot's share out of a row, and out of the column that mirrors it. */
function clear({ left, basis }: { readonly left: number[][]; readonly basis: number[][] }, { at, pivot, factor }: { readonly at: number; readonly pivot: number; readonly factor: number }): void {
  const [row, from] = [left[at] ?? [], left[pivot] ?? []];
  row.forEach((value, k) => { row[k] = value - factor * (from[k] ?? 0); });
  for (const other of left) other[at] = (other[at] ?? 0) - factor * (other[pivot] ?? 0);
  const [own, taken] = [basis[at] ?? [], basis[pivot] ?? []];
  own.forEach((value, k) => { own[k] = value - factor * (taken[k] ?? 0); });
}

const timesEach = (basis: Matrix, columns: Matrix): number[][] => basis.map((row) => (columns[0] ?? []).map((_, at) => dot(row, columns.map((column) => column[at] ?? 0))));
