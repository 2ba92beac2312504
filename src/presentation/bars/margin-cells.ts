import type { Margin } from '../page/plots/margins.js';
import { cellsBetween } from './scale.js';
import type { Signs } from './signs.js';

/** Shares of the limit from end to end; the limit itself is 0. */
export interface ShareScale {
  readonly least: number;
  readonly most: number;
  readonly cells: number;
}

/** The cell of the limit. */
export const limitCell = (scale: ShareScale): number => nearest(scale, 0);

/** The cell of a share. Only a share of nothing stands at the limit itself: a hair left, or missing, is seen. */
export function shareCell(scale: ShareScale, share: number): number {
  const [at, limit] = [nearest(scale, share), limitCell(scale)];
  if (share > 0) return Math.max(at, limit + 1);
  return share < 0 ? Math.min(at, limit - 1) : limit;
}

/** One margin as a row of signs, the limit a `|`; what goes on beyond an end says so with `<` or `>`. */
export function marginCells(margin: Margin, scale: ShareScale, signs: Signs): string {
  const row = Array.from({ length: scale.cells }, () => ' ');
  if (margin.outcome === 'unknown') putOpen(row, margin, { scale, signs });
  else if (margin.share !== null) putBar(row, margin.share, { scale, signs });
  row[limitCell(scale)] = '|';
  return row.join('');
}

interface Drawn {
  readonly scale: ShareScale;
  readonly signs: Signs;
}

function putBar(row: string[], share: number, { scale, signs }: Drawn): void {
  const [at, limit] = [shareCell(scale, share), limitCell(scale)];
  if (share > 0) for (const cell of cellsBetween(limit + 1, at)) row[cell] = signs.full;
  if (share < 0) for (const cell of cellsBetween(at, limit - 1)) row[cell] = signs.missing;
  putCut(row, share, scale);
}

/** From the worst to the best reading; to the end of the scale where one is not known. */
function putOpen(row: string[], { share, best }: Margin, { scale, signs }: Drawn): void {
  const ends = [share === null ? 0 : shareCell(scale, share), best === null ? scale.cells - 1 : shareCell(scale, best)];
  for (const cell of cellsBetween(Math.min(...ends), Math.max(...ends))) row[cell] = signs.free;
  for (const end of [share, best]) {
    if (end === null) continue;
    row[shareCell(scale, end)] = signs.open;
    putCut(row, end, scale);
  }
}

function putCut(row: string[], share: number, { least, most, cells }: ShareScale): void {
  if (share > most) row[cells - 1] = '>';
  if (share < least) row[0] = '<';
}

function nearest({ least, most, cells }: ShareScale, share: number): number {
  const held = Math.min(most, Math.max(least, share));
  return Math.round(((held - least) / (most - least)) * (cells - 1));
}
