import { foreign, html, prose, type Html } from './html.js';

/** One cell of a table on the page. */
export interface Cell {
  readonly shown: Html;
  /** The same as text, for the CSV. */
  readonly text: string;
  /** What the column is sorted by; the text when absent. */
  readonly order?: number;
}

/** A sentence or word of ours. */
export const words = (text: string): Cell => ({ shown: html`${prose(text)}`, text });

/** What the list or the stage file says. */
export const quoted = (text: string): Cell => ({ shown: foreign(text), text });

/** Markup with its text. */
export const marked = (shown: Html, text: string): Cell => ({ shown, text });

/** A number with its unit as text, and the number it is sorted by. */
export function figure(text: string, order: number | null): Cell {
  const set = prose(text);
  return { shown: html`${set}`, text: set, ...(order === null ? {} : { order }) };
}

export const EMPTY: Cell = { shown: html``, text: '' };

/** Number, decimals and unit of a cell that is one number; the degree sign keeps to its digits. */
const NUMBER = /^([−+]?\d+)(\.\d+°?|°)?(\u00a0\S+)?$/u;

/** Decimals and unit in their own boxes, so that a column lines up on its decimal mark. */
export function aligned(cell: Cell): Html | null {
  const [, whole, decimals = '', unit = ''] = NUMBER.exec(cell.text) ?? [];
  return whole === undefined ? null : html`${whole}<span class="f">${decimals}</span><span class="u">${unit}</span>`;
}

/** Widths of the two boxes in characters: what the widest cell of the column takes. */
export function boxes(cells: readonly Cell[]): { readonly decimals: number; readonly unit: number } {
  const found = cells.map(({ text }) => NUMBER.exec(text));
  const widest = (group: 2 | 3): number => Math.min(WIDEST, Math.max(0, ...found.map((match) => (match?.[group] ?? '').length)));
  return { decimals: widest(2), unit: widest(3) };
}

/** The style sheet knows boxes up to this many characters. */
export const WIDEST = 12;
