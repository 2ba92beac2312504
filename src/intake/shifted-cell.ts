import { columnLetter } from './column-letter.js';
import type { ListRecord } from './list.js';
import { readAnyHeader } from './recognised.js';

/** Where a row with too many cells was most likely cut apart: text under a header of figures, and the free text before it. */
export function shiftedCell({ cells }: ListRecord, headers: readonly string[]): { readonly message: string; readonly fix: string } | null {
  const kinds = headers.map((header) => readAnyHeader(header.replace(/\s+/gu, ' ').trim()));
  const odd = kinds.findIndex(({ kind }, index) => (kind === 'figure' || kind === 'measured') && isWord(cells[index] ?? ''));
  if (odd < 0) return null;
  const described = kinds.findIndex((reading) => reading.kind === 'identity' && reading.field === 'description');
  const before = kinds.findLastIndex(({ kind }, index) => index < odd && (kind === 'text' || kind === 'known'));
  const column = described >= 0 && described < odd ? described : before;
  if (column < 0) return null;
  const extra = cells.length - headers.length;
  const whole = cells.slice(column, column + extra + 1).join(',');
  const message = `text in column ${columnLetter(odd + 1)} "${(cells[odd] ?? '').trim()}" suggests an unquoted separator in column ${columnLetter(column + 1)}`;
  return { message, fix: `"${whole}"` };
}

/** Letters before any digit: no figure starts so, apart from its limit words. */
function isWord(cell: string): boolean {
  return /^\s*(?!(?:min|typ|max|n\/?a|tbd|null)\b)\p{L}{2,}/iu.test(cell);
}
