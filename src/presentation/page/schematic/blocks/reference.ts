import type { Stage } from '../../../../stage/index.js';
import type { LabelWish, Point } from '../../drawing/label-placing.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { terminal } from '../symbols/amplifier.js';
import { ground } from '../symbols/ends.js';
import { capacitor, resistor } from '../symbols/passive.js';
import { farads, ohms, referenceWords } from '../values.js';

export interface Hanging {
  readonly symbols: Symbols;
  /** Which way it goes on from its point. */
  readonly towards: 'down' | 'up';
  /** On which side the bypass hangs. */
  readonly bypass: 'left' | 'right';
}

/** The reference at the end of a leg: ground, or a voltage behind the resistance it shows, with its bypass. */
export function referenceEnd(stage: Stage, from: Point, { symbols, towards, bypass }: Hanging): Piece[] {
  if (stage.ends.reference === 'ground') return [ground(from)];
  const sign = towards === 'down' ? 1 : -1;
  const { referenceResistance } = stage;
  const behind = referenceResistance === 0 ? from : at(from.x, from.y + sign * 60);
  const end = at(behind.x, behind.y + sign * 16);
  return [
    ...(referenceResistance === 0 ? [] : [resistor(from, behind, { label: ohms('Rref', referenceResistance), symbols })]),
    wire(behind, end),
    terminal(end, referenceWords(stage), beyond(end, sign)),
    ...(stage.ends.bypass === 0 || referenceResistance === 0 ? [] : bypassMarkup(stage.ends.bypass, from, bypass === 'left' ? -1 : 1)),
  ];
}

/** A voltage by its name alone, where another leg of the stage shows what it comes from. */
export function referenceTerminal(stage: Stage, from: Point, sign: 1 | -1): Piece[] {
  if (stage.ends.reference === 'ground') return [ground(from)];
  return [terminal(from, referenceWords(stage), beyond(from, sign))];
}

function bypassMarkup(value: number, from: Point, side: 1 | -1): Piece[] {
  const top = at(from.x + side * 50, from.y);
  const bottom = at(top.x, top.y + 46);
  return [wire(from, top), junction(from), capacitor(top, bottom, farads('Cref', value)), ground(bottom)];
}

function beyond({ x, y }: Point, sign: 1 | -1): LabelWish['places'] {
  const away = sign === 1 ? y + 22 : y - 12;
  return [0, 10, 22, 38, 56].flatMap((step) => [
    { x: x + 12 + step, y: y + 4.5, anchor: 'start' as const }, { x: x - 12 - step, y: y + 4.5, anchor: 'end' as const }, { x, y: away + sign * step, anchor: 'middle' as const },
  ]);
}
