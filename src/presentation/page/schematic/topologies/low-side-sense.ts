import type { Stage } from '../../../../stage/index.js';
import { chain, type Link } from '../blocks/chain.js';
import { feedbackBelow } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { currentArrow, ground } from '../symbols/ends.js';
import { resistor } from '../symbols/passive.js';
import { inputWords, ohms, sourceResistance, supplyWords } from '../values.js';

/** A shunt in the return of a load, read by a non-inverting stage. */
export function lowSideSense(stage: Stage, symbols: Symbols): Piece[] {
  const own = sourceResistance(stage);
  const series: Link[] = own === 0 ? [] : [{ kind: 'resistor', label: ohms('Rs', own) }];
  const { start, pieces } = chain(PIN.upper, [...series, { kind: 'wire', length: 120 }], symbols);
  const bottom = at(start.x, start.y + 70);
  return [
    amplifier({ plusOnTop: true, supply: supplyWords(stage) }),
    ...pieces,
    wire(at(start.x, start.y - 60), start),
    currentArrow(at(start.x, start.y - 32), inputWords(stage, 'current', 'A')),
    junction(start),
    resistor(start, bottom, { label: ohms('Rsh', stage.ends.shunt ?? 0), symbols, side: 'left' }),
    ground(bottom),
    ...feedbackBelow(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}
