import type { Stage } from '../../../../stage/index.js';
import { chain } from '../blocks/chain.js';
import { feedbackBelow } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { referenceEnd } from '../blocks/reference.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { currentArrow, supplyBar } from '../symbols/ends.js';
import { resistor } from '../symbols/passive.js';
import { inputWords, ohms, supplyWords, valueOf } from '../values.js';
import { legLinks } from './difference.js';

/** A shunt in the supply line of a load, read by a difference stage: the + leg at the bus, the − leg behind the shunt. */
export function highSideSense(stage: Stage, symbols: Symbols): Piece[] {
  const plus = at(PIN.upper.x - 90, PIN.upper.y);
  const minus = at(PIN.lower.x - 18, PIN.lower.y);
  const upper = chain(plus, legLinks(stage, { name: 'R3', element: 'positive input', pin: 'plus' }), symbols);
  const lower = chain(minus, [{ kind: 'wire', length: minus.x - plus.x }, ...legLinks(stage, { name: 'R1', element: 'input', pin: 'minus' })], symbols);
  const top = at(plus.x, plus.y - 66);
  const { start } = upper;
  return [
    amplifier({ plusOnTop: true, supply: supplyWords(stage) }),
    ...upper.pieces,
    wire(plus, PIN.upper),
    junction(plus),
    resistor(plus, top, { label: ohms('R4', valueOf(stage, 'plus', 'to reference') ?? 0), symbols }),
    ...referenceEnd(stage, top, { symbols, towards: 'up', bypass: 'left' }),
    ...lower.pieces,
    junction(minus),
    ...line(stage, start, { symbols, behind: at(start.x, minus.y) }),
    ...feedbackBelow(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}

/** Bus, shunt, and on to the load. */
function line(stage: Stage, start: { readonly x: number; readonly y: number }, { symbols, behind }: { readonly symbols: Symbols; readonly behind: { readonly x: number; readonly y: number } }): Piece[] {
  return [
    wire(at(start.x, start.y - 40), start),
    supplyBar(at(start.x, start.y - 40), `bus ${inputWords(stage, 'bus', 'V')}`),
    junction(start),
    resistor(start, behind, { label: ohms('Rsh', stage.ends.shunt ?? 0), symbols, side: 'left' }),
    junction(behind),
    wire(behind, at(behind.x, behind.y + 70)),
    currentArrow(at(behind.x, behind.y + 66), `${inputWords(stage, 'current', 'A')} to the load`),
  ];
}
