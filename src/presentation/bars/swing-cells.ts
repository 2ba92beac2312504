import type { Lane } from '../page/plots/swing-lane.js';
import { cellOf, cellsBetween, cellsOf, endCellOf, type Scale } from './scale.js';
import type { Signs } from './signs.js';

/** One pin between the rails as a row of signs, V- at the left and V+ at the right, both marks included. */
export function swingCells(lane: Lane, cells: number, signs: Signs): string {
  const scale: Scale = { domain: [0, lane.supply], cells };
  const row = ground(lane, scale, signs);
  const put = (from: number, to: number, sign: string): void => { for (const at of cellsOf(scale, from, to)) row[at] = sign; };
  const { signal, band } = lane;
  const reach = reachOf(lane);
  put(reach.min, reach.max, signs.error);
  put(signal.min, signal.max, signs.full);
  if (band.high !== null && reach.max > band.high) put(Math.max(band.high, reach.min), reach.max, signs.missing);
  if (band.low !== null && reach.min < band.low) put(reach.min, Math.min(band.low, reach.max), signs.missing);
  return `${reach.min < 0 ? '<' : '|'}${row.join('')}${reach.max > lane.supply ? '>' : '|'}`;
}

/** The signal with what it may be off by, V against ground. */
function reachOf({ signal, error }: Lane): { readonly min: number; readonly max: number } {
  return { min: signal.min - error, max: signal.max + error };
}

/** What may be used and what the part keeps for itself, without any signal. An end that is not known is open from the middle on. */
function ground({ band, supply }: Lane, scale: Scale, signs: Signs): string[] {
  const row = Array.from({ length: scale.cells }, () => signs.free);
  const fill = (cells: readonly number[], sign: string): void => { for (const at of cells) row[at] = sign; };
  const middle = cellOf(scale, supply / 2);
  if (band.low === null) fill(cellsBetween(0, middle - 1), signs.open);
  else if (band.low > 0) fill(cellsBetween(0, cellOf(scale, band.low) - 1), signs.taken);
  if (band.high === null) fill(cellsBetween(middle, scale.cells - 1), signs.open);
  else if (band.high < supply) fill(cellsBetween(endCellOf(scale, band.high) + 1, scale.cells - 1), signs.taken);
  return row;
}
