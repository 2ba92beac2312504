import { INK } from '../../drawing/colours.js';
import type { LabelWish, Point } from '../../drawing/label-placing.js';
import { tag } from '../../drawing/markup.js';
import { LABEL, strokes, type Piece } from '../piece.js';

/** The common return, hanging from a point. */
export function ground({ x, y }: Point): Piece {
  return { markup: strokes(`M${x},${y}v8M${x - 10},${y + 8}h20M${x - 6},${y + 12}h12M${x - 2},${y + 16}h4`), boxes: [{ x: x - 11, y, width: 22, height: 18 }], labels: [] };
}

/** A bar on a stub: a supply. */
export function supplyBar({ x, y }: Point, label: string): Piece {
  const places = [0, 12, 26, 42].flatMap((step): LabelWish['places'] => [
    { x, y: y - 14 - step, anchor: 'middle' }, { x: x + 13 + step, y: y - 4, anchor: 'start' }, { x: x - 13 - step, y: y - 4, anchor: 'end' },
  ]);
  return { markup: strokes(`M${x},${y}v-8M${x - 8},${y - 8}h16`), boxes: [{ x: x - 9, y: y - 10, width: 18, height: 10 }], labels: label === '' ? [] : [{ text: label, size: LABEL, places }] };
}

const RADIUS = 15;

/** A voltage source from a point down to the common return; the wave says: a signal. */
export function source({ x, y }: Point, labels: readonly string[]): Piece {
  const middle = y + 40;
  const circle = tag('circle', { cx: x, cy: middle, r: RADIUS, fill: 'none', stroke: INK, 'stroke-width': '1.6' });
  const lines = strokes(`M${x},${y}V${middle - RADIUS}M${x},${middle + RADIUS}V${y + 70}M${x - 8},${middle}q4,-9 8,0t8,0`);
  const below = ground({ x, y: y + 70 });
  const texts = labels.map((text, at): LabelWish => ({
    text, size: LABEL,
    places: [0, 8, 20, 36].flatMap((step) => [
      { x: x + RADIUS + 8, y: middle + 4 + 17 * at + step, anchor: 'start' as const }, { x, y: y + 106 + 17 * at + step, anchor: 'middle' as const }, { x: x - RADIUS - 8 - step, y: middle + 4 + 17 * at, anchor: 'end' as const },
    ]),
  }));
  const box = { x: x - RADIUS - 2, y, width: 2 * RADIUS + 4, height: 70 };
  return { markup: circle + lines + below.markup, boxes: [box, ...below.boxes], labels: texts };
}

/** An arrow on a vertical wire, pointing down: a current. */
export function currentArrow({ x, y }: Point, label: string): Piece {
  const places = [0, 10, 22, 40].flatMap((step): LabelWish['places'] => [{ x: x + 12 + step, y: y + 2, anchor: 'start' }, { x: x - 12 - step, y: y + 2, anchor: 'end' }, { x, y: y - 16 - step, anchor: 'middle' }]);
  return { markup: strokes(`M${x - 5},${y - 6}L${x},${y + 3}L${x + 5},${y - 6}Z`, INK), boxes: [{ x: x - 6, y: y - 7, width: 12, height: 11 }], labels: [{ text: label, size: LABEL, places }] };
}
