import type { CellFault } from './cell-fault.js';
import { spreadsheetDamage } from './spreadsheet-damage.js';
import { readText } from './text-cell.js';

/** Reads the id of a part: text end to end (`0012` stays `0012`), trimmed, in Unicode NFC. */
export function readPartId(draft: { id: string }, cell: string, report: (fault: CellFault, severity: 'error') => void): void {
  const text = readText(cell)?.normalize('NFC') ?? '';
  if (text === '') return report({ code: 'I406', reason: 'a part without id', fix: 'the id the team uses for it' }, 'error');
  const bad = INVISIBLE.exec(text)?.[0];
  if (bad !== undefined) return report(invisible(text, bad), 'error');
  draft.id = text;
  const damage = spreadsheetDamage(text);
  if (damage !== null) report(damage, 'error');
}

// Control characters, zero-width characters and marks that change the writing direction.
const INVISIBLE = /[\p{Cc}\p{Cf}\u2028\u2029]/u;
const INVISIBLE_ALL = new RegExp(INVISIBLE.source, 'gu');

function invisible(text: string, character: string): CellFault {
  return { code: 'I407', reason: `the id holds the invisible character ${codePoint(character)}`, fix: text.replace(INVISIBLE_ALL, '') };
}

function codePoint(character: string): string {
  return `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`;
}
