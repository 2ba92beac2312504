import type { Stage } from '../../../../stage/index.js';
import type { LabelWish, Point } from '../../drawing/label-placing.js';
import { chain, type Link } from '../blocks/chain.js';
import { loopsAbove, NODE } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { referenceEnd } from '../blocks/reference.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN, terminal } from '../symbols/amplifier.js';
import { resistor } from '../symbols/passive.js';
import { inputWords, ohms, sourceResistance, supplyWords, valueOf } from '../values.js';
import { feedbackLoops } from './inverting.js';

/** Two legs: one to the − input, one divided down to the + input. */
export function difference(stage: Stage, symbols: Symbols): Piece[] {
  const lower = at(NODE.x - 10, PIN.lower.y);
  const bottom = at(lower.x, lower.y + 66);
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    ...leg(stage, { end: NODE, name: 'R1', element: 'input', pin: 'minus', words: `− in ${inputWords(stage, 'negative', 'V')}`, symbols }),
    wire(NODE, PIN.upper),
    ...loopsAbove(feedbackLoops(stage), symbols),
    ...leg(stage, { end: lower, name: 'R3', element: 'positive input', pin: 'plus', words: `+ in ${inputWords(stage, 'positive', 'V')}`, symbols }),
    wire(lower, PIN.lower),
    junction(lower),
    resistor(lower, bottom, { label: ohms('R4', valueOf(stage, 'plus', 'to reference') ?? 0), symbols }),
    ...referenceEnd(stage, bottom, { symbols, towards: 'down', bypass: 'left' }),
    ...loadSide(stage, symbols),
  ];
}

interface Leg {
  readonly end: Point;
  readonly name: string;
  readonly element: string;
  readonly pin: 'plus' | 'minus';
  readonly words: string;
  readonly symbols: Symbols;
}

function leg(stage: Stage, { end, name, element, pin, words, symbols }: Leg): Piece[] {
  const { start, pieces } = chain(end, legLinks(stage, { name, element, pin }), symbols);
  return [...pieces, terminal(start, words, leftOf(start))];
}

/** The source's own resistance, then the resistor of the leg. */
export function legLinks(stage: Stage, { name, element, pin }: Pick<Leg, 'name' | 'element' | 'pin'>): Link[] {
  const own = sourceResistance(stage);
  const series: Link[] = own === 0 ? [] : [{ kind: 'resistor', label: ohms('Rs', own) }];
  return [{ kind: 'wire', length: 20 }, ...series, { kind: 'resistor', label: ohms(name, valueOf(stage, pin, element) ?? 0) }];
}

const leftOf = ({ x, y }: Point): LabelWish['places'] => [0, 8, 20].map((step) => ({ x: x - 10 - step, y: y + 4.5, anchor: 'end' }));
