import { FAINT } from './colours.js';
import { text } from './marks.js';
import { textWidth } from './text-width.js';

const SIZE = 12;
/** From one baseline to the next. */
export const NOTE_LINE = 17;

/** Sentences broken into lines of a width, at blanks; words held together by U+00A0 stay so. */
export function noteLines(sentences: readonly string[], width: number): string[] {
  return sentences.flatMap((words) =>
    words.split(' ').reduce<string[]>((lines, word) => {
      const last = lines.at(-1);
      const joined = last === undefined ? word : `${last} ${word}`;
      return last !== undefined && textWidth(joined, SIZE) > width ? [...lines, word] : [...lines.slice(0, -1), joined];
    }, []),
  );
}

/** The lines under a drawing, the first with its baseline at this height. */
export function notesMarkup(lines: readonly string[], top: number): string {
  return lines.map((words, at) => text({ x: 6, y: top + at * NOTE_LINE }, words, { size: SIZE, fill: FAINT })).join('');
}
