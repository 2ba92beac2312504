import { formatQuantity } from '../quantities/format.js';
import type { Stage, Vertex } from '../stage/index.js';
import { cornerOf } from './corner.js';
import type { HeadroomDemand, HeadroomVertex } from './demand.js';
import { farthestFrom25 } from './operating.js';

type Side = 'low' | 'high';

const SOURCE = 'M1 and M6: room at every corner, at the current that flows there';
/** Below this a current is no pull, A. */
const NO_PULL = 1e-12;

/** Room the stage leaves the output at one rail, at every vertex with the current that flows there. */
export function outputHeadroom(stage: Stage, side: Side): HeadroomDemand {
  const vertices = stage.vertices.map((vertex) => vertexOf(stage, side, vertex));
  const least = vertices.reduce((best, next) => (next.room < best.room ? next : best));
  const output = side === 'high' ? stage.output.max : stage.output.min;
  const at = whereText(stage, side, { output, supply: least.supply });
  return {
    check: side === 'high' ? 'output-high' : 'output-low',
    required: least.room,
    unit: 'V',
    sense: 'at-most',
    because: `${at}${extras(stage)}`,
    source: SOURCE,
    vertices,
    noiseGain: stage.dcNoiseGain.max,
    kelvin: farthestFrom25(stage).kelvin,
  };
}

function whereText({ response }: Stage, side: Side, { output, supply }: { output: number; supply: number }): string {
  const volts = formatQuantity(output, 'V');
  const least = `least room on a supply of ${formatQuantity(supply, 'V')}`;
  if (response.kind === 'oscillator') return `the ${side} level of the logic it drives, ${volts} at ${side === 'high' ? 'most' : 'least'}, ${least}`;
  return side === 'high' ? `highest output ${volts}, ${least}` : `lowest output ${volts}`;
}

/** Room at a vertex without what the team adds to or takes from it, V: where the output begins to clip. */
export function bareVertex(stage: Stage, side: Side, vertex: Vertex): HeadroomVertex {
  return { ...vertexOf(stage, side, vertex), room: bareRoom(side, vertex) };
}

const bareRoom = (side: Side, vertex: Vertex): number => (side === 'high' ? vertex.supply - vertex.output : vertex.output);

function extras(stage: Stage): string {
  const loss = swingLoss(stage);
  const margin = extraMargin(stage);
  return [
    ...(loss > 0 ? [`, ${formatQuantity(loss, 'V')} of swing may be missing`] : []),
    ...(margin > 0 ? [`, ${formatQuantity(margin, 'V')} kept as margin`] : []),
  ].join('');
}

const swingLoss = (stage: Stage): number => stage.asked.limits.swingLoss?.value ?? 0;
const extraMargin = (stage: Stage): number => stage.asked.margins.outputHeadroom?.value ?? 0;

function vertexOf(stage: Stage, side: Side, vertex: Vertex): HeadroomVertex {
  const towards = (vertex.loadCurrent + vertex.networkCurrent) * (side === 'high' ? 1 : -1);
  return {
    room: bareRoom(side, vertex) + swingLoss(stage) - extraMargin(stage),
    supply: vertex.supply,
    current: Math.max(0, towards),
    assistingLoad: assistingLoad(stage, side, vertex),
    corner: { ...cornerOf(vertex), load: vertex.loadCurrent + vertex.networkCurrent },
  };
}

/**
 * The load, where it and the whole current pull the output towards this rail, with the output moved inside by the swing
 * that may be missing. A load that pulls the same way lets a point measured with such help count.
 */
function assistingLoad(stage: Stage, side: Side, vertex: Vertex): number | null {
  const resistance = stage.load?.resistance ?? null;
  if (resistance === null) return null;
  const sign = side === 'high' ? -1 : 1;
  const move = sign * swingLoss(stage);
  const load = (vertex.loadCurrent + stage.loadConductance * move) * sign;
  const whole = load + (vertex.networkCurrent + stage.networkConductance * move) * sign;
  return load > NO_PULL && whole > NO_PULL ? resistance : null;
}
