import { displayWidth, padded, padStart, paragraph } from './layout.js';
import { GLUE, spelled } from './spelling.js';
import { isNarrow, type Style } from './style.js';

export interface Column {
  /** Up to two lines, parted by a newline. */
  readonly title: string;
  readonly align?: 'right';
  /** May move under its row when the table is too wide; the lowest number goes first. */
  readonly moves?: number;
  /** What it is called when it stands alone; the title by default, empty for cells that say it themselves. */
  readonly name?: string;
  /** The last column may: it wraps in what room is left, and takes in the cells that had to move. */
  readonly wraps?: true;
  /** Left out where another column would have to move for it: for what the other cells say already. */
  readonly ifRoom?: true;
  /** Stands on the first line of the upright form. */
  readonly key?: true;
}

export interface Table {
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly string[])[];
  /** Columns before the table, 1 by default. */
  readonly indent?: number;
}

const GAP = '  ';
const leadOf = ({ indent = 1 }: Table): string => ' '.repeat(indent);

/** A table in the width there is: whole, or with some cells under their row, or upright. Columns without any content are left out. */
export function tableLines(table: Table, style: Style): string[] {
  const spelledTable = withRoom(withSpelling(withoutEmpty(table), style), style);
  const kept = isNarrow(style) ? null : fitting(spelledTable, style.width);
  return kept === null ? upright(spelledTable, style) : abreast(spelledTable, kept, style);
}

function withoutEmpty(table: Table): Table {
  const { columns, rows } = table;
  return only(table, columns.map((_, at) => rows.some((row) => (row[at] ?? '') !== '')));
}

/** The columns that are wished for if there is room stay when all others stand as they would without them. */
function withRoom(table: Table, style: Style): Table {
  const plain = only(table, table.columns.map(({ ifRoom }) => ifRoom !== true));
  const extra = table.columns.length - plain.columns.length;
  if (extra === 0 || isNarrow(style)) return plain;
  const [all, fewer] = [fitting(table, style.width), fitting(plain, style.width)];
  return all !== null && fewer !== null && all.columns.length === fewer.columns.length + extra ? table : plain;
}

function only(table: Table, used: readonly boolean[]): Table {
  const keep = <T>(list: readonly T[]): T[] => list.filter((_, at) => used[at]);
  return { ...table, columns: keep(table.columns), rows: table.rows.map((row) => keep(row)) };
}

function withSpelling(table: Table, style: Style): Table {
  const { columns, rows } = table;
  return {
    ...table,
    columns: columns.map((column) => ({ ...column, title: spelled(column.title, style) })),
    rows: rows.map((row) => row.map((cell) => spelled(cell, style))),
  };
}

/** Which columns stand side by side, and how wide the last one may be; null when even the fewest do not fit. */
function fitting(table: Table, width: number): Kept | null {
  let kept = table.columns.map((_, at) => at);
  const order = kept.filter((at) => table.columns[at]?.moves !== undefined).sort((a, b) => (table.columns[a]?.moves ?? 0) - (table.columns[b]?.moves ?? 0));
  const wrapping = table.columns.findIndex((column) => column.wraps);
  for (;;) {
    const widths = kept.map((at) => columnWidth(table, at));
    const spare = width - widths.reduce((sum, one) => sum + one, 0) - GAP.length * (kept.length - 1) - leadOf(table).length;
    if (spare >= 0) return { columns: kept, widths };
    const next = order.shift();
    if (next !== undefined) kept = kept.filter((at) => at !== next);
    else if (kept.includes(wrapping) && (widths.at(-1) ?? 0) + spare >= LEAST) return { columns: kept, widths: [...widths.slice(0, -1), (widths.at(-1) ?? 0) + spare] };
    else return null;
  }
}

interface Kept {
  readonly columns: readonly number[];
  readonly widths: readonly number[];
}

/** A column narrower than this is no place for a sentence. */
const LEAST = 24;

function columnWidth({ columns, rows }: Table, at: number): number {
  const titles = (columns[at]?.title ?? '').split('\n');
  return Math.max(...[...titles, ...rows.map((row) => row[at] ?? '')].map(displayWidth));
}

function abreast(table: Table, kept: Kept, style: Style): string[] {
  const titles = kept.columns.map((at) => (table.columns[at]?.title ?? '').split('\n'));
  const heads = titles.some((title) => title.length > 1) ? [0, 1] : [0];
  return [
    ...heads.map((line) => lineOf(table, kept, titles.map((title) => title[line] ?? ''))).filter((text) => text.trim() !== ''),
    ...table.rows.flatMap((row) => rowLines(table, row, { kept, style })),
  ];
}

function lineOf(table: Table, { columns, widths }: Kept, cells: readonly string[]): string {
  const aligned = cells.map((cell, place) => (isRight(table, columns[place]) ? padStart(cell, widths[place] ?? 0) : padded(cell, widths[place] ?? 0)));
  return (leadOf(table) + aligned.join(GAP)).trimEnd();
}

/** A row with what had to move: inside the wrapping column, else under the row. */
function rowLines(table: Table, row: readonly string[], { kept, style }: { readonly kept: Kept; readonly style: Style }): string[] {
  const cells = kept.columns.map((at) => row[at] ?? '');
  const moved = table.columns.flatMap((column, at) => (kept.columns.includes(at) || (row[at] ?? '') === '' ? [] : [named(column, row[at] ?? '')]));
  const last = kept.columns.at(-1) ?? 0;
  if (table.columns[last]?.wraps !== true) {
    const indent = leadOf(table) + (isRight(table, kept.columns[0]) ? ' '.repeat((kept.widths[0] ?? 0) + GAP.length) : GAP);
    return [lineOf(table, kept, cells), ...(moved.length === 0 ? [] : paragraph(moved.join('; '), style, { lead: indent }))];
  }
  const start = lineOf(table, kept, [...cells.slice(0, -1), '']);
  const place = leadOf(table).length + kept.widths.slice(0, -1).reduce((sum, one) => sum + one + GAP.length, 0);
  const text = [cells.at(-1) ?? '', ...moved].filter((cell) => cell !== '').join('; ');
  return text === '' ? [start] : paragraph(text, style, { lead: padded(start, place) });
}

const isRight = (table: Table, at: number | undefined): boolean => at !== undefined && table.columns[at]?.align === 'right';

/** Cells shorter than this stay with the name of their column. */
const SHORT = 8;

function named(column: Column, cell: string): string {
  const name = column.name ?? column.title.replace('\n', ' ').trim();
  const joint = displayWidth(cell) < SHORT ? GLUE : ' ';
  return name === '' ? cell : `${name}${joint}${cell}`;
}

/** One part under the other: what names it first, then the rest with the names of their columns. */
function upright(table: Table, style: Style): string[] {
  const { columns, rows } = table;
  const lead = leadOf(table);
  return rows.flatMap((row) => {
    const cells = columns.map((column, at) => ({ column, cell: row[at] ?? '' })).filter(({ cell }) => cell !== '');
    const key = cells.filter(({ column }) => column.key).map(({ cell }) => cell);
    const others = cells.filter(({ column }) => !column.key);
    const rest = [...others.filter(({ column }) => column.wraps), ...others.filter(({ column }) => !column.wraps)].map(({ column, cell }) => named(column, cell));
    const first = paragraph(key.join(' '), style, { lead, indent: lead.length + 3 });
    return rest.length === 0 ? first : [...first, ...paragraph(rest.join('; '), style, { lead: `${lead}   ` })];
  });
}
