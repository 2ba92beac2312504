import type { Point } from './label-placing.js';

/** The pieces of a curve between two heights (top above bottom, as y grows downwards), cut exactly at both. */
export function clipped(points: readonly Point[], top: number, bottom: number): Point[][] {
  const pieces: Point[][] = [];
  let piece: Point[] = [];
  const close = (): void => {
    if (piece.length > 1) pieces.push(piece);
    piece = [];
  };
  for (const [at, point] of points.entries()) {
    const before = points[at - 1];
    const [enter, leave] = before === undefined ? [point, point] : ends(before, point, [top, bottom]);
    if (enter === null) {
      close();
      continue;
    }
    if (before !== undefined && (piece.length === 0 || enter !== before)) {
      close();
      piece.push(enter);
    }
    if (before !== undefined || isInside(point, top, bottom)) piece.push(leave);
    if (leave !== point) close();
  }
  close();
  return pieces;
}

const isInside = ({ y }: Point, top: number, bottom: number): boolean => y >= top && y <= bottom;

/** Where a segment enters and leaves; null: it stays outside. */
function ends(from: Point, to: Point, [top, bottom]: readonly [number, number]): [Point, Point] | [null, null] {
  if (Math.max(from.y, to.y) < top || Math.min(from.y, to.y) > bottom) return [null, null];
  const at = (y: number): Point => ({ x: from.x + ((y - from.y) / (to.y - from.y)) * (to.x - from.x), y });
  const inside = (point: Point): Point => (point.y < top ? at(top) : point.y > bottom ? at(bottom) : point);
  return [inside(from), inside(to)];
}
