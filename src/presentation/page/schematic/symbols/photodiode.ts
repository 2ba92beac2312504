import { INK } from '../../drawing/colours.js';
import type { Point } from '../../drawing/label-placing.js';
import { LABEL, strokes, type Piece } from '../piece.js';

/** A photodiode between an upper and a lower point, its cathode on top: the photocurrent runs down through it. Light comes from the left. */
export function photodiode(upper: Point, lower: Point, labels: readonly string[]): Piece {
  const { x } = upper;
  const middle = (upper.y + lower.y) / 2;
  const body = strokes(`M${x},${upper.y}V${middle - 8}M${x - 11},${middle - 8}h22M${x},${middle - 8}L${x - 11},${middle + 9}h22ZM${x},${middle + 9}V${lower.y}`);
  const light = [-9, 4].map((dy) => strokes(`M${x - 36},${middle - 12 + dy}l18,9`) + strokes(`M${x - 18},${middle - 3 + dy}l-8,0.5l3.5,-6.5Z`, INK)).join('');
  const boxes = [{ x: x - 12, y: upper.y, width: 24, height: lower.y - upper.y }, { x: x - 38, y: middle - 23, width: 26, height: 30 }];
  const texts = labels.map((text, at) => ({
    text, size: LABEL,
    places: [0, 8, 20, 40, 60].flatMap((step) => [{ x: x - 44 - step, y: middle - 8 + 17 * at, anchor: 'end' as const }, { x: x + 18 + step, y: middle + 4 + 17 * at, anchor: 'start' as const }]),
  }));
  return { markup: body + light, boxes, labels: texts };
}
