import type { Stage, Vertex } from '../stage/index.js';

/** The vertices of one supply and reference: there the signal swings while the rails stand still. */
export interface CornerGroup {
  readonly supply: number;
  readonly reference: number;
  readonly vertices: readonly Vertex[];
}

export function cornerGroups({ vertices }: Stage): CornerGroup[] {
  const groups = new Map<string, Vertex[]>();
  for (const vertex of vertices) {
    const key = `${vertex.supply}/${vertex.reference}`;
    groups.set(key, [...(groups.get(key) ?? []), vertex]);
  }
  return [...groups.values()].flatMap((group) => {
    const [first] = group;
    return first === undefined ? [] : [{ supply: first.supply, reference: first.reference, vertices: group }];
  });
}

/** The vertices with the lowest and the highest of something. */
export function endsOf(vertices: readonly Vertex[], measure: (vertex: Vertex) => number): readonly [Vertex, Vertex] {
  const pick = (sign: 1 | -1): Vertex => vertices.reduce((best, next) => (sign * measure(next) > sign * measure(best) ? next : best));
  return [pick(-1), pick(1)];
}

/** Current out of the output, A: load and feedback network. */
export const currentOut = (vertex: Vertex): number => vertex.loadCurrent + vertex.networkCurrent;
