/**
 * Text from a list or a stage file as a terminal may show it: C0 and C1 controls, bidirectional controls, zero-width and other
 * invisible characters, lone surrogates and private-use characters are written as `\u{1b}` (Unicode Standard Annex 9 and
 * Technical Report 36 say what they can do to a reader). Nothing else is changed.
 */
export function safeText(text: string): string {
  return text.replace(UNSAFE, (character) => `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`);
}

/** Controls, format characters (bidi, zero-width, tags), surrogates, private use, line and paragraph separators, fillers. */
const UNSAFE = /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}\u034f\u115f\u1160\u17b4\u17b5\u180b-\u180f\u3164\uffa0\ufe00-\ufe0f]/gu;

/** An id, description or cell for one line: safe, and blanks of any kind become one blank. */
export function safeLine(text: string): string {
  return safeText(text.replace(/[\r\n\t ]+/gu, ' ').trim());
}
