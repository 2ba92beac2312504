import type { Stage } from '../../../../stage/index.js';
import { restingPin } from '../blocks/bias.js';
import { driven, signalLinks } from '../blocks/drive.js';
import { loopsAbove, NODE, type Loop } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { farads, ohms, supplyWords, valueOf } from '../values.js';

/** Signal through a resistor into the − input, the + input at the reference. */
export function inverting(stage: Stage, symbols: Symbols): Piece[] {
  const input = valueOf(stage, 'minus', 'input') ?? 0;
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    ...driven(stage, NODE, { links: [...signalLinks(stage), { kind: 'resistor', label: ohms('Rin', input) }], symbols }),
    wire(NODE, PIN.upper),
    ...loopsAbove(feedbackLoops(stage), symbols),
    ...restingPin(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}

/** Feedback resistor, and the capacitor across it. */
export function feedbackLoops(stage: Stage): Loop[] {
  const [resistance, capacitance] = [valueOf(stage, 'minus', 'feedback'), valueOf(stage, 'minus', 'feedback capacitor')];
  return [
    ...(resistance === null ? [] : [{ kind: 'resistor' as const, label: ohms('Rf', resistance) }]),
    ...(capacitance === null ? [] : [{ kind: 'capacitor' as const, label: farads('Cf', capacitance) }]),
  ];
}
