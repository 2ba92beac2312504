import type { LimitKind } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { FieldKind } from '../quantities/kinds.js';
import { FIELD_KINDS } from '../quantities/kinds.js';
import type { ColumnReading, MeasuredReading, Target } from './column-reading.js';
import { conditionWords } from './condition.js';
import { readHeaderConditions } from './header-condition.js';
import { IDENTITY_FIELDS, STATEMENTS } from './header-words.js';
import type { Statement } from './header-words.js';
import type { RailSense } from './terms.js';

/** A column's meaning as a mapping writes it down, one thing a field, so that it can be edited by hand. */
export interface ReadingFields {
  /** `offset voltage`, `supply range`, `price`, `status`, `load`, `text`, … */
  readonly field: string;
  /** `min`, `typ`, `max`, or the order of several figures in one cell: `typ/max`. */
  readonly limit?: string;
  readonly unit?: string;
  /** Canonical words: `2 kΩ to ground, 5 V`, `85 °C`, `over temperature`. */
  readonly condition?: string;
  /** Pieces a price holds for. */
  readonly quantity?: number;
  readonly perPackage?: true;
}

const SPECIAL_FIELDS: ReadonlyMap<string, Target> = new Map<string, Target>([
  ['supply range', 'supplyRange'], ['temperature range', 'temperatureRange'], ['both output head-rooms', 'bothSwings'],
  ['output high voltage', 'outputHighVoltage'], ['lowest input voltage', 'commonModeLow'], ['highest input voltage', 'commonModeHigh'],
  ['highest input voltage from V+', 'commonModeHighFromRail'], ['input voltage range', 'commonModeRange'],
]);
const TARGETS: ReadonlyMap<string, Target> = new Map([...SPECIAL_FIELDS, ...(Object.keys(PARAMETERS) as (keyof typeof PARAMETERS)[]).map((name): [string, Target] => [PARAMETERS[name].words, name])]);
const TARGET_WORDS: ReadonlyMap<Target, string> = new Map([...TARGETS].map(([words, target]) => [target, words]));
const RAILS: ReadonlyMap<string, RailSense> = new Map([['rail-to-rail', 'words'], ['rail-to-rail input', 'input'], ['rail-to-rail output', 'output'], ['rail-to-rail input and output', 'both'], ['ground sensing', 'ground']]);
const STATEMENT_FIELDS: ReadonlyMap<string, Statement> = new Map((Object.keys(STATEMENTS) as Statement[]).map((name) => [STATEMENTS[name], name]));

/** The fields of a column's meaning. */
export function fieldsOfReading(reading: ColumnReading): ReadingFields {
  const unit = 'unit' in reading && reading.unit !== null ? { unit: reading.unit } : {};
  switch (reading.kind) {
    case 'identity': return { field: reading.field };
    case 'statement': return { field: STATEMENTS[reading.statement] };
    case 'price': return { field: 'price', ...(reading.currency === null ? {} : { unit: reading.currency }), ...(reading.quantity === null ? {} : { quantity: reading.quantity }) };
    case 'rail': return { field: [...RAILS].find(([, sense]) => sense === reading.sense)?.[0] ?? 'rail-to-rail' };
    case 'load': return { field: 'load', ...unit };
    case 'known': return { field: reading.field === null ? 'text' : `text (${reading.field})`, ...unit };
    case 'figure': return { field: PARAMETERS[reading.parameter].words, limit: reading.limit, ...unit, ...conditionOf(reading) };
    case 'measured': return measuredFields(reading, unit);
    case 'question': case 'text': return { field: 'text' };
  }
}

function measuredFields({ target, limit, order, condition, perPackage }: MeasuredReading, unit: { unit?: string }): ReadingFields {
  const stated = order === null ? limit : order.join('/');
  return { field: TARGET_WORDS.get(target) ?? 'text', ...(stated === null ? {} : { limit: stated }), ...unit, ...conditionOf({ condition }), ...(perPackage ? { perPackage: true } : {}) };
}

function conditionOf({ condition }: Pick<MeasuredReading, 'condition'>): { condition?: string } {
  const words = conditionWords(condition);
  return words === '' ? {} : { condition: words };
}

/** The meaning the fields stand for, or why they stand for none. */
export function readingOfFields(fields: ReadingFields): ColumnReading | string {
  const { field, unit = null, quantity = null } = fields;
  const identity = IDENTITY_FIELDS.find((name) => name === field);
  if (identity !== undefined) return { kind: 'identity', field: identity };
  const statement = STATEMENT_FIELDS.get(field);
  if (statement !== undefined) return { kind: 'statement', statement };
  if (field === 'price') return { kind: 'price', currency: unit, quantity };
  const sense = RAILS.get(field);
  if (sense !== undefined) return { kind: 'rail', sense };
  if (field === 'load') return { kind: 'load', unit };
  if (field === 'text') return { kind: 'known', field: null, unit };
  const checked = /^text \((.*)\)$/u.exec(field)?.[1];
  const kind = FIELD_KINDS.find((name): name is FieldKind => name === checked);
  if (kind !== undefined) return { kind: 'known', field: kind, unit };
  const target = TARGETS.get(field);
  return target === undefined ? `"${field}" is no field a column can have` : measuredOf(target, fields);
}

function measuredOf(target: Target, { limit, unit, condition, perPackage }: ReadingFields): MeasuredReading | string {
  const kinds = limit?.split('/') ?? [];
  if (!kinds.every(isLimit)) return `"${limit ?? ''}" is no limit kind; min, typ, max, or an order such as typ/max`;
  const read = readHeaderConditions(condition === undefined ? [] : [condition]);
  if (typeof read === 'string') return read;
  const [only, second] = kinds;
  return { kind: 'measured', target, limit: second === undefined ? (only ?? null) : null, order: second === undefined ? null : kinds, unit: unit ?? null, condition: read.condition, perPackage: perPackage === true };
}

const isLimit = (word: string): word is LimitKind => word === 'min' || word === 'typ' || word === 'max';
