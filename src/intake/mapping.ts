import { createHash } from 'node:crypto';
import type { Status } from '../parts/part.js';
import type { ColumnReading } from './column-reading.js';
import type { Declarations } from './declarations.js';
import { foldPhrase, headerParts } from './header-parts.js';
import type { Layout } from './layout.js';
import { laidOut } from './layout.js';
import type { Encoding } from './limits.js';
import type { Delimiter, ListColumn, ListRecord } from './list.js';
import { fieldsOfReading } from './reading-fields.js';

/** How one list was read, kept for its next issue. */
export interface ListMapping {
  /** The file the mapping stands in, or that it was made from; for messages. */
  readonly name: string;
  readonly fingerprint: string;
  readonly encoding: Encoding;
  readonly delimiter: Delimiter;
  readonly decimal: 'point' | 'comma';
  readonly layout: Layout;
  readonly columns: readonly MappedColumn[];
  readonly words: ReadonlyMap<string, Status>;
  readonly missing: readonly string[];
  readonly declare: Declarations | null;
  /** Class proposals nearer than this are applied; null when none are. */
  readonly classWithin: number | null;
}

export interface MappedColumn {
  /** Header texts under which the column is known. */
  readonly titles: readonly string[];
  readonly reading: ColumnReading;
}

/** A fingerprint of the headers: the same texts in the same order. */
export function headerFingerprint(headers: readonly string[]): string {
  return createHash('sha256').update(headers.join('\u001f')).digest('hex').slice(0, 16);
}

/** The name of a header without unit, for columns whose unit changed. */
export function headerName(header: string): string {
  const [parts] = headerParts(header);
  return parts === undefined ? foldPhrase(header) : [parts.words, parts.limit ?? '', parts.order?.join('/') ?? '', ...parts.conditions.map(foldPhrase)].join(' ').trim();
}

export interface MatchedMapping {
  readonly mapping: ListMapping;
  /** Columns whose header is exactly known, and those known by name only. */
  readonly exact: number;
  readonly named: number;
  /** Columns of the file that have a header. */
  readonly headers: number;
}

/** The saved mapping of a list: the one whose headers are those of the file, else the one that knows most of them. */
export function matchMapping(records: readonly ListRecord[], mappings: readonly ListMapping[]): MatchedMapping | null {
  const all = mappings.flatMap((mapping) => {
    const header = laidOut(records, mapping.layout)?.header;
    return header === undefined ? [] : [matchOf(header.cells.map(tidy), mapping)];
  });
  const [best] = all.filter(isSameList).sort((a, b) => b.exact + b.named - (a.exact + a.named) || b.exact - a.exact);
  return best ?? null;
}

const KNOWN_SHARE = 0.6;

/** Most columns of the mapping are in the file, and most of the file in the mapping: another list that shares the usual headers is another list. */
const isSameList = ({ mapping, exact, named, headers }: MatchedMapping): boolean => exact > 0 && exact + named >= KNOWN_SHARE * Math.max(mapping.columns.length, headers);

const tidy = (cell: string): string => cell.replace(/\s+/gu, ' ').trim();

function matchOf(headers: readonly string[], mapping: ListMapping): MatchedMapping {
  const titles = new Set(mapping.columns.flatMap((column) => column.titles));
  const names = new Set([...titles].map(headerName));
  const exact = headers.filter((header) => header !== '' && titles.has(header)).length;
  const named = headers.filter((header) => header !== '' && !titles.has(header) && names.has(headerName(header))).length;
  return { mapping, exact, named, headers: headers.filter((header) => header !== '').length };
}

/** What a mapping says of a header: exactly known, or known by name with another unit; null when it does not know it. */
export function mappedColumn(header: string, mapping: ListMapping): { readonly column: MappedColumn; readonly exact: boolean } | null {
  const exact = mapping.columns.find(({ titles }) => titles.includes(header));
  if (exact !== undefined) return { column: exact, exact: true };
  const name = headerName(header);
  const named = header === '' ? undefined : mapping.columns.find(({ titles }) => titles.some((title) => headerName(title) === name));
  return named === undefined ? null : { column: named, exact: false };
}

/** The unit of a reading, as its header wrote it; null without one. */
export function unitOf(reading: ColumnReading): string | null {
  return fieldsOfReading(reading).unit ?? null;
}

/** The columns of a list as a mapping keeps them. */
export function mappedColumns(columns: readonly ListColumn[]): MappedColumn[] {
  return columns.filter(({ header }) => header !== '').map(({ header, reading }) => ({ titles: [header], reading }));
}
