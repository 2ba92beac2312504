import type { ListRecord } from './list.js';
import { LIMITS, limitsOf } from './limits.js';
import { unpackedSize } from './unpacked-size.js';

/** One sheet as a table of texts, as a CSV of it would hold them. */
export interface WorkbookSheet {
  readonly name: string;
  readonly records: readonly ListRecord[];
}

export type Workbook =
  | { readonly ok: true; readonly sheets: readonly WorkbookSheet[] }
  | { readonly ok: false; readonly code: 'I105' | 'I106'; readonly reason: string; readonly fix: string };

/** A file that is a workbook by its first bytes: a zip archive, or the older compound file. */
export function isWorkbook(bytes: Uint8Array): boolean {
  return startsWith(bytes, ZIP) || startsWith(bytes, COMPOUND);
}

const ZIP = [0x50, 0x4b, 0x03, 0x04];
const COMPOUND = [0xd0, 0xcf, 0x11, 0xe0];

const startsWith = (bytes: Uint8Array, start: readonly number[]): boolean => start.every((byte, at) => bytes[at] === byte);

/** All sheets of a workbook (Office Open XML, `.xlsx`). Formulas give the result the spreadsheet kept; what cannot be read is refused with the reason. */
export async function readWorkbook(bytes: Uint8Array, { large = false }: { readonly large?: boolean } = {}): Promise<Workbook> {
  if (startsWith(bytes, COMPOUND)) return { ok: false, code: 'I106', reason: 'a workbook in the older binary format, or one locked with a password, is not read', fix: 'save it without password as .xlsx, or as "CSV UTF-8"' };
  const limit = limitsOf(large).bytes * UNPACKED;
  const size = unpackedSize(bytes);
  if (bytes.length > limitsOf(large).bytes || (size ?? 0) > limit) return { ok: false, code: 'I105', reason: `the workbook unpacks to ${size ?? 0} bytes, the limit is ${limit / 1024 / 1024} MiB`, fix: large ? 'split the list' : 'split the list, or lift the limit with --large' };
  const { default: readSheets } = await import('read-excel-file/node');
  try {
    const sheets = await readSheets(Buffer.from(bytes), { parseNumber: (text) => ({ number: text }), trim: false });
    return { ok: true, sheets: sheets.map(({ sheet, data }) => ({ name: sheet, records: recordsOf(data as readonly (readonly Cell[])[]) })) };
  } catch (error) {
    const why = error instanceof Error ? error.message.split('\n')[0] : '';
    return { ok: false, code: 'I106', reason: `the workbook cannot be opened (${why ?? ''})`, fix: 'open it in a spreadsheet and save it again as .xlsx, or as "CSV UTF-8"' };
  }
}

/** XML of a sheet is this much longer than the same table as CSV, about. */
const UNPACKED = 8;

/** A number is kept as the digits the file has. */
type Cell = string | boolean | Date | { readonly number: string } | null;

function recordsOf(rows: readonly (readonly Cell[])[]): ListRecord[] {
  const texts = rows.map((row) => row.map(textOf));
  const width = Math.max(0, ...texts.slice(0, LIMITS.records).map((row) => row.findLastIndex((text) => text.trim() !== '') + 1));
  return texts.map((row, at) => ({ line: at + 1, lineEnd: at + 1, row: at + 1, cells: row.slice(0, Math.max(width, 1)) }));
}

function textOf(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'string') return cell;
  if (typeof cell === 'boolean') return cell ? 'yes' : 'no';
  if (cell instanceof Date) return Number.isNaN(cell.getTime()) ? '#####' : cell.toISOString().slice(0, 10);
  // A spreadsheet shows 15 digits; the others are the noise of binary fractions.
  const value = Number(Number(cell.number).toPrecision(15));
  return Number.isFinite(value) ? decimalText(value) : cell.number;
}

/** Without exponent: in an id it would be damage, in a figure it is harder to read. */
function decimalText(value: number): string {
  const text = String(value);
  if (!text.includes('e')) return text;
  return value.toFixed(Math.abs(value) < 1 ? Math.min(30, 15 - Math.floor(Math.log10(Math.abs(value)))) : 0).replace(/(\.\d*?)0+$/u, '$1').replace(/\.$/u, '');
}
