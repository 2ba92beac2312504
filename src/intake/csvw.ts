import type { Status } from '../parts/part.js';
import { STATUSES } from '../parts/part.js';
import type { Declarations } from './declarations.js';
import type { Layout } from './layout.js';
import type { Encoding } from './limits.js';
import { ENCODINGS } from './limits.js';
import type { Delimiter } from './list.js';
import { DELIMITERS } from './list.js';
import type { ListMapping, MappedColumn } from './mapping.js';
import { headerFingerprint } from './mapping.js';
import { fieldsOfReading, readingOfFields } from './reading-fields.js';
import { MISSING_WORDS } from './vocabulary.js';

/** Namespace of the terms CSVW does not have: field, unit, limit kind, condition. An identifier, nothing to be fetched. */
const NAMESPACE = 'urn:railfit:mapping#';

/**
 * A mapping as a document of CSV on the Web (W3C Recommendation, Metadata Vocabulary for Tabular Data, 2015): dialect, titles, null and
 * datatype in its terms, the rest in a namespace of our own. Written to be read and edited by hand.
 */
export function mappingDocument(mapping: ListMapping): string {
  const { layout, declare, words, missing } = mapping;
  const [top] = layout.headerRows;
  const document = {
    '@context': ['http://www.w3.org/ns/csvw', { railfit: NAMESPACE }],
    url: mapping.name,
    dialect: { encoding: mapping.encoding, delimiter: mapping.delimiter, skipRows: top - 1, headerRowCount: layout.headerRows.length, trim: true },
    'railfit:fingerprint': mapping.fingerprint,
    'railfit:untilBlankRow': layout.untilBlank,
    ...(declare === null ? {} : { 'railfit:declare': declare }),
    ...(mapping.classWithin === null ? {} : { 'railfit:classWithin': mapping.classWithin }),
    ...(words.size === 0 ? {} : { 'railfit:statusWords': Object.fromEntries(words) }),
    tableSchema: { columns: mapping.columns.map((column, index) => columnDocument(column, { index, mapping, nulls: [...MISSING_WORDS, ...missing] })), ...primaryKey(mapping.columns) },
  };
  return `${JSON.stringify(document, null, 2)}\n`;
}

interface ColumnContext {
  readonly index: number;
  readonly mapping: ListMapping;
  readonly nulls: readonly string[];
}

function columnDocument({ titles, reading }: MappedColumn, { index, mapping, nulls }: ColumnContext): object {
  const { field, limit, unit, condition, quantity, perPackage } = fieldsOfReading(reading);
  const isNumber = reading.kind === 'measured' || reading.kind === 'figure' || reading.kind === 'price' || reading.kind === 'load';
  const format = mapping.decimal === 'comma' ? { decimalChar: ',', groupChar: '.' } : { decimalChar: '.' };
  return {
    name: nameOf(index),
    titles,
    'railfit:field': field,
    ...(limit === undefined ? {} : { 'railfit:limit': limit }),
    ...(unit === undefined ? {} : { 'railfit:unit': unit }),
    ...(condition === undefined ? {} : { 'railfit:condition': condition }),
    ...(quantity === undefined ? {} : { 'railfit:quantity': quantity }),
    ...(perPackage === undefined ? {} : { 'railfit:perPackage': perPackage }),
    datatype: isNumber ? { base: 'decimal', format } : 'string',
    null: nulls,
    required: reading.kind === 'identity' && reading.field === 'id',
  };
}

const nameOf = (index: number): string => `column${index + 1}`;

function primaryKey(columns: readonly MappedColumn[]): { primaryKey?: string } {
  const index = columns.findIndex(({ reading }) => reading.kind === 'identity' && reading.field === 'id');
  return index < 0 ? {} : { primaryKey: nameOf(index) };
}

export type MappingResult = { readonly ok: true; readonly mapping: ListMapping } | { readonly ok: false; readonly code: 'I212'; readonly reason: string };

/** Reads such a document back, also after it was edited by hand; says what in it cannot be used. `name` is the file it stands in. */
export function readMappingDocument(text: string, name: string): MappingResult {
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch (error) {
    return { ok: false, code: 'I212', reason: `${name} is no JSON: ${error instanceof Error ? error.message : ''}` };
  }
  const columns = arrayOf(recordOf(recordOf(document)['tableSchema'])['columns']);
  if (columns === null) return { ok: false, code: 'I212', reason: `${name} has no tableSchema.columns` };
  const mapped: MappedColumn[] = [];
  for (const [index, one] of columns.entries()) {
    const read = readColumn(recordOf(one));
    if (typeof read === 'string') return { ok: false, code: 'I212', reason: `${name}, tableSchema.columns[${index}]: ${read}` };
    mapped.push(read);
  }
  return { ok: true, mapping: { name, columns: mapped, ...dialectOf(recordOf(document), mapped), ...ownWords(recordOf(document), columns) } };
}

