import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { glued, finished } from './spelling.js';
import type { Style } from './style.js';

/** How a list was read, one sentence a line; without the line end that whoever tells it adds. */
export function renderImportNotes(notes: readonly string[], style: Style): string {
  return finished(notes.flatMap((note) => paragraph(glued(safeLine(note)), style, { lead: 'note: ', indent: 2 })), style).replace(/\n$/u, '');
}
