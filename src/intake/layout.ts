import { isBlank } from './blank.js';
import { columnLetter } from './column-letter.js';
import type { ListRecord } from './list.js';
import { isUnit } from './header-parts.js';
import { isPartId, recognised } from './recognised.js';

/** Where the table of a list stands in its file. Rows are record numbers, from 1. */
export interface Layout {
  /** The row, or the two rows, that hold the headers. */
  readonly headerRows: readonly [number] | readonly [number, number];
  /** The table ends at the first blank row below the header; what stands behind is a footer. */
  readonly untilBlank: boolean;
}

export const PLAIN_LAYOUT: Layout = { headerRows: [1], untilBlank: false };

/** A column whose joined header contradicts itself: its group and its own unit disagree. */
export interface JoinDoubt {
  readonly column: number;
  readonly group: string;
  readonly own: string;
}

export interface LaidOut {
  /** The header; joined of two rows, the group's text carried to the right over empty cells. */
  readonly header: ListRecord;
  readonly rows: readonly ListRecord[];
  /** Before the header, and behind the blank row that ends the table. */
  readonly title: readonly ListRecord[];
  readonly footer: readonly ListRecord[];
  readonly doubts: readonly JoinDoubt[];
}

/** The records of a file as its layout sorts them; null when the header row is not there. */
export function laidOut(records: readonly ListRecord[], layout: Layout): LaidOut | null {
  const [top, second] = layout.headerRows;
  const from = records.findIndex(({ row }) => row === top);
  const upper = records[from];
  const lower = second === undefined ? upper : records.find(({ row }) => row === second);
  if (upper === undefined || lower === undefined) return null;
  const { header, doubts } = second === undefined ? { header: upper, doubts: [] } : joined(upper, lower);
  const below = records.filter(({ row }) => row > lower.row);
  const end = layout.untilBlank ? below.findIndex(isBlank) : -1;
  return { header, doubts, title: records.slice(0, from), rows: end < 0 ? below : below.slice(0, end), footer: end < 0 ? [] : below.slice(end) };
}

/** `Input offset (mV)` over `typ`, `max` → `Input offset (mV) / typ`, `Input offset (mV) / max`. */
function joined(upper: ListRecord, lower: ListRecord): { header: ListRecord; doubts: JoinDoubt[] } {
  const doubts: JoinDoubt[] = [];
  let group = '';
  const cells = lower.cells.map((cell, index) => {
    const own = tidy(cell);
    const above = tidy(upper.cells[index] ?? '');
    if (above !== '') group = above;
    if (own === '') return above;
    if (group === '') return own;
    if (above === '' && isOwnUnit(own, group)) {
      doubts.push({ column: index + 1, group, own });
      return own;
    }
    return `${group} / ${own}`;
  });
  return { header: { ...lower, line: upper.line, cells }, doubts };
}

const tidy = (cell: string): string => cell.replace(/\s+/gu, ' ').trim();

/** A carried group does not cover a cell that names a unit of its own. */
function isOwnUnit(own: string, group: string): boolean {
  const [unit, over] = [bracketed(own), bracketed(group)];
  return unit !== null && over !== null && unit !== over && isUnit(unit);
}

const bracketed = (text: string): string | null => /[([]([^()[\]]*)[)\]]/u.exec(text)?.[1]?.trim() ?? null;

const SEARCHED = 30;

/**
 * The layout of a file whose first line is no header: the first row with an id column, joined with the row above it where that makes
 * more columns known. Proposed, never taken unasked. null when the first line is a header, or none is found.
 */
export function proposedLayout(records: readonly ListRecord[]): Layout | null {
  const [first] = records;
  if (first === undefined || !looksUnlikeHeader(first, records)) return null;
  const found = records.slice(0, SEARCHED).find((record) => record.cells.some(isPartId));
  if (found === undefined || found === first) return null;
  const above = records[records.indexOf(found) - 1];
  const headerRows = above !== undefined && isGroupRow(above, found) ? ([above.row, found.row] as const) : ([found.row] as const);
  const layout: Layout = { headerRows, untilBlank: false };
  return { ...layout, untilBlank: hasFooter(records, found.row, found.cells.length) };
}

/** Less than half filled, narrower than the table, or without any header that is known. */
function looksUnlikeHeader(first: ListRecord, records: readonly ListRecord[]): boolean {
  if (first.cells.some(isPartId)) return false;
  const width = Math.max(...records.slice(0, SEARCHED).map(({ cells }) => cells.length));
  return width > 1;
}

function isGroupRow(above: ListRecord, below: ListRecord): boolean {
  const filled = above.cells.filter((cell) => cell.trim() !== '').length;
  if (filled < 2) return false;
  return recognised(joined(above, below).header.cells) > recognised(below.cells);
}

/** Behind a blank row only rows that fill one or two of many cells: remarks, a count, no parts. */
export function hasFooter(records: readonly ListRecord[], headerRow: number, width: number): boolean {
  const below = records.filter(({ row }) => row > headerRow);
  const blank = below.findIndex(isBlank);
  const behind = below.slice(blank + 1).filter((record) => !isBlank(record));
  return blank > 0 && width >= 4 && behind.length > 0 && behind.every(({ cells }) => cells.filter((cell) => cell.trim() !== '').length <= 1);
}

/** The layout in words, and as the options that answer it. */
export function layoutWords({ headerRows, untilBlank }: Layout, records: readonly ListRecord[]): string {
  const [top, second] = headerRows;
  const last = second ?? top;
  const below = records.filter(({ row }) => row > last);
  const blank = below.find(isBlank);
  const header = second === undefined ? `header row ${top}` : `header rows ${top} and ${second} joined`;
  return [`skip ${top - 1} ${top === 2 ? 'line' : 'lines'}`, header, `data from row ${last + 1}`, ...(untilBlank && blank !== undefined ? [`stop at the first blank row (row ${blank.row})`] : [])].join(', ');
}

export function layoutOptions({ headerRows, untilBlank }: Layout): string {
  return `--header-rows ${headerRows.join('-')}${untilBlank ? ' --until-blank' : ''}`;
}

/** `A "Internal part number", B "Package"`. */
export function namedColumns(cells: readonly string[]): string {
  return cells.map((cell, index) => `${columnLetter(index + 1)} "${cell}"`).join(', ');
}
