import { MISSING_WORDS } from './vocabulary.js';

// What a list writes where nothing is known. Compared without case; an own word goes to the list owner as an error.
const MISSING: ReadonlySet<string> = new Set(MISSING_WORDS);

/** The text of a cell, or null where it says that nothing is known. Removes the mark `guardCell` put in front. */
export function readText(cell: string): string | null {
  const text = cell.trim();
  return isMissing(text) ? null : unguard(text);
}

export function isMissing(cell: string): boolean {
  // Of a long list most cells are empty, and most others a number.
  if (cell === '') return true;
  const first = cell.charCodeAt(0);
  if (first >= 0x30 && first <= 0x39) return false;
  const text = cell.trim();
  return text.length <= 4 && MISSING.has(text.toLowerCase());
}

/**
 * A text made safe for a spreadsheet, which would run a cell starting like a formula (OWASP, "CSV Injection"): such a cell gets
 * an apostrophe in front unless the whole of it is a strict number. Reading removes it again.
 */
export function guardCell(text: string): string {
  return FORMULA.test(text) && !STRICT_NUMBER.test(text) ? `'${text}` : text;
}

/** Digits with an optional sign, decimal point and exponent, and nothing else. */
const STRICT_NUMBER = /^-?\d+(?:\.\d+)?(?:[eE][+-]?\d+)?$/u;

// Also behind apostrophes, so that a text which has one of its own comes back with it.
const FORMULA = /^'*[=+\-@\t\r\n＝＋－＠]/u;
const GUARDED = /^'+[=+\-@\t\r\n＝＋－＠]/u;

function unguard(text: string): string {
  return GUARDED.test(text) ? text.slice(1) : text;
}

/** True for a cell that holds one of a list's own words for "not known". */
export function missingIn(cell: string, own: readonly string[] | undefined): boolean {
  return isMissing(cell) || (own ?? []).some((word) => word.trim().toLowerCase() === cell.trim().toLowerCase());
}
