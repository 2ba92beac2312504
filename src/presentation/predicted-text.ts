import type { Quantity } from '../prediction/index.js';
import type { Explanation } from '../report.js';
import { plainCommand } from './commands.js';
import { labelled } from './layout.js';
import { cellOf, QUANTITY_WORDS } from './prediction-rows.js';
import { glued } from './spelling.js';
import type { Style } from './style.js';
import { checkWords } from './words.js';

/** What tells of a check that has no closed form. */
const TELLING: Readonly<Record<string, readonly Quantity[]>> = {
  distortion: ['distortion', 'slewing', 'clipped'],
  noise: ['noise'],
  settling: ['settling', 'rise', 'fall'],
};

/** Checks that no closed form answers for this stage: simulated, told, not judged. */
export function predictedLines({ predicted, judged }: Explanation, style: Style): string[] {
  if (predicted === null) return [];
  const { prediction, checks } = predicted;
  const { typical, worst } = prediction;
  const told = checks.flatMap((check) => {
    const words = (TELLING[check] ?? []).flatMap((quantity) => {
      const [one, other] = [typical.results[quantity], worst.results[quantity]];
      if (one === undefined || other === undefined) return [];
      if (one.value === null && other.value === null) return [QUANTITY_WORDS[quantity] === checkWords(check) ? other.reason : `${QUANTITY_WORDS[quantity]}: ${other.reason}`];
      return [`${QUANTITY_WORDS[quantity]} ${cellOf(quantity, one, prediction)} typical, ${cellOf(quantity, other, prediction)} at worst`];
    });
    return [`${checkWords(check)}: ${words.length === 0 ? 'nothing to tell of this stage' : words.join('; ')}`];
  });
  return labelled('Predict', glued(`predicted, not judged, since no closed form holds here. ${told.join('. ')}. ${plainCommand('predict', judged.part.id)} tells more.`), style);
}
