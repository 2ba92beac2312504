import type { CellFault } from './cell-fault.js';

/** A formula where a figure is expected: what it comes to is not in the file. */
export function formulaFault(cell: string): CellFault | null {
  const text = cell.trim();
  if (!/^(?:[=@＝＠]|[+\-＋－](?=[\p{L}(=@]))/u.test(text)) return null;
  return { code: 'I510', reason: `${text} is a formula; what it comes to is not in the file`, fix: 'the value: paste as values before exporting' };
}
