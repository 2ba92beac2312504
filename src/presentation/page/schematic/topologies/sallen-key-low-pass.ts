import type { Stage } from '../../../../stage/index.js';
import { biasAbove } from '../blocks/bias.js';
import { LINK } from '../blocks/chain.js';
import { driven, signalLinks } from '../blocks/drive.js';
import { feedbackBelow } from '../blocks/feedback.js';
import { loadSide, OUT } from '../blocks/load.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { ground } from '../symbols/ends.js';
import { capacitor } from '../symbols/passive.js';
import { farads, ohms, supplyWords, valueOf } from '../values.js';

/** Two resistors in a row, one capacitor to the common return, one back from the output. */
export function sallenKey(stage: Stage, symbols: Symbols): Piece[] {
  const pin = at(PIN.upper.x - 44, PIN.upper.y);
  const inner = at(pin.x - LINK, pin.y);
  const row = (name: string): { kind: 'resistor'; label: string } => ({ kind: 'resistor', label: ohms(name, valueOf(stage, 'plus', name) ?? 0) });
  const c = (name: string): string => farads(name, valueOf(stage, 'plus', name) ?? 0);
  const y = 60;
  return [
    amplifier({ plusOnTop: true, supply: supplyWords(stage) }),
    ...driven(stage, pin, { links: [...signalLinks(stage), row('R1'), row('R2')], symbols }),
    ...biasAbove(stage, at(inner.x - LINK, inner.y), symbols),
    wire(pin, PIN.upper),
    junction(pin),
    capacitor(pin, at(pin.x, pin.y + 66), c('C2')),
    ground(at(pin.x, pin.y + 66)),
    junction(inner),
    wire(inner, at(inner.x, y), at(290, y)),
    capacitor(at(290, y), at(380, y), c('C1')),
    wire(at(380, y), at(OUT.x, y), OUT),
    ...feedbackBelow(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}
