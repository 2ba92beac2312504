import type { Stage } from '../../../../stage/index.js';
import type { LabelWish, Point } from '../../drawing/label-placing.js';
import { named } from '../../drawing/said.js';
import { fitted } from '../../drawing/text-width.js';
import { restingPin } from '../blocks/bias.js';
import { chain, type Link } from '../blocks/chain.js';
import { COUPLING } from '../blocks/drive.js';
import { loopsAbove, NODE } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { at, junction, LABEL, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN, terminal } from '../symbols/amplifier.js';
import { inputWords, ohms, referenceWords, supplyWords, valueOf } from '../values.js';
import { feedbackLoops } from './inverting.js';

/** From one leg to the next, and where they join. */
const PITCH = 46;
const BUS = NODE.x - 36;

/** Several legs into one node; each begins at a terminal with its name. */
export function summing(stage: Stage, symbols: Symbols): Piece[] {
  const { legs } = stage.ends;
  const top = NODE.y - PITCH * (legs.length - 1);
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    ...legs.flatMap((leg, rank) => legPieces(stage, leg, { end: at(BUS, NODE.y - PITCH * rank), symbols })),
    ...(legs.length > 1 ? [wire(at(BUS, top), at(BUS, NODE.y)), junction(at(BUS, NODE.y))] : []),
    wire(at(BUS, NODE.y), PIN.upper),
    ...loopsAbove(feedbackLoops(stage), symbols),
    ...restingPin(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}

type Leg = Stage['ends']['legs'][number];

/** Longest name of a leg, user units. */
const NAME_WIDTH = 150;

function legPieces(stage: Stage, leg: Leg, { end, symbols }: { readonly end: Point; readonly symbols: Symbols }): Piece[] {
  const resistance = valueOf(stage, 'minus', `leg ${leg.name}`) ?? 0;
  const name = fitted(named(leg.name), LABEL, NAME_WIDTH);
  const links: Link[] = [{ kind: 'wire', length: 20 }, ...(stage.coupling === 'ac' && leg.from === 'signal' ? [COUPLING] : []), { kind: 'resistor', label: ohms('R', resistance) }];
  const { start, pieces } = chain(end, links, symbols);
  const level = { signal: inputWords(stage, leg.name, 'V'), supply: 'V+', reference: referenceWords(stage) }[leg.from];
  return [...pieces, terminal(start, `${name} ${level}`, leftOf(start))];
}

const leftOf = ({ x, y }: Point): LabelWish['places'] => [0, 8, 20].map((step) => ({ x: x - 10 - step, y: y + 4.5, anchor: 'end' }));
