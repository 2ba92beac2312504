import { safeText } from '../safe-text.js';

/** Markup that is safe to join: only `html` makes it, and what is put into it is escaped. */
export interface Html {
  readonly markup: string;
}

export type Piece = Html | string | number | null | readonly Piece[];

/** Markup from a template: text is escaped wherever it stands, markup goes in as it is, null is nothing. */
export function html(parts: TemplateStringsArray, ...pieces: readonly Piece[]): Html {
  return { markup: parts.map((part, at) => (at === 0 ? '' : markupOf(pieces[at - 1] ?? null)) + part).join('') };
}

export const NOTHING: Html = { markup: '' };

/** Markup from somewhere else that is known to be ours: a drawing, a style sheet. Never for what a list or a stage file says. */
export const trusted = (markup: string): Html => ({ markup });

function markupOf(piece: Piece): string {
  if (piece === null) return '';
  if (typeof piece === 'object') return 'markup' in piece ? piece.markup : piece.map(markupOf).join('');
  return escaped(String(piece));
}

/** Text for an element or a quoted attribute; what could deceive the reader (controls, bidi, zero-width) is written out. */
export function escaped(text: string): string {
  return safeText(text).replace(/[&<>"'`]/gu, (sign) => `&#${sign.codePointAt(0) ?? 0};`);
}

/** More than this of one cell is no reading matter: the list has the rest. */
const LONGEST = 240;
/** Up to this many a cell keeps to one line. */
const SHORT = 28;

/** A text of the list or the stage file: isolated, so that one written right to left leaves its neighbours alone, and cut when it is very long. */
export function foreign(text: string): Html {
  const line = text.replace(/[\r\n\t ]+/gu, ' ').trim();
  const characters = Array.from(line);
  const shown = characters.length <= LONGEST ? line : `${characters.slice(0, LONGEST).join('')}… (${characters.length} characters)`;
  return html`<bdi${characters.length <= SHORT ? html` class="k"` : ''}>${shown}</bdi>`;
}

/** Several lines as they stand, in a block that keeps them. */
export function preformatted(text: string): Html {
  return html`${text.split(/\r\n|\r|\n/u).map((line, at) => (at === 0 ? html`${line}` : html`\n${line}`))}`;
}

/** Our own sentence as a page sets it: the minus sign for the hyphen before a number and after V. Not for ids, cells or commands. */
export function prose(text: string): string {
  return text.replace(/(?<![\p{L}\p{N}_./)-])-(?=\.?\d)/gu, '−').replace(/\.\.-(?=\.?\d)/gu, '..−').replace(/\bV-(?![\p{L}\p{N}])/gu, 'V−');
}

/** A fragment id from any text; two texts never share one. */
export function slug(text: string): string {
  return text.replace(/[^A-Za-z0-9.-]/gu, (sign) => `_${(sign.codePointAt(0) ?? 0).toString(16)}_`);
}
