import { checkWords } from '../../words.js';
import { noteLines } from '../drawing/notes.js';
import { HELD } from '../drawing/said.js';
import { WIDTH } from './assemble.js';
import { reasonLetters, type PriceCurrent } from './price-current-data.js';

/** Signs first, then the letters, each line within the width. */
export function legendOf({ parts, left, beyond }: PriceCurrent): string[] {
  const letters = reasonLetters(parts).map(({ letter, check, parts: number }) => `${letter}${HELD}${checkWords(check).replaceAll(' ', HELD)}${HELD}(${number})`);
  const signs = `● fits,${HELD}◇${HELD}not decided, ✕${HELD}does not fit (with the letter of the first check it fails); dotted: the front of what fits.`;
  const notes = left === 0 ? [] : [`${left} ${left === 1 ? 'part has' : 'parts have'} no price in that currency or no supply current and ${left === 1 ? 'is' : 'are'} not drawn.`];
  const more = beyond === 0 ? [] : [`${beyond} more parts are not drawn.`];
  return noteLines([signs, letters.join(', '), ...notes, ...more].filter((words) => words !== ''), WIDTH - 14);
}
