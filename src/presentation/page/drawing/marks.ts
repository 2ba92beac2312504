import { line as lineOf } from 'd3-shape';
import { GRID, INK, PAPER, type MarkerShape, type Series } from './colours.js';
import type { Anchor, Box, PlacedText, Point } from './label-placing.js';
import { tag, xml } from './markup.js';

/** Text size of everything but titles; 12 px is the least a figure may show. */
export const SIZE = 13;

export interface TextLook {
  readonly fill?: string;
  readonly anchor?: Anchor;
  readonly size?: number;
  readonly weight?: 'bold';
}

/** Text on its baseline, with the paper showing round it where it crosses a line. */
export function text(at: Point, words: string, look: TextLook = {}): string {
  const { fill, anchor = 'start', size = SIZE, weight } = look;
  const attributes = {
    x: at.x, y: at.y, fill, 'text-anchor': anchor === 'start' ? undefined : anchor, 'font-size': size === SIZE ? undefined : size, 'font-weight': weight,
    stroke: PAPER, 'stroke-width': '3', 'stroke-linejoin': 'round', 'paint-order': 'stroke',
  };
  return tag('text', attributes, xml(words));
}

export function placedText(placed: PlacedText, look: TextLook = {}): string {
  return text(placed, placed.text, { ...look, anchor: placed.anchor, size: placed.size });
}

export interface LineLook {
  readonly colour?: string;
  readonly width?: string;
  readonly dash?: string | undefined;
}

export function segment(from: Point, to: Point, { colour = INK, width = '1', dash }: LineLook = {}): string {
  return tag('path', { d: path([from, to]), fill: 'none', stroke: colour, 'stroke-width': width, 'stroke-dasharray': dash });
}

/** A curve of a series; more than one piece where it leaves the panel. */
export function curve(pieces: readonly (readonly Point[])[], series: Series, width = '2'): string {
  const d = pieces.map(path).join('');
  return d === '' ? '' : tag('path', { d, fill: 'none', stroke: series.colour, 'stroke-width': width, 'stroke-dasharray': series.dash, 'stroke-linejoin': 'round' });
}

const drawn = lineOf<Point>()
  .x(({ x }) => x)
  .y(({ y }) => y)
  .digits(1);

function path(points: readonly Point[]): string {
  const d = drawn(points) ?? '';
  if (/NaN|Infinity/u.test(d)) throw new RangeError('a curve leaves what a drawing can place');
  return d;
}

export interface RectLook {
  readonly fill?: string;
  readonly opacity?: string;
  readonly stroke?: string;
  readonly dash?: string | undefined;
  readonly width?: string;
}

export function rect({ x, y, width, height }: Box, { fill = 'none', opacity, stroke, dash, width: thickness }: RectLook): string {
  return tag('rect', { x, y, width, height, fill, 'fill-opacity': opacity, stroke, 'stroke-dasharray': dash, 'stroke-width': thickness });
}

/** Slanting lines inside a box: a fill that needs no colour and no reference to another element. */
export function hatch({ x, y, width, height }: Box, colour: string, step = 6): string {
  const strokes: string[] = [];
  for (let start = step; start < width + height; start += step) {
    const from = { x: x + Math.min(start, width), y: y + Math.max(0, start - width) };
    const to = { x: x + Math.max(0, start - height), y: y + Math.min(start, height) };
    strokes.push(path([from, to]));
  }
  return strokes.length === 0 ? '' : tag('path', { d: strokes.join(''), fill: 'none', stroke: colour, 'stroke-width': '1' });
}

const SHAPES: Readonly<Record<MarkerShape, (r: number) => string>> = {
  circle: (r) => `M${-r},0a${r},${r} 0 1,0 ${2 * r},0a${r},${r} 0 1,0 ${-2 * r},0Z`,
  square: (r) => `M${-r},${-r}H${r}V${r}H${-r}Z`,
  triangle: (r) => `M0,${-r - 1}L${r + 1},${r}H${-r - 1}Z`,
  diamond: (r) => `M0,${-r - 1}L${r + 1},0L0,${r + 1}L${-r - 1},0Z`,
  cross: (r) => `M${-r},${-r}L${r},${r}M${r},${-r}L${-r},${r}`,
};

export interface MarkerLook {
  readonly colour: string;
  readonly hollow?: boolean;
  readonly radius?: number;
}

export function marker({ x, y }: Point, shape: MarkerShape, { colour, hollow = false, radius = 4 }: MarkerLook): string {
  const open = hollow || shape === 'cross';
  return tag('path', { d: SHAPES[shape](radius), transform: `translate(${Number(x.toFixed(1))},${Number(y.toFixed(1))})`, fill: open ? (shape === 'cross' ? 'none' : PAPER) : colour, stroke: colour, 'stroke-width': '1.5' });
}

export const gridLine = (from: Point, to: Point): string => segment(from, to, { colour: GRID });
