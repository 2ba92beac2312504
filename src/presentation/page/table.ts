import { csvText } from '../csv-cell.js';
import { aligned, boxes, type Cell } from './cell.js';
import { html, prose, slug, type Html } from './html.js';

export interface PageColumn {
  readonly title: string;
  /** Numbers are set on their decimal mark; sentences get room. */
  readonly kind?: 'number' | 'sentence';
}

export interface PageRow {
  /** Stable: a comment can link to it. */
  readonly id: string;
  readonly cells: readonly Cell[];
  readonly tone?: 'good' | 'bad' | 'open';
}

export interface PageTable {
  readonly id: string;
  readonly caption: string;
  readonly columns: readonly PageColumn[];
  readonly rows: readonly PageRow[];
  /** Column that names the row; the first by default. */
  readonly head?: number;
}

/** A table with caption, row and column heads, in a region of its own that scrolls where it is too wide, and the same as CSV. Nothing for no rows. */
export function tableOf(table: PageTable, { csv = true }: { readonly csv?: boolean } = {}): Html {
  const used = withoutEmpty(table);
  if (used.rows.length === 0) return html``;
  const classes = used.columns.map((column, at) => classOf(column, used.rows.map(({ cells }) => cells[at]).filter((cell) => cell !== undefined)));
  const rows = used.rows.map((row) => rowOf(row, used, classes));
  const heads = used.columns.map(({ title, kind }) => html`<th scope="col"${kind === 'number' ? html` class="n"` : ''}>${title}</th>`);
  return html`<div class="scroll" role="group" tabindex="0" aria-labelledby="${used.id}-caption">
<table id="${used.id}"><caption id="${used.id}-caption">${used.caption}</caption>
<thead><tr>${heads}</tr></thead>
<tbody>
${rows}</tbody></table></div>
${csv ? csvLink(used.id, used.caption, csvOf(used)) : ''}
`;
}

/** A column without any content says nothing. */
function withoutEmpty(table: PageTable): PageTable & { readonly head: number } {
  const { columns, rows, head = 0 } = table;
  const keep = columns.map((_, at) => at === head || rows.some(({ cells }) => (cells[at]?.text ?? '') !== ''));
  const kept = <T>(list: readonly T[]): T[] => list.filter((_, at) => keep[at]);
  return { ...table, columns: kept(columns), rows: rows.map((row) => ({ ...row, cells: kept(row.cells) })), head: keep.slice(0, head).filter(Boolean).length };
}

function classOf({ kind }: PageColumn, cells: readonly Cell[]): string {
  if (kind === 'sentence') return 's';
  if (kind !== 'number') return '';
  const { decimals, unit } = boxes(cells);
  return `n f${decimals} u${unit}`;
}

function rowOf({ id, cells, tone }: PageRow, { columns, head }: { readonly columns: readonly PageColumn[]; readonly head: number }, classes: readonly string[]): Html {
  const body = cells.map((cell, at) => {
    const shown = columns[at]?.kind === 'number' ? (aligned(cell) ?? cell.shown) : cell.shown;
    const attributes = html`${classes[at] === '' ? '' : html` class="${classes[at] ?? ''}"`}${cell.order === undefined ? '' : html` data-order="${cell.order}"`}`;
    return at === head ? html`<th scope="row"${attributes}>${shown}</th>` : html`<td${attributes}>${shown}</td>`;
  });
  return html`<tr id="${id}"${tone === undefined ? '' : html` class="${tone}"`}>${body}</tr>\n`;
}

function csvOf({ columns, rows }: PageTable): string {
  return csvText([columns.map(({ title }) => title), ...rows.map(({ cells }) => cells.map(({ text }) => text.replaceAll('\u00a0', ' ')))]);
}

/** The same data to take away: a file inside the page, no request. */
export function csvLink(id: string, caption: string, csv: string): Html {
  return html`<p class="csv"><a download="${slug(id)}.csv" href="data:text/csv;charset=utf-8,${encodeURIComponent(csv)}">CSV: ${prose(caption)}</a></p>`;
}
