import type { Part } from '../parts/part.js';
import { canonicalHeader } from './canonical-header.js';
import { figureText } from './figure-text.js';
import { IDENTITY_FIELDS, STATEMENTS, type Statement } from './header-words.js';

/** One field of a part in two lists, as canonical header and cells; null where the list says nothing. */
export interface FieldChange {
  readonly field: string;
  readonly was: string | null;
  readonly now: string | null;
}

/** What differs between two versions of a part, fields of the earlier version first. */
export function fieldChanges(before: Part, after: Part): FieldChange[] {
  const [old, fresh] = [fieldsOf(before), fieldsOf(after)];
  return [...new Set([...old.keys(), ...fresh.keys()])].flatMap((field) => {
    const [was, now] = [old.get(field) ?? null, fresh.get(field) ?? null];
    return was === now ? [] : [{ field, was, now }];
  });
}

/** Every field that says something, as canonical header → cell. */
function fieldsOf(part: Part): Map<string, string> {
  const { price } = part;
  const statements = (Object.keys(STATEMENTS) as Statement[]).map((key) => [STATEMENTS[key], part[key]] as const);
  const words = [...IDENTITY_FIELDS.map((field) => [field, part[field]] as const), ...statements];
  return new Map([
    ...words.flatMap(([field, value]): [string, string][] => (value === null ? [] : [[field, wordOf(value)]])),
    ...(price === null ? [] : [['price', `${price.amount} ${price.currency}${price.quantity === null ? '' : ` @ ${price.quantity}`}`] as const]),
    ...part.figures.map(({ parameter, kind, value, condition, assumed }) => [canonicalHeader(parameter, kind, condition), `${figureText(parameter, value)}${assumed === true ? ' (assumed)' : ''}`] as const),
  ]);
}

const wordOf = (value: string | number | boolean): string => (typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value));
