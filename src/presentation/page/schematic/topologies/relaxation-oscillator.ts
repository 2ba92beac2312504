import type { Stage } from '../../../../stage/index.js';
import { loopsAbove, NODE } from '../blocks/feedback.js';
import { loadSide, OUT } from '../blocks/load.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { ground, supplyBar } from '../symbols/ends.js';
import { capacitor, resistor } from '../symbols/passive.js';
import { farads, ohms, supplyWords } from '../values.js';

/** Timing resistor and capacitor at the − input, three threshold resistors at the other. */
export function relaxationOscillator(stage: Stage, symbols: Symbols): Piece[] {
  const { response } = stage;
  if (response.kind !== 'oscillator') throw new RangeError('an oscillator without its response reached the drawing');
  const timing = at(NODE.x - 54, NODE.y);
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    wire(timing, PIN.upper),
    ...loopsAbove([{ kind: 'resistor', label: ohms('R', response.resistance) }], symbols),
    capacitor(timing, at(timing.x, timing.y + 62), farads('C', response.capacitance)),
    ground(at(timing.x, timing.y + 62)),
    ...ladder(response, symbols),
    ...loadSide(stage, symbols),
  ];
}

interface Ladder {
  readonly toSupply: number;
  readonly toGround: number;
  readonly toOutput: number;
}

function ladder({ toSupply, toGround, toOutput }: Ladder, symbols: Symbols): Piece[] {
  const corner = at(PIN.lower.x - 18, 270);
  const [supply, low] = [at(110, 270), at(226, 270)];
  return [
    wire(PIN.lower, at(corner.x, PIN.lower.y), corner),
    junction(corner),
    wire(corner, at(345, 270)),
    resistor(at(345, 270), at(415, 270), { label: ohms('R out', toOutput), symbols }),
    wire(at(415, 270), at(OUT.x, 270), OUT),
    wire(corner, supply),
    junction(low),
    resistor(supply, at(supply.x, 200), { label: ohms('R+', toSupply), symbols }),
    supplyBar(at(supply.x, 200), 'V+'),
    resistor(low, at(low.x, 340), { label: ohms('R−', toGround), symbols }),
    ground(at(low.x, 340)),
  ];
}
