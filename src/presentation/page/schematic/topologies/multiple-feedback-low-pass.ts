import type { Stage } from '../../../../stage/index.js';
import { restingPin } from '../blocks/bias.js';
import { LINK } from '../blocks/chain.js';
import { driven, signalLinks } from '../blocks/drive.js';
import { loopsAbove, NODE } from '../blocks/feedback.js';
import { loadSide, OUT } from '../blocks/load.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { ground } from '../symbols/ends.js';
import { capacitor, resistor } from '../symbols/passive.js';
import { farads, ohms, supplyWords, valueOf } from '../values.js';

/** R1 into the inner node, R2 from it to the output, R3 on to the − input; C1 to the common return, C2 from the pin to the output. */
export function multipleFeedback(stage: Stage, symbols: Symbols): Piece[] {
  const r = (name: string): string => ohms(name, valueOf(stage, 'minus', name) ?? 0);
  const c = (name: string): string => farads(name, valueOf(stage, 'minus', name) ?? 0);
  const inner = at(NODE.x - LINK, NODE.y);
  const outer = 16;
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    ...driven(stage, NODE, { links: [...signalLinks(stage), { kind: 'resistor', label: r('R1') }, { kind: 'resistor', label: r('R3') }], symbols }),
    wire(NODE, PIN.upper),
    ...loopsAbove([{ kind: 'capacitor', label: c('C2') }], symbols),
    junction(inner),
    wire(inner, at(inner.x, outer), at(340, outer)),
    resistor(at(340, outer), at(415, outer), { label: r('R2'), symbols }),
    wire(at(415, outer), at(OUT.x, outer), at(OUT.x, 66)),
    junction(at(OUT.x, 66)),
    capacitor(inner, at(inner.x, inner.y + 66), c('C1')),
    ground(at(inner.x, inner.y + 66)),
    ...restingPin(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}
