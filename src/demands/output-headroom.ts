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
  const at = side === 'high' ? `highest output ${formatQuantity(output, 'V')}, least room on a supply of ${formatQuantity(least.supply, 'V')}` : `lowest output ${formatQuantity(output, 'V')}`;
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
  const bare = side === 'high' ? vertex.supply - vertex.output : vertex.output;
  const towards = (vertex.loadCurrent + vertex.networkCurrent) * (side === 'high' ? 1 : -1);
  return {
    room: bare + swingLoss(stage) - extraMargin(stage),
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
