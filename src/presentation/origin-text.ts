import type { Origin } from '../parts/part.js';
import { HASH } from './data-text.js';
import { safeLine } from './safe-text.js';
import { GLUE } from './spelling.js';
import type { Style } from './style.js';

/** Where a figure came from: `approved.csv row 2, M`; with sources the whole way to the cell. */
export function originWords(origin: Origin | null, style: Style): string {
  if (origin === null) return '';
  if (origin.kind === 'class') return `class ${safeLine(origin.class)}`;
  if (origin.kind === 'assumption') return `assumed: ${safeLine(origin.text)}`;
  const quoted = `${safeLine(origin.header)} = "${safeLine(origin.cell)}"`;
  if (origin.kind === 'generic') return style.sources ? `generic set ${safeLine(origin.id)}, ${quoted}` : `generic set ${safeLine(origin.id)}`;
  if (!style.sources) return `${safeLine(origin.file)} row${GLUE}${origin.row}, ${origin.columnLetter}`;
  return `${safeLine(origin.file)} (sha256${GLUE}${origin.sha256.slice(0, HASH)}) line${GLUE}${origin.line}, row${GLUE}${origin.row}, column${GLUE}${origin.columnLetter}, ${quoted}`;
}
