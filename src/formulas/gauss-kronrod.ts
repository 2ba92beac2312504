import { cell } from './cells.js';

/** Points of one panel. */
export const PANEL_POINTS = 15;

const HALF_NODES = [
  0.991455371120812639206854697526329, 0.949107912342758524526189684047851, 0.864864423359769072789712788640926,
  0.741531185599394439863864773280788, 0.586087235467691130294144691258377, 0.405845151377397166906606412076961,
  0.207784955007898467600689403773245,
];
const HALF_KRONROD = [
  0.022935322010529224963732008058970, 0.063092092629978553290700663189204, 0.104790010322250183839876322541518,
  0.140653259715525918745189590510238, 0.169004726639267902826583426598550, 0.190350578064785409913256402421014,
  0.204432940075298892414161999234649,
];
const HALF_GAUSS = [0, 0.129484966168869693270611432679082, 0, 0.279705391489276667901467771423780, 0, 0.381830050505118944950369775488975, 0];

/** Nodes on −1..1, ascending. */
export const KRONROD_NODES: readonly number[] = [...HALF_NODES.map((x) => -x), 0, ...HALF_NODES.toReversed()];

/** Weights of the 15-point rule, exact for polynomials up to degree 23. Source: as panelIntegral(). */
export const KRONROD_WEIGHTS: readonly number[] = [...HALF_KRONROD, 0.209482141084727828012999174891714, ...HALF_KRONROD.toReversed()];

/** Weights of the embedded 7-point Gauss–Legendre rule, 0 at the nodes it does not use. Source: as panelIntegral(). */
export const GAUSS_WEIGHTS: readonly number[] = [...HALF_GAUSS, 0.417959183673469387755102040816327, ...HALF_GAUSS.toReversed()];

/** Row by row: what turns the values at the nodes of a panel into those at the nodes of its two halves. */
const HALVING = Float64Array.from(
  [-0.5, 0.5].flatMap((middle) => KRONROD_NODES.flatMap((node) => KRONROD_NODES.map((_, j) => lagrange(j, middle + node / 2)))),
);

/**
 * Integral over one panel by 15 points, and how far the 7-point Gauss–Legendre rule inside it is off: the measure of its error.
 * @param values any unit, at the 15 nodes mapped to the panel
 * @param width of the panel, above 0
 * @returns unit × width
 * @example panelIntegral(KRONROD_NODES.map((x) => x ** 4), 2).integral is 0.4
 * Source: Kronrod, Nodes and Weights of Quadrature Formulas (1965); Piessens et al., QUADPACK (1983) (both from memory).
 */
export function panelIntegral(values: readonly number[], width: number): { readonly integral: number; readonly difference: number } {
  let [integral, difference] = [0, 0];
  KRONROD_WEIGHTS.forEach((weight, i) => {
    const value = (values[i] ?? NaN) * width * 0.5;
    integral += weight * value;
    difference += (weight - (GAUSS_WEIGHTS[i] ?? NaN)) * value;
  });
  return { integral, difference: Math.abs(difference) };
}

/**
 * Values at the nodes of a panel's two halves, from those at its own: the polynomial through 15 points.
 * @param values any unit, panels one after another
 * @param from index of the panel's first value
 * @returns 30 values of the same unit
 * @example halvedPanel(Float64Array.from(KRONROD_NODES), 0)[7] is −0.5
 * Source: Lagrange interpolation, any text on numerical methods.
 */
export function halvedPanel(values: Float64Array, from: number): Float64Array {
  const halves = new Float64Array(2 * PANEL_POINTS);
  for (let i = 0; i < halves.length; i += 1) {
    let sum = 0;
    for (let j = 0; j < PANEL_POINTS; j += 1) sum += cell(HALVING, i * PANEL_POINTS + j) * cell(values, from + j);
    halves[i] = sum;
  }
  return halves;
}

function lagrange(j: number, x: number): number {
  const own = KRONROD_NODES[j] ?? NaN;
  return KRONROD_NODES.reduce((product, node, k) => (k === j ? product : (product * (x - node)) / (own - node)), 1);
}
