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

/** Volts: far above what rounding and the tolerance of a comparison can turn, far below what matters. */
export const CLOSE = 1e-6;

/**
 * What the offset takes is the same at every vertex, so the least room left by the curve alone stays the least.
 * Null where a vertex has no number, or its room is none for any part: then every vertex counts.
 */
export function bindingVertices(vertices: readonly HeadroomVertex[], curve: Curve): Binding | null {
  const places: { vertex: HeadroomVertex; reading: HeadroomReading; left: number }[] = [];
  for (const vertex of tightestOf(vertices)) {
    const reading = curve(vertex);
    if (reading.value === null || !meets(vertex.room, 0, 'at-most')) return null;
    places.push({ vertex, reading, left: vertex.room - reading.value });
  }
  const least = Math.min(...places.map(({ left }) => left));
  return { places: places.filter(({ left }) => left <= least + CLOSE), basis: weakest(places.map(({ reading }) => reading.basis)) };
}

/** Of the vertices at which a curve is asked the same, those with the least room; found once for a stage. */
function tightestOf(vertices: readonly HeadroomVertex[]): readonly HeadroomVertex[] {
  const before = TIGHTEST.get(vertices);
  if (before !== undefined) return before;
  const least = new Map<string, number>();
  for (const vertex of vertices) least.set(questionOf(vertex), Math.min(vertex.room, least.get(questionOf(vertex)) ?? vertex.room));
  const tightest = vertices.filter((vertex) => vertex.room <= (least.get(questionOf(vertex)) ?? 0) + CLOSE);
  TIGHTEST.set(vertices, tightest);
  return tightest;
}

const questionOf = ({ supply, current, assistingLoad }: HeadroomVertex): string => `${supply} ${current} ${assistingLoad}`;

const TIGHTEST = new WeakMap<readonly HeadroomVertex[], readonly HeadroomVertex[]>();
