import { INK } from '../../drawing/colours.js';
import type { Point } from '../../drawing/label-placing.js';
import { tag } from '../../drawing/markup.js';
import { at, LABEL, strokes, type Piece } from '../piece.js';

/** Pins of the amplifier: its triangle stands at one place in every schematic. */
export const PIN = { upper: at(310, 140), lower: at(310, 200), output: at(385, 170) } as const;
const SUPPLY = at(335, 133);
const RETURN = at(335, 207);

/** The amplifier between its rails; `plusOnTop`: the + input is the upper pin. */
export function amplifier({ plusOnTop, supply }: { readonly plusOnTop: boolean; readonly supply: string }): Piece {
  const [left, right] = [PIN.upper.x, PIN.output.x];
  const body = strokes(`M${left},112L${right},170L${left},228Z`);
  const rails = strokes(`M${SUPPLY.x},${SUPPLY.y}V112M${SUPPLY.x - 8},112H${SUPPLY.x + 8}M${RETURN.x},${RETURN.y}V226M${RETURN.x - 10},226H${RETURN.x + 10}M${RETURN.x - 6},230H${RETURN.x + 6}M${RETURN.x - 2},234H${RETURN.x + 2}`);
  const boxes = [...bodyBoxes(), { x: RETURN.x - 11, y: 206, width: 22, height: 30 }, { x: SUPPLY.x - 9, y: 110, width: 18, height: 24 }];
  const places = [0, 14, 28, 44].flatMap((step) => [
    { x: SUPPLY.x + 13 + step, y: 108 - step / 2, anchor: 'start' as const }, { x: SUPPLY.x, y: 105 - step, anchor: 'middle' as const }, { x: SUPPLY.x - 13 - step, y: 108 - step / 2, anchor: 'end' as const },
  ]);
  return { markup: body + rails + signs(plusOnTop), boxes, labels: [{ text: supply, size: LABEL, places }] };
}

/** The triangle in upright slices, so that labels may stand beside its slopes. */
function bodyBoxes(): Piece['boxes'] {
  const [left, width] = [PIN.upper.x - 2, 15.5];
  return [0, 1, 2, 3, 4].map((slice) => {
    const half = 60 - slice * 11.5;
    return { x: left + slice * width, y: 170 - half, width, height: 2 * half };
  });
}

/** Drawn as strokes, so that no face spells them too small. */
function signs(plusOnTop: boolean): string {
  const [plus, minus] = plusOnTop ? [PIN.upper, PIN.lower] : [PIN.lower, PIN.upper];
  return strokes(`M${plus.x + 7},${plus.y}h10M${plus.x + 12},${plus.y - 5}v10M${minus.x + 7},${minus.y}h10`);
}

/** An open circle: where the stage is left or entered. */
export function terminal({ x, y }: Point, label: string, places: Piece['labels'][number]['places']): Piece {
  return { markup: tag('circle', { cx: x, cy: y, r: 4, fill: 'var(--paper,#fff)', stroke: INK, 'stroke-width': '1.6' }), boxes: [{ x: x - 6, y: y - 6, width: 12, height: 12 }], labels: label === '' ? [] : [{ text: label, size: LABEL, places }] };
}
