import { boxOf, placeLabels, type Box } from '../drawing/label-placing.js';
import { placedText } from '../drawing/marks.js';
import type { Piece } from './piece.js';

export interface Composed {
  readonly body: string;
  readonly width: number;
  readonly height: number;
  /** Labels that found no place without covering something: none, or the vocabulary is wrong. */
  readonly unplaced: readonly string[];
}

const MARGIN = 14;
/** Far more than any schematic needs: its size follows from what stands in it. */
const EVERYWHERE: Box = { x: -5000, y: -5000, width: 10_000, height: 10_000 };

/** Pieces with their labels placed clear of everything drawn, moved to the origin. */
export function compose(pieces: readonly Piece[]): Composed {
  const boxes = pieces.flatMap((piece) => piece.boxes);
  const wishes = pieces.flatMap(({ labels }) => labels);
  const placed = placeLabels(wishes, { bounds: EVERYWHERE, taken: boxes, curves: [] });
  const shown = placed.flatMap((one) => one ?? []);
  const all = [...boxes, ...shown.map(boxOf)];
  const [left, top] = [Math.min(...all.map(({ x }) => x)) - MARGIN, Math.min(...all.map(({ y }) => y)) - MARGIN];
  const right = Math.max(...all.map(({ x, width }) => x + width)) + MARGIN;
  const bottom = Math.max(...all.map(({ y, height }) => y + height)) + MARGIN;
  const drawn = pieces.map(({ markup }) => markup).join('') + shown.map((label) => placedText(label)).join('');
  return {
    body: `<g transform="translate(${Math.round(-left)},${Math.round(-top)})">${drawn}</g>`,
    width: Math.ceil(right - left),
    height: Math.ceil(bottom - top),
    unplaced: wishes.flatMap(({ text }, at) => (placed[at] === null ? [text] : [])),
  };
}
