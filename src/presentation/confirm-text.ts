import type { Confirmation } from '../screening/index.js';
import { turningText } from './verdict-words.js';
import { glued } from './spelling.js';
import { BASIS_WORDS, figureWords } from './words.js';

/** One figure to confirm, with the limit that would still pass, else what it rests on. */
export function confirmationText({ figure, basis, needed }: Confirmation): string {
  return `${figureWords(figure)} (${needed === null ? BASIS_WORDS[basis] : neededText(figure, needed)})`;
}

/** The same with how the figure was made. */
export function confirmationInFull(confirmation: Confirmation): string {
  const { basis, how, needed } = confirmation;
  const rests = how === null || how === '' ? BASIS_WORDS[basis] : glued(how);
  const enough = needed === null ? '' : `; ${neededText(confirmation.figure, needed)} is enough`;
  return `${figureWords(confirmation.figure)}: ${rests}${enough}`;
}

function neededText(figure: string, needed: NonNullable<Confirmation['needed']>): string {
  return turningText({ figure, ...needed });
}
