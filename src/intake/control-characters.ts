import type { CellFault } from './cell-fault.js';

/** Controls other than tab and line ends, and marks that change the writing direction: they hide what a cell says. */
const CONTROL = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069\u200b\u2060\ufeff]/u;

/** What is wrong with a text that holds characters nobody sees; null when it holds none. */
export function control(text: string): CellFault | null {
  const match = CONTROL.exec(text);
  if (match === null) return null;
  const code = `U+${(match[0].codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`;
  const fix = text.replace(new RegExp(CONTROL.source, 'gu'), '');
  return { code: 'I516', reason: `the text holds the control or invisible character ${code} at position ${match.index + 1}`, fix: fix.trim() === '' ? 'an empty cell' : fix };
}