type Json = Readonly<Record<string, unknown>>;

const recordOf = (value: unknown): Json => (typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Json) : {});
const arrayOf = (value: unknown): readonly unknown[] | null => (Array.isArray(value) ? value : null);
const textOf = (value: unknown): string | undefined => (typeof value === 'string' ? value : undefined);

function readColumn(column: Json): MappedColumn | string {
  const { titles } = column;
  const all = typeof titles === 'string' ? [titles] : (arrayOf(titles) ?? []).filter((title) => typeof title === 'string');
  const field = textOf(column['railfit:field']);
  if (all.length === 0) return 'titles is missing: the header text of the column';
  if (field === undefined) return 'railfit:field is missing, such as "offset voltage" or "text"';
  const [limit, unit, condition] = [textOf(column['railfit:limit']), textOf(column['railfit:unit']), textOf(column['railfit:condition'])];
  const quantity = column['railfit:quantity'];
  const reading = readingOfFields({
    field,
    ...(limit === undefined ? {} : { limit }),
    ...(unit === undefined ? {} : { unit }),
    ...(condition === undefined ? {} : { condition }),
    ...(typeof quantity === 'number' ? { quantity } : {}),
    ...(column['railfit:perPackage'] === true ? { perPackage: true } : {}),
  });
  return typeof reading === 'string' ? reading : { titles: all, reading };
}

type Dialect = Pick<ListMapping, 'fingerprint' | 'encoding' | 'delimiter' | 'decimal' | 'layout'>;

function dialectOf(document: Json, columns: readonly MappedColumn[]): Dialect {
  const dialect = recordOf(document['dialect']);
  const top = wholeOf(dialect['skipRows'], 0) + 1;
  const two = dialect['headerRowCount'] === 2;
  const layout: Layout = { headerRows: two ? [top, top + 1] : [top], untilBlank: document['railfit:untilBlankRow'] === true };
  const isComma = JSON.stringify(document).includes('"decimalChar":","');
  return {
    fingerprint: textOf(document['railfit:fingerprint']) ?? headerFingerprint(columns.map(({ titles }) => titles[0] ?? '')),
    encoding: ENCODINGS.find((one): one is Encoding => one === dialect['encoding']) ?? 'utf-8',
    delimiter: DELIMITERS.find((one): one is Delimiter => one === dialect['delimiter']) ?? ',',
    decimal: isComma ? 'comma' : 'point',
    layout,
  };
}

const wholeOf = (value: unknown, otherwise: number): number => (typeof value === 'number' && Number.isInteger(value) && value >= 0 ? value : otherwise);

function ownWords(document: Json, columns: readonly unknown[]): Pick<ListMapping, 'words' | 'missing' | 'declare' | 'classWithin'> {
  const words = Object.entries(recordOf(document['railfit:statusWords'])).flatMap(([word, status]): [string, Status][] => {
    const known = STATUSES.find((one) => one === status);
    return known === undefined ? [] : [[word, known]];
  });
  const nulls = new Set(columns.flatMap((column) => (arrayOf(recordOf(column)['null']) ?? []).filter((word) => typeof word === 'string')));
  const { 'railfit:declare': declare, 'railfit:classWithin': within } = document;
  return { classWithin: typeof within === 'number' ? within : null, words: new Map(words), missing: [...nulls].filter((word) => !MISSING_WORDS.includes(word)), declare: declare === undefined ? null : declarationsOf(recordOf(declare)) };
}

function declarationsOf(json: Json): Declarations {
  const pair = arrayOf(json['temperature']);
  const temperature = pair !== null && typeof pair[0] === 'number' && typeof pair[1] === 'number' ? ([pair[0], pair[1]] as const) : null;
  const at = (key: 'offsetVoltage' | 'biasCurrent' | 'limits'): Partial<Record<typeof key, number | 'over'>> => {
    const value = json[key];
    return typeof value === 'number' || value === 'over' ? { [key]: value } : {};
  };
  const [by, date] = [textOf(json['by']), textOf(json['date'])];
  return { ...(temperature === null ? {} : { temperature }), ...at('offsetVoltage'), ...at('biasCurrent'), ...at('limits'), ...(by === undefined ? {} : { by }), ...(date === undefined ? {} : { date }) };
}
