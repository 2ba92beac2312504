import type { Stage } from '../../../stage/index.js';
import { INK, SERIES } from '../drawing/colours.js';
import { around, placeLabels, type Box, type LabelWish } from '../drawing/label-placing.js';
import { placedText } from '../drawing/marks.js';
import type { Panel } from '../drawing/panel.js';
import { said } from '../drawing/said.js';
import type { Validity } from './supply-temperature.js';

interface Drawn {
  readonly panel: Panel;
  readonly part: Box;
  readonly use: Box;
}

/** What every area and line is, each where it covers least. */
export function labels({ supply, temperature, supplyPeak }: Stage, valid: Validity, { panel, part, use }: Drawn): string[] {
  const { box, x } = panel;
  const corner = { x: use.x, y: use.y + use.height };
  const all: { readonly wish: LabelWish; readonly fill: string }[] = [
    { fill: SERIES.first.colour, wish: { text: `cold corner ${said(temperature.min, '°C')}`, size: 12, places: [10, 24].flatMap((gap) => around(corner, gap, 12)) } },
    { fill: SERIES.first.colour, wish: { text: `brown-out end ${said(supply.min, 'V')}`, size: 12, places: atLeftEdge(use) } },
    { fill: SERIES.first.colour, wish: { text: 'used', size: 13, places: insideOf(use) } },
    { fill: SERIES.third.colour, wish: { text: 'part specified', size: 13, places: insideOf(part) } },
    ...(supplyPeak > supply.max ? [{ fill: SERIES.first.colour, wish: upright(x.place(supplyPeak), box, `peak ${said(supplyPeak, 'V')}`) }] : []),
    ...(valid.absolute === null ? [] : [{ fill: INK, wish: upright(x.place(valid.absolute), box, `absolute maximum ${said(valid.absolute, 'V')}`) }]),
  ];
  const lines = [...(supplyPeak > supply.max ? [supplyPeak] : []), ...(valid.absolute === null ? [] : [valid.absolute])];
  const taken = [{ x: corner.x - 6, y: corner.y - 6, width: 12, height: 12 }];
  const placed = placeLabels(all.map(({ wish }) => wish), { bounds: { x: box.x + 3, y: box.y + 3, width: box.width - 6, height: box.height - 6 }, taken, curves: edgesOf([part, use, ...lines.map((at): Box => ({ x: x.place(at), y: box.y, width: 0, height: box.height }))]) });
  return placed.flatMap((one, at) => (one === null ? [] : [placedText(one, { fill: all[at]?.fill ?? INK })]));
}

/** Top left first, then the other corners, then right beside. */
function insideOf({ x, y, width, height }: Box): LabelWish['places'] {
  return [
    { x: x + 6, y: y + 16, anchor: 'start' }, { x: x + width - 6, y: y + 16, anchor: 'end' }, { x: x + 6, y: y + height - 8, anchor: 'start' },
    { x: x + width / 2, y: y + height / 2, anchor: 'middle' }, { x: x + width + 6, y: y + height / 2, anchor: 'start' }, { x: x - 6, y: y + height / 2, anchor: 'end' }, { x: x + width / 2, y: y - 6, anchor: 'middle' },
  ];
}

/** At the left edge and nowhere else, since that is the brown-out end: beside it at several heights, above it, then below it. */
function atLeftEdge({ x, y, height }: Box): LabelWish['places'] {
  const beside = [0.5, 0.25, 0.75, 0.05].map((share) => ({ x: x - 7, y: y + share * height + 5, anchor: 'end' as const }));
  const ends = [y - 8, y - 24, y - 40, y + height + 40, y + height + 56].flatMap((at) => [{ x: x + 2, y: at, anchor: 'end' as const }, { x, y: at, anchor: 'middle' as const }, { x: x - 2, y: at, anchor: 'start' as const }]);
  return [...beside, ...ends];
}

function upright(at: number, box: Box, words: string): LabelWish {
  const heights = [box.y + 16, box.y + 32, box.y + box.height - 8, box.y + box.height - 24];
  return { text: words, size: 12, places: heights.flatMap((y) => [{ x: at + 5, y, anchor: 'start' as const }, { x: at - 5, y, anchor: 'end' as const }]) };
}

/** Points along the edges, for labels to keep off. */
function edgesOf(boxes: readonly Box[]): { x: number; y: number }[] {
  return boxes.flatMap(({ x, y, width, height }) =>
    Array.from({ length: 41 }, (_, at) => at / 40).flatMap((share) => [{ x: x + share * width, y }, { x: x + share * width, y: y + height }, { x, y: y + share * height }, { x: x + width, y: y + share * height }]),
  );
}
