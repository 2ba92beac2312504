import type { Box, LabelWish, Point } from '../drawing/label-placing.js';
import { tag } from '../drawing/markup.js';
import { INK } from '../drawing/colours.js';

/** Part of a schematic: what is drawn, what labels must keep off, and the labels it wants. */
export interface Piece {
  readonly markup: string;
  readonly boxes: readonly Box[];
  readonly labels: readonly LabelWish[];
}

/** IEC 60617 draws a resistor as a rectangle, IEEE 315 as a zigzag. */
export type Symbols = 'iec' | 'ieee';

export const LABEL = 13;

/** Lines of a symbol from path data. */
export const strokes = (d: string, fill = 'none'): string => tag('path', { d, fill, stroke: INK, 'stroke-width': '1.6', 'stroke-linejoin': 'round', 'stroke-linecap': 'round' });

/** A wire through these corners, all of them horizontal or vertical. */
export function wire(...corners: readonly Point[]): Piece {
  const d = corners.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${x},${y}`).join('');
  const boxes = corners.slice(1).map((to, at) => boxBetween(corners[at] ?? to, to, 2));
  return { markup: strokes(d), boxes, labels: [] };
}

/** The box round two points with air on every side. */
export function boxBetween(from: Point, to: Point, air: number): Box {
  return { x: Math.min(from.x, to.x) - air, y: Math.min(from.y, to.y) - air, width: Math.abs(to.x - from.x) + 2 * air, height: Math.abs(to.y - from.y) + 2 * air };
}

/** Where wires join. */
export function junction({ x, y }: Point): Piece {
  return { markup: tag('circle', { cx: x, cy: y, r: 3, fill: INK }), boxes: [{ x: x - 4, y: y - 4, width: 8, height: 8 }], labels: [] };
}

/** Above and below a horizontal part, right and left of a vertical one; farther out where that is taken. */
export function labelBeside(from: Point, to: Point, { reach, side }: { readonly reach: number; readonly side: 'left' | 'right' }): LabelWish['places'] {
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  const steps = [0, 6, 14, 24, 36, 52, 72];
  if (from.y === to.y) {
    return steps.flatMap((step) => [
      { x: middle.x, y: middle.y - reach - 4 - step, anchor: 'middle' as const },
      { x: middle.x, y: middle.y + reach + 13 + step, anchor: 'middle' as const },
    ]);
  }
  return steps.flatMap((step) => [0, -16, 16].flatMap((dy) => {
    const right = { x: middle.x + reach + 6 + step, y: middle.y + 4.5 + dy, anchor: 'start' as const };
    const left = { x: middle.x - reach - 6 - step, y: middle.y + 4.5 + dy, anchor: 'end' as const };
    return side === 'left' ? [left, right] : [right, left];
  }));
}

export const at = (x: number, y: number): Point => ({ x, y });
