import type { Stage } from '../../../../stage/index.js';
import type { Point } from '../../drawing/label-placing.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { resistor } from '../symbols/passive.js';
import { ohms, valueOf } from '../values.js';
import { referenceEnd, referenceTerminal } from './reference.js';
import { PIN } from '../symbols/amplifier.js';

/** The bias resistor of an AC-coupled + input, from the row up to the reference; nothing of a DC-coupled one. */
export function biasAbove(stage: Stage, from: Point, symbols: Symbols): Piece[] {
  if (stage.coupling === 'dc') return [];
  const value = valueOf(stage, 'plus', 'bias') ?? stage.referenceResistance;
  const end = at(from.x, from.y - 62);
  const body = value === 0 ? wire(from, end) : resistor(from, end, { label: ohms('Rbias', value), symbols });
  return [junction(from), body, ...referenceTerminal(stage, end, -1)];
}

/** The lower pin, resting at the reference. */
export function restingPin(stage: Stage, symbols: Symbols): Piece[] {
  const corner = at(PIN.lower.x - 18, PIN.lower.y);
  const end = at(corner.x, corner.y + 34);
  return [wire(PIN.lower, corner, end), ...referenceEnd(stage, end, { symbols, towards: 'down', bypass: 'left' })];
}
