import type { Box, Point } from '../../drawing/label-placing.js';
import { boxBetween, LABEL, labelBeside, strokes, type Piece, type Symbols } from '../piece.js';

/** Half the length of a body, and half its width. */
const [HALF, WIDE] = [20, 7] as const;
/** Half the gap of a capacitor, and half its plates. */
const [GAP, PLATE] = [3.5, 12] as const;

/** Along the part (1) and across it, as steps of x and y. */
function directions(from: Point, to: Point): { readonly along: Point; readonly across: Point } {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const along = { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
  return { along, across: { x: -along.y, y: along.x } };
}

/** A place by its distance along the part from its middle, and across it. */
function placing(from: Point, to: Point): (along: number, across: number) => string {
  const { along, across } = directions(from, to);
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  return (a, c) => `${middle.x + a * along.x + c * across.x},${middle.y + a * along.y + c * across.y}`;
}

export interface Resistor {
  readonly label: string;
  readonly symbols: Symbols;
  /** Where the label of an upright one stands by preference; right unless said. */
  readonly side?: 'left' | 'right';
}

/** Between two points at least 46 apart, on one line. */
export function resistor(from: Point, to: Point, { label, symbols, side = 'right' }: Resistor): Piece {
  const place = placing(from, to);
  const leads = `M${from.x},${from.y}L${place(-HALF, 0)}M${place(HALF, 0)}L${to.x},${to.y}`;
  const body = symbols === 'iec' ? `M${place(-HALF, -WIDE)}L${place(HALF, -WIDE)}L${place(HALF, WIDE)}L${place(-HALF, WIDE)}Z` : zigzag(place);
  return { markup: strokes(leads + body), boxes: [boxBetween(from, to, 2), bodyBox(from, to, { wide: WIDE, half: HALF })], labels: labelled(label, labelBeside(from, to, { reach: WIDE, side })) };
}

/** Three full waves over the length of the body. */
function zigzag(place: (along: number, across: number) => string): string {
  const step = (2 * HALF) / 12;
  const peaks = [1, 3, 5, 7, 9, 11].map((number, at) => `L${place(-HALF + number * step, at % 2 === 0 ? -WIDE : WIDE)}`);
  return `M${place(-HALF, 0)}${peaks.join('')}L${place(HALF, 0)}`;
}

/** Two plates of one length: not polarised. */
export function capacitor(from: Point, to: Point, label: string): Piece {
  const place = placing(from, to);
  const plates = [-GAP, GAP].map((along) => `M${place(along, -PLATE)}L${place(along, PLATE)}`).join('');
  const leads = `M${from.x},${from.y}L${place(-GAP, 0)}M${place(GAP, 0)}L${to.x},${to.y}`;
  return { markup: strokes(leads + plates), boxes: [boxBetween(from, to, 2), bodyBox(from, to, { wide: PLATE, half: GAP + 2 })], labels: labelled(label, labelBeside(from, to, { reach: PLATE, side: 'right' })) };
}

function bodyBox(from: Point, to: Point, { wide, half }: { readonly wide: number; readonly half: number }): Box {
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  const isLevel = from.y === to.y;
  const [halfWidth, halfHeight] = isLevel ? [half, wide] : [wide, half];
  return { x: middle.x - halfWidth, y: middle.y - halfHeight, width: 2 * halfWidth, height: 2 * halfHeight };
}

function labelled(label: string, places: Piece['labels'][number]['places']): Piece['labels'] {
  return label === '' ? [] : [{ text: label, size: LABEL, places }];
}
