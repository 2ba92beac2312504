import type { Stage } from '../../../../stage/index.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { PIN } from '../symbols/amplifier.js';
import { capacitor, resistor } from '../symbols/passive.js';
import { farads, ohms, valueOf } from '../values.js';
import { OUT } from './load.js';
import { referenceEnd } from './reference.js';
import { ground } from '../symbols/ends.js';

/** Where the summing node is, beside the upper pin. */
export const NODE = at(280, PIN.upper.y);
/** The − pin's corner where feedback comes from below. */
const CORNER = at(292, PIN.lower.y);

/** One part that leads from a node over the amplifier back to the output, at a height. */
export interface Loop {
  readonly kind: 'resistor' | 'capacitor';
  readonly label: string;
}

/** Loops above the amplifier, the first next to it. */
export function loopsAbove(loops: readonly Loop[], symbols: Symbols, from = NODE): Piece[] {
  const pieces = loops.flatMap(({ kind, label }, rank) => {
    const y = 66 - 50 * rank;
    const [left, right] = [at(340, y), at(415, y)];
    const body = kind === 'resistor' ? resistor(left, right, { label, symbols }) : capacitor(left, right, label);
    return [wire(at(from.x, y), left), body, wire(right, at(OUT.x, y)), ...(rank === loops.length - 1 ? [] : [junction(at(from.x, y)), junction(at(OUT.x, y))])];
  });
  const top = 66 - 50 * (loops.length - 1);
  return loops.length === 0 ? [] : [...pieces, wire(from, at(from.x, top)), wire(at(OUT.x, top), OUT), junction(from), junction(OUT)];
}

/** Feedback below the amplifier: a wire, or a resistor with the gain leg, and a capacitor across it. */
export function feedbackBelow(stage: Stage, symbols: Symbols): Piece[] {
  const feedback = valueOf(stage, 'minus', 'feedback');
  const y = 270;
  const node = at(CORNER.x, y);
  const around = [wire(PIN.lower, CORNER, node), wire(at(OUT.x, y), OUT), junction(OUT)];
  if (feedback === null) return [...around, wire(node, at(OUT.x, y))];
  const capacitance = valueOf(stage, 'minus', 'feedback capacitor');
  const across = capacitance === null ? [] : [wire(node, at(node.x, y + 50), at(345, y + 50)), capacitor(at(345, y + 50), at(415, y + 50), farads('Cf', capacitance)), wire(at(415, y + 50), at(OUT.x, y + 50), at(OUT.x, y)), junction(at(OUT.x, y))];
  return [...around, wire(node, at(345, y)), resistor(at(345, y), at(415, y), { label: ohms('Rf', feedback), symbols }), wire(at(415, y), at(OUT.x, y)), junction(node), ...across, ...gainLeg(stage, symbols, node)];
}

/** From the node left and down: clear of a capacitor across the feedback resistor. */
function gainLeg(stage: Stage, symbols: Symbols, node: { readonly x: number; readonly y: number }): Piece[] {
  const value = valueOf(stage, 'minus', 'gain leg');
  if (value === null) return [];
  const top = at(node.x - 50, node.y);
  const bottom = at(top.x, top.y + 66);
  const leg = [wire(node, top), resistor(top, bottom, { label: ohms('Rg', value), symbols })];
  if (stage.coupling === 'dc') return [...leg, ...referenceEnd(stage, bottom, { symbols, towards: 'down', bypass: 'left' })];
  return [...leg, capacitor(bottom, at(bottom.x, bottom.y + 50), 'C, large'), ground(at(bottom.x, bottom.y + 50))];
}
