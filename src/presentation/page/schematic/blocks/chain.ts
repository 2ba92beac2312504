import type { Point } from '../../drawing/label-placing.js';
import { at, wire, type Piece, type Symbols } from '../piece.js';
import { capacitor, resistor } from '../symbols/passive.js';

/** One part in a row: a resistor, a capacitor, or a plain piece of wire. */
export type Link = { readonly kind: 'resistor' | 'capacitor'; readonly label: string } | { readonly kind: 'wire'; readonly length: number };

/** Room for one part and its label: two neighbours never touch. */
export const LINK = 92;

const lengthOf = (link: Link): number => (link.kind === 'wire' ? link.length : LINK);

/** Parts in a row that ends at a point, told from left to right; `start` is where the row begins. */
export function chain(end: Point, links: readonly Link[], symbols: Symbols): { readonly start: Point; readonly pieces: readonly Piece[] } {
  const start = at(end.x - links.reduce((sum, link) => sum + lengthOf(link), 0), end.y);
  let from = start;
  const pieces = links.map((link) => {
    const to = at(from.x + lengthOf(link), from.y);
    const piece = link.kind === 'wire' ? wire(from, to) : link.kind === 'resistor' ? resistor(from, to, { label: link.label, symbols }) : capacitor(from, to, link.label);
    from = to;
    return piece;
  });
  return { start, pieces };
}
