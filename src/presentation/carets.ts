import type { Problem } from '../quantities/problem.js';
import { displayWidth } from './layout.js';
import { safeText } from './safe-text.js';
import { PASTE, spelled } from './spelling.js';
import type { Style } from './style.js';

/** The text as typed with carets under what is meant; of a long text the neighbourhood. */
export function caretLines({ text, span, place }: Problem, style: Style): string[] {
  if (text === undefined || text === '') return [];
  const gutter = gutterOf(place?.line);
  const [start, end] = span ?? [0, text.length];
  const { before, marked, after } = around({ text, start, end: Math.max(end, start) }, style.width - gutter.first.length, style);
  const carets = '^'.repeat(Math.max(1, displayWidth(marked)));
  return [
    gutter.first + (before + marked + after).replaceAll(' ', PASTE),
    gutter.second + ' '.repeat(displayWidth(before)) + carets,
  ];
}

function gutterOf(line: number | undefined): { first: string; second: string } {
  if (line === undefined) return { first: '   ', second: '   ' };
  const number = String(line).padStart(4);
  return { first: `${number} | `, second: `${' '.repeat(number.length)} | ` };
}

interface Marked {
  readonly before: string;
  readonly marked: string;
  readonly after: string;
}

interface Spanned {
  readonly text: string;
  readonly start: number;
  readonly end: number;
}

/** Cut to the width: what is meant stays, with as much before and after it as there is room for. */
function around({ text, start, end }: Spanned, width: number, style: Style): Marked {
  const shown = (piece: string): string => spelled(safeText(piece), style);
  const whole = { before: shown(text.slice(0, start)), marked: shown(text.slice(start, end)), after: shown(text.slice(end)) };
  if (displayWidth(whole.before + whole.marked + whole.after) <= width) return whole;
  const dots = spelled('…', style);
  const marked = cutEnd(whole.marked, width - 2 * displayWidth(dots), dots);
  const room = Math.max(0, width - displayWidth(marked));
  const after = cutEnd(whole.after, Math.floor(room / 3), dots);
  const before = cutStart(whole.before, room - displayWidth(after), dots);
  return { before, marked, after: cutEnd(whole.after, room - displayWidth(before), dots) };
}

function cutEnd(text: string, width: number, dots: string): string {
  if (displayWidth(text) <= width) return text;
  const characters = Array.from(text);
  while (characters.length > 0 && displayWidth(characters.join('')) + dots.length > width) characters.pop();
  return width < dots.length ? '' : characters.join('') + dots;
}

function cutStart(text: string, width: number, dots: string): string {
  if (displayWidth(text) <= width) return text;
  const characters = Array.from(text);
  while (characters.length > 0 && displayWidth(characters.join('')) + dots.length > width) characters.shift();
  return width < dots.length ? '' : dots + characters.join('');
}
