import type { Stage } from '../../../../stage/index.js';
import { biasAbove } from '../blocks/bias.js';
import { driven, signalLinks } from '../blocks/drive.js';
import { feedbackBelow } from '../blocks/feedback.js';
import { loadSide } from '../blocks/load.js';
import { at, type Piece, type Symbols } from '../piece.js';
import { amplifier, PIN } from '../symbols/amplifier.js';
import { supplyWords } from '../values.js';

/** Signal straight into the + input, the output straight back to the other. */
export function follower(stage: Stage, symbols: Symbols): Piece[] {
  const series = signalLinks(stage);
  // The labels of the source stand beside it: with nothing in series the wire leaves them room.
  const length = series.length > 1 ? 84 : 150;
  return [
    amplifier({ plusOnTop: true, supply: supplyWords(stage) }),
    ...driven(stage, PIN.upper, { links: [...series, { kind: 'wire', length }], symbols }),
    ...biasAbove(stage, at(PIN.upper.x - 60, PIN.upper.y), symbols),
    ...feedbackBelow(stage, symbols),
    ...loadSide(stage, symbols),
  ];
}
