import type { HeadroomVertex } from '../demands/index.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { HeadroomQuestion, HeadroomReading } from '../parts/headroom-curve.js';
import { meets } from '../verdicts/compare.js';

/** Head-room a part needs at a vertex. */
export type Curve = (question: HeadroomQuestion) => HeadroomReading;

/** The vertices at which parts with one curve can be decided, with what they need there, and the weakest basis of all vertices. */
export interface Binding {
  readonly places: readonly { readonly vertex: HeadroomVertex; readonly reading: HeadroomReading }[];
  readonly basis: Basis;
}

/**
 * What the offset takes is the same at every vertex, so the least room left by the curve alone stays the least: found once for a curve.
 * Null where a vertex has no number, or its room is none for any part: then every vertex counts.
 */
export function bindingVertices(vertices: readonly HeadroomVertex[], curve: Curve): Binding | null {
  const known = KNOWN.get(curve) ?? new Map<readonly HeadroomVertex[], Binding | null>();
  KNOWN.set(curve, known);
  const before = known.get(vertices);
  if (before !== undefined) return before;
  const found = bindingOf(vertices, curve);
  known.set(vertices, found);
  return found;
}

const KNOWN = new WeakMap<Curve, Map<readonly HeadroomVertex[], Binding | null>>();

/** Volts: far above what rounding and the tolerance of a comparison can turn, far below what matters. */
const CLOSE = 1e-6;

function bindingOf(vertices: readonly HeadroomVertex[], curve: Curve): Binding | null {
  const places: { vertex: HeadroomVertex; reading: HeadroomReading; left: number }[] = [];
  for (const vertex of vertices) {
    const reading = curve(vertex);
    if (reading.value === null || !meets(vertex.room, 0, 'at-most')) return null;
    places.push({ vertex, reading, left: vertex.room - reading.value });
  }
  const least = Math.min(...places.map(({ left }) => left));
  return { places: places.filter(({ left }) => left <= least + CLOSE), basis: weakest(places.map(({ reading }) => reading.basis)) };
}
