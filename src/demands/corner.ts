import type { Vertex } from '../stage/index.js';
import type { Corner } from './demand.js';

/** A vertex as a verdict shows it: supply, reference and the inputs, volts. */
export function cornerOf(vertex: Pick<Vertex, 'supply' | 'reference' | 'inputs'>): Corner {
  return { supply: vertex.supply, reference: vertex.reference, ...vertex.inputs };
}
