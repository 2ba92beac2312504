import { textWidth } from './text-width.js';

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

export type Anchor = 'start' | 'middle' | 'end';

/** A text on its baseline. */
export interface PlacedText extends Point {
  readonly text: string;
  readonly size: number;
  readonly anchor: Anchor;
}

/** Places a label would like, best first. */
export interface LabelWish {
  readonly text: string;
  readonly size: number;
  readonly places: readonly (Point & { readonly anchor: Anchor })[];
}

/** What labels must keep off: other boxes, and (less strictly) points of curves. All within the bounds. */
export interface Surface {
  readonly bounds: Box;
  readonly taken: readonly Box[];
  readonly curves: readonly Point[];
}

/** The box of a text with a little air around it: ascenders take 0.8 of the size, descenders 0.25. */
export function boxOf({ x, y, text, size, anchor }: PlacedText): Box {
  const width = textWidth(text, size);
  const left = anchor === 'start' ? x : anchor === 'end' ? x - width : x - width / 2;
  return { x: left, y: y - 0.8 * size, width, height: 1.05 * size };
}

export function overlaps(one: Box, other: Box): boolean {
  return one.x < other.x + other.width && other.x < one.x + one.width && one.y < other.y + other.height && other.y < one.y + one.height;
}

function within(inner: Box, outer: Box): boolean {
  return inner.x >= outer.x && inner.y >= outer.y && inner.x + inner.width <= outer.x + outer.width && inner.y + inner.height <= outer.y + outer.height;
}

/**
 * Each label in turn at the first of its places where it covers no other label and as few points of curves as can be; null where
 * every place is taken: the number is in the table then. Deterministic: order of labels, then order of places.
 */
export function placeLabels(wishes: readonly LabelWish[], surface: Surface): (PlacedText | null)[] {
  const taken = [...surface.taken];
  return wishes.map(({ text, size, places }) => {
    let best: { readonly placed: PlacedText; readonly cost: number } | null = null;
    for (const place of places) {
      const placed = { ...place, text, size };
      const box = boxOf(placed);
      if (!within(box, surface.bounds) || taken.some((other) => overlaps(box, other))) continue;
      const cost = pointsIn(box, surface.curves);
      if (best === null || cost < best.cost) best = { placed, cost };
      if (cost === 0) break;
    }
    if (best === null) return null;
    taken.push(boxOf(best.placed));
    return best.placed;
  });
}

function pointsIn({ x, y, width, height }: Box, points: readonly Point[]): number {
  let inside = 0;
  for (const point of points) if (point.x >= x && point.x <= x + width && point.y >= y && point.y <= y + height) inside += 1;
  return inside;
}

/** Eight places round a point, right and left first. */
export function around({ x, y }: Point, gap: number, size: number): LabelWish['places'] {
  const middle = y + 0.33 * size;
  return [
    { x: x + gap, y: middle, anchor: 'start' }, { x: x - gap, y: middle, anchor: 'end' }, { x, y: y - gap, anchor: 'middle' }, { x, y: y + gap + 0.8 * size, anchor: 'middle' },
    { x: x + gap, y: y - gap, anchor: 'start' }, { x: x + gap, y: y + gap + 0.6 * size, anchor: 'start' }, { x: x - gap, y: y - gap, anchor: 'end' }, { x: x - gap, y: y + gap + 0.6 * size, anchor: 'end' },
  ];
}

/** Positions moved apart to a least gap, as little as can be, within their ends; the order is kept. Too many: evenly spread. */
export function spreadApart(positions: readonly number[], gap: number, [least, most]: readonly [number, number]): number[] {
  const order = positions.map((position, at) => ({ position, at })).sort((a, b) => a.position - b.position || a.at - b.at);
  const step = order.length < 2 ? gap : Math.min(gap, (most - least) / (order.length - 1));
  const moved = order.map(({ position }) => Math.min(most, Math.max(least, position)));
  for (let at = 1; at < moved.length; at += 1) moved[at] = Math.max(moved[at] ?? 0, (moved[at - 1] ?? 0) + step);
  for (let at = moved.length - 1, limit = most; at >= 0; at -= 1, limit -= step) moved[at] = Math.min(moved[at] ?? 0, limit);
  const spread = new Array<number>(positions.length).fill(0);
  for (const [rank, { at }] of order.entries()) spread[at] = moved[rank] ?? 0;
  return spread;
}
