import { parseQuantity } from '../quantities/parse.js';
import type { CellFault } from './cell-fault.js';

/** What a spreadsheet has made of a text that must stay one: an exponent, a date, hashes of a narrow column; null for an ordinary text. */
export function spreadsheetDamage(text: string): CellFault | null {
  if (/^\d(?:[.,]\d+)?E[+-]\d+$/iu.test(text.trim())) {
    return { code: 'Q017', reason: `${text.trim()} is a number as a spreadsheet shortens it: its digits are lost`, fix: 'restore the original cell as text' };
  }
  if (!SUSPECT.test(text)) return null;
  const result = parseQuantity(text, 'count');
  if (result.ok || result.problem.code !== 'Q017') return null;
  return { code: 'Q017', reason: result.problem.message, fix: result.problem.fix ?? 'restore the original cell as text' };
}

/** What can be damage at all; most texts are none, and are not read as quantities. */
const SUSPECT = /^\s*(?:#|\d{1,4}[-. /]+[a-z]{3}|(?:jan|feb|mar|mrz|mär|apr|may|mai|jun|jul|aug|sep|oct|okt|nov|dec|dez)[a-z]*\.?[-. /]+\d|\d{1,4}[-./]\d{1,2}[-./]\d|\d{1,2}:\d{2})/iu;
