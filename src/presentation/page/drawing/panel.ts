import type { Axis } from './axis.js';
import { FAINT } from './colours.js';
import type { Box } from './label-placing.js';
import { gridLine, rect, segment, text, SIZE } from './marks.js';

/** The area curves are drawn in, with its axes round it. */
export interface Panel {
  readonly box: Box;
  readonly x: Axis;
  readonly y: Axis;
}

/** Grid, frame, tick labels and both titles: the upright one stands above its axis, so that it is read without turning the head. */
export function panelMarkup({ box, x, y }: Panel): string {
  const [right, bottom] = [box.x + box.width, box.y + box.height];
  const middle = 0.35 * SIZE;
  return [
    ...x.ticks.map(({ at }) => gridLine({ x: at, y: box.y }, { x: at, y: bottom })),
    ...y.ticks.map(({ at }) => gridLine({ x: box.x, y: at }, { x: right, y: at })),
    rect(box, { stroke: FAINT }),
    ...x.ticks.map(({ at, label }) => text({ x: at, y: bottom + 18 }, label, { anchor: 'middle' })),
    ...y.ticks.map(({ at, label }) => text({ x: box.x - 7, y: at + middle }, label, { anchor: 'end' })),
    text({ x: box.x + box.width / 2, y: bottom + 37 }, x.title, { anchor: 'middle' }),
    text({ x: 6, y: box.y - 12 }, y.title),
  ].join('');
}

/** A line at one value of an axis, through the whole panel. */
export function levelLine({ box, y }: Panel, value: number, look: Parameters<typeof segment>[2]): string {
  const at = y.place(value);
  return segment({ x: box.x, y: at }, { x: box.x + box.width, y: at }, look);
}

export function uprightLine({ box, x }: Panel, value: number, look: Parameters<typeof segment>[2]): string {
  const at = x.place(value);
  return segment({ x: at, y: box.y }, { x: at, y: box.y + box.height }, look);
}
