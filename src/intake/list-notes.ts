import type { DecimalMark } from './decimal-mark.js';
import { NAMES as ENCODING_NAMES } from './decode.js';
import type { Encoding } from './limits.js';
import type { Delimiter, ListColumn, ListRecord } from './list.js';
import type { ReadPart } from './identity.js';
import { isMissing } from './text-cell.js';

export interface Detected {
  readonly encoding: Encoding;
  readonly how: string;
  /** Name of the sheet, of a workbook. */
  readonly sheet?: string;
  readonly delimiter: Delimiter;
  readonly header: ListRecord;
  readonly rows: readonly ListRecord[];
  readonly decimal: DecimalMark;
}

const DELIMITER_NAMES: Readonly<Record<Delimiter, string>> = { ',': '`,`', ';': '`;`', '\t': 'TAB', '|': '`|`' };

/** How the file was taken apart, in one sentence. */
export function detectionNote({ encoding, how, sheet, delimiter, header, rows, decimal }: Detected): string {
  const fields = header.cells.length;
  const all = [header, ...rows];
  const fitting = all.filter(({ cells }) => cells.length === fields).length;
  const grouping = decimal.mark === 'comma' ? ', grouping `.`' : '';
  const proof = decimal.mark === 'comma' && decimal.sample !== null ? ` (${decimal.proofs} cells such as \`${decimal.sample}\` can be nothing else)` : '';
  const apart = decimal.proofs > 0 && decimal.against > 0 && !decimal.given ? '; cells prove both decimal marks, so each is read by itself' : '';
  if (sheet !== undefined) return `workbook, sheet "${sheet}" (${fields} columns, ${all.length} rows), header row ${header.row}${apart}`;
  return `encoding ${ENCODING_NAMES[encoding]} (${how}), delimiter ${DELIMITER_NAMES[delimiter]} (${fields} fields in ${fitting} of ${all.length} records), decimal mark \`${decimal.mark === 'comma' ? ',' : '.'}\`${proof}${grouping}${apart}, header row ${header.row}`;
}

/** What the owner of the list should know about the columns: kinds assumed, one swing for both rails, extra text. */
export function columnNotes(columns: readonly ListColumn[], { rows, parts, isKnown }: NotedRows): string[] {
  // How the columns of a list are taken was told when its mapping was made.
  const taken = isKnown ? [] : [assumedKinds(columns), typicalOnly(columns), bothSwings(columns), conditions(columns), perAmplifier(columns), notApplicable(columns, rows), kept(columns)];
  return [...taken, unknown(columns, rows, parts)].filter((note) => note !== null);
}

export interface NotedRows {
  readonly rows: readonly ListRecord[];
  readonly parts: readonly ReadPart[];
  /** A saved mapping knows every header as it stands. */
  readonly isKnown: boolean;
}

const named = (columns: readonly ListColumn[]): string => columns.map(({ letter, header }) => `${letter} "${header}"`).join(', ');

function assumedKinds(columns: readonly ListColumn[]): string | null {
  const plain = columns.filter(({ reading }) => reading.kind === 'measured' && reading.limit === null && reading.order === null && !WORDLESS.has(reading.target));
  return plain.length === 0 ? null : `limit kind assumed: plain figures under ${named(plain)} are kept as typical; no guaranteed limit is made of them.`;
}

/** Parameters of which a list has no limit at all. */
function typicalOnly(columns: readonly ListColumn[]): string | null {
  const limited = new Set(columns.flatMap(({ reading }) => (reading.kind === 'measured' && (reading.limit === 'min' || reading.limit === 'max' || reading.order !== null) ? [reading.target] : [])));
  const typical = columns.filter(({ reading }) => reading.kind === 'measured' && reading.limit === 'typ' && !limited.has(reading.target));
  return typical.length === 0 ? null : `typical only, so no guaranteed limit exists: ${named(typical)}.`;
}

const WORDLESS: ReadonlySet<string> = new Set(['supplyRange', 'temperatureRange']);

function bothSwings(columns: readonly ListColumn[]): string | null {
  const swings = columns.filter(({ reading }) => reading.kind === 'measured' && reading.target === 'bothSwings');
  return swings.length === 0 ? null : `one swing figure for both rails under ${named(swings)}; low-side and high-side limits in columns of their own say more.`;
}

function conditions(columns: readonly ListColumn[]): string | null {
  const stated = columns.filter(({ reading }) => reading.kind === 'measured' && Object.keys(reading.condition).length > 0);
  return stated.length === 0 ? null : `the condition of the header was kept with every figure of ${named(stated)}.`;
}

function perAmplifier(columns: readonly ListColumn[]): string | null {
  const plain = columns.filter(({ header, reading }) => reading.kind === 'measured' && reading.target === 'quiescentCurrent' && !reading.perPackage && !/ch|amp|each/iu.test(header));
  return plain.length === 0 ? null : `supply current under ${named(plain)} is taken for one amplifier; "total" in the header says otherwise.`;
}

/** `n/a` and `-` both stand for unknown. */
function notApplicable(columns: readonly ListColumn[], rows: readonly ListRecord[]): string | null {
  const doubtful = columns.filter(({ number, reading }) => {
    if (reading.kind !== 'known' || reading.field !== null) return false;
    const cells = new Set(rows.map(({ cells: all }) => (all[number - 1] ?? '').trim().toLowerCase()));
    return (cells.has('n/a') || cells.has('n.a.')) && cells.size > 1;
  });
  return doubtful.length === 0 ? null : `"not applicable" and "unknown" cannot be told apart in ${named(doubtful)}; write no where a part lacks the feature.`;
}

function kept(columns: readonly ListColumn[]): string | null {
  const text = columns.filter(({ reading, header }) => reading.kind === 'known' && header !== '');
  return text.length === 0 ? null : `kept as text, read by no check: ${named(text)}.`;
}

function unknown(columns: readonly ListColumn[], rows: readonly ListRecord[], parts: readonly ReadPart[]): string | null {
  const figures = columns.filter(({ reading }) => reading.kind === 'measured' || reading.kind === 'figure');
  const count = parts.reduce((sum, { record }) => sum + figures.filter(({ number }) => isMissing(record.cells[number - 1] ?? '')).length, 0);
  return count === 0 ? null : `${count} ${count === 1 ? 'figure is' : 'figures are'} unknown in ${rows.length} rows; unknown is never a pass.`;
}

/** A count in the footer (`5 parts`) against what was read; null where the footer has none. */
export function countNote(footer: readonly ListRecord[], parts: number): { readonly agrees: boolean; readonly note: string; readonly record: ListRecord } | null {
  for (const record of footer) {
    const match = /\b(\d+)\s+(?:parts?|items?|entries|rows|types)\b/iu.exec(record.cells.join(' '));
    if (match !== null) {
      const stated = Number(match[1]);
      const agrees = stated === parts;
      return { agrees, record, note: agrees ? `the footer says ${stated} parts, and ${parts} were read` : `the footer says ${stated} parts, and ${parts} were read: ${Math.abs(stated - parts)} ${stated > parts ? 'missing' : 'more'}` };
    }
  }
  return null;
}
