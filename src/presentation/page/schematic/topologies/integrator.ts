import type { Stage } from '../../../../stage/index.js';
import { restingPin } from '../blocks/bias.js';
import { driven, signalLinks } from '../blocks/drive.js';
import { loopsAbove, NODE } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { farads, ohms, supplyWords, valueOf } from '../values.js';

/** A resistor into the − input, a capacitor back, and what bleeds it. */
export function integrator(stage: Stage, symbols: Symbols): Piece[] {
  const bleed = valueOf(stage, 'minus', 'bleed');
  const loops = [
    { kind: 'capacitor' as const, label: farads('C', valueOf(stage, 'minus', 'integrating capacitor') ?? 0) },
    ...(bleed === null ? [] : [{ kind: 'resistor' as const, label: ohms('Rf', bleed) }]),
  ];
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    ...driven(stage, NODE, { links: [...signalLinks(stage), { kind: 'resistor', label: ohms('R', valueOf(stage, 'minus', 'input') ?? 0) }], symbols }),
    wire(NODE, PIN.upper),
    ...loopsAbove(loops, symbols),
    ...restingPin(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}
