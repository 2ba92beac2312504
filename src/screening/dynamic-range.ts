import type { Demands, HeadroomDemand } from '../demands/index.js';
import type { Side } from '../parts/headroom.js';
import type { Readings } from '../parts/readings.js';

/** Swing of the output at the lowest supply with the currents of the stage, pessimistic, against one from rail to rail: V and dB. */
export interface DynamicRange {
  readonly available: number;
  readonly ideal: number;
  readonly lossDecibels: number;
}

/** What head-room takes of the dynamic range. Null where a head-room is not known, or nothing is left between the two. */
export function dynamicRange(demands: Demands, readings: Readings): DynamicRange | null {
  const ideal = demands['supply-low'].required;
  const low = largestHeadroom(demands['output-low'], { side: 'low', supply: ideal, readings });
  const high = largestHeadroom(demands['output-high'], { side: 'high', supply: ideal, readings });
  if (low === null || high === null) return null;
  const available = ideal - low - high;
  return available <= 0 ? null : { available, ideal, lossDecibels: 20 * Math.log10(ideal / available) };
}

interface At {
  readonly side: Side;
  readonly supply: number;
  readonly readings: Readings;
}

/** At the vertex of this supply that takes most. */
function largestHeadroom({ vertices }: HeadroomDemand, { side, supply, readings }: At): number | null {
  const curve = readings.headroom(side);
  const values = vertices.filter((vertex) => vertex.supply === supply).map((vertex) => curve(vertex).value);
  return values.reduce<number | null>((most, value) => (most === null || value === null ? null : Math.max(most, value)), 0);
}
