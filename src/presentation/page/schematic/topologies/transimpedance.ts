import type { Stage } from '../../../../stage/index.js';
import { restingPin } from '../blocks/bias.js';
import { loopsAbove, NODE, type Loop } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { ground, supplyBar } from '../symbols/ends.js';
import { photodiode } from '../symbols/photodiode.js';
import { farads, inputWords, supplyWords, valueOf } from '../values.js';
import { feedbackLoops } from './inverting.js';

/** A photodiode at the − input: from a bias above into the node, or out of it to the common return. */
export function transimpedance(stage: Stage, symbols: Symbols): Piece[] {
  const node = at(NODE.x - 50, NODE.y);
  return [
    amplifier({ plusOnTop: false, supply: supplyWords(stage) }),
    wire(node, PIN.upper),
    ...diode(stage, node),
    ...loopsAbove(loops(stage), symbols),
    ...restingPin(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}

/** Positive transresistance: the current leaves the node. */
function diode(stage: Stage, node: { readonly x: number; readonly y: number }): Piece[] {
  const labels = [inputWords(stage, 'current', 'A'), farads('Cd', valueOf(stage, 'minus', 'photodiode') ?? 0)];
  if (stage.gain > 0) return [photodiode(node, at(node.x, node.y + 80), labels), ground(at(node.x, node.y + 80)), junction(node)];
  return [photodiode(at(node.x, node.y - 80), node, labels), supplyBar(at(node.x, node.y - 80), 'bias'), junction(node)];
}

/** A capacitor left to the part is drawn all the same: it belongs to the circuit. */
function loops(stage: Stage): Loop[] {
  const fitted = feedbackLoops(stage);
  return fitted.some(({ kind }) => kind === 'capacitor') ? fitted : [...fitted, { kind: 'capacitor', label: 'Cf to suit the part' }];
}
