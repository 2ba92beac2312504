import { formatQuantity } from '../quantities/format.js';
import type { Stage, Vertex } from '../stage/index.js';
import { cornerOf } from './corner.js';
import type { Corner, InputHighDemand, NumberDemand } from './demand.js';

const SOURCE = 'M1: common mode at the pins over all corners (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 1-2, from memory)';

/** Stages whose pins stand at the reference, whatever the signal. */
const STILL: ReadonlySet<Stage['topology']> = new Set<Stage['topology']>(['inverting', 'summing', 'transimpedance', 'multiple-feedback-low-pass', 'integrator']);

/** The inputs rest at the reference. */
export const pinsAreStill = ({ topology }: Pick<Stage, 'topology'>): boolean => STILL.has(topology);

/** A demand with the corner it stands at. */
export interface CornerDemand extends NumberDemand {
  readonly corner: Corner;
}

/** Room the stage leaves between the input pins and V-, V. */
export function inputLow(stage: Stage): CornerDemand {
  const vertex = least(stage.vertices, (at) => at.commonMode);
  const because = `lowest common mode ${formatQuantity(vertex.commonMode, 'V')}`;
  return { check: 'input-low', required: vertex.commonMode, unit: 'V', sense: 'at-most', because, source: SOURCE, corner: cornerOf(vertex) };
}

/** Room the stage leaves between the input pins and V+, V. */
export function inputHigh(stage: Stage): InputHighDemand {
  const room = (at: Vertex): number => at.supply - at.commonMode;
  const farthest = Math.max(...stage.vertices.map(room));
  const vertex = least(stage.vertices, room);
  const because = `common mode ${formatQuantity(vertex.commonMode, 'V')} on a supply of ${formatQuantity(vertex.supply, 'V')}`;
  return { check: 'input-high', required: room(vertex), unit: 'V', sense: 'at-most', because, source: SOURCE, corner: cornerOf(vertex), farthest, still: pinsAreStill(stage) };
}

function least(vertices: readonly Vertex[], measure: (vertex: Vertex) => number): Vertex {
  return vertices.reduce((best, next) => (measure(next) < measure(best) ? next : best));
}
