import type { LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import { suggest } from '../quantities/suggest.js';
import { canonicalHeader, foldWords } from './canonical-header.js';
import { readCondition } from './condition.js';
import { allHeaderWords, figureWords, IDENTITY_WORDS, STATEMENT_WORDS } from './header-words.js';
import type { ColumnReading, HeaderReading } from './column-reading.js';
import { readHeaderUnit } from './header-unit.js';

export type { ColumnReading, HeaderReading } from './column-reading.js';

/** Reads one header of the canonical CSV. Case, spaces and hyphens of the words do not matter. */
export function readHeader(text: string): HeaderReading {
  const split = splitHeader(text);
  if (split === null) return unknown(text);
  return identity(split) ?? price(split) ?? figure(split) ?? unknown(text);
}

interface SplitHeader {
  readonly words: string;
  readonly unit: string | null;
  readonly conditions: string | null;
}

// words (unit) @ conditions; the unit may hold parentheses of its own, as nV/rt(Hz) does.
const SHAPE = /^([^(@]*)(?:\(((?:[^()]|\([^()]*\))*)\))?\s*(?:@(.*))?$/su;

function splitHeader(text: string): SplitHeader | null {
  const match = SHAPE.exec(text.replace(/\s+/gu, ' ').trim());
  if (match === null) return null;
  return { words: foldWords(match[1] ?? ''), unit: match[2]?.trim() ?? null, conditions: match[3]?.trim() ?? null };
}

function identity({ words, unit, conditions }: SplitHeader): ColumnReading | null {
  if (unit !== null || conditions !== null) return null;
  const field = IDENTITY_WORDS.get(words);
  if (field !== undefined) return { kind: 'identity', field };
  const statement = STATEMENT_WORDS.get(words);
  return statement === undefined ? null : { kind: 'statement', statement };
}

function price({ words, unit, conditions }: SplitHeader): HeaderReading | null {
  if (words !== 'price') return null;
  const currency = unit === null ? null : currencyOf(unit);
  if (unit !== null && currency === null) {
    return { kind: 'problem', reason: `"${unit}" is not a currency code of ISO 4217`, fix: 'price (EUR) @ 1000' };
  }
  if (conditions === null) return { kind: 'price', currency, quantity: null };
  const quantity = /^[1-9]\d{0,8}$/u.test(conditions) ? Number(conditions) : null;
  if (quantity !== null) return { kind: 'price', currency, quantity };
  return { kind: 'problem', reason: `"${conditions}" is not a quantity of pieces`, fix: `price (${currency ?? 'EUR'}) @ 1000` };
}

function currencyOf(unit: string): string | null {
  const result = parseQuantity('1', 'price', { headerUnit: unit });
  return result.ok ? result.quantity.unit : null;
}

function figure({ words, unit, conditions }: SplitHeader): HeaderReading | null {
  const found = figureWords(words);
  if (found === null) return null;
  const { parameter, limit } = found;
  if (limit === null) return wrongKind(parameter, found.written, found.kinds);
  const unitFault = unit === null ? null : readHeaderUnit(unit, parameter);
  const fix = canonicalHeader(parameter, limit);
  if (unitFault !== null) return { kind: 'problem', reason: unitFault, fix };
  if (conditions === null) return { kind: 'figure', parameter, limit, unit, condition: {} };
  const read = readCondition(conditions);
  if (!read.ok) return { kind: 'problem', reason: read.reason, fix };
  return { kind: 'figure', parameter, limit, unit, condition: read.condition };
}

function wrongKind(parameter: Parameter, written: LimitKind | null, kinds: readonly LimitKind[]): HeaderReading {
  const reason = written === null ? 'the limit kind is missing' : `${PARAMETERS[parameter].words} is not kept with the kind ${written}`;
  // All kinds are offered: only the owner of the list knows whether a figure is a limit or a typical.
  return { kind: 'problem', reason, fix: kinds.map((kind) => canonicalHeader(parameter, kind)).join(' or ') };
}

function unknown(text: string): ColumnReading {
  const words = foldWords((SHAPE.exec(text.trim())?.[1] ?? text).trim());
  const [near] = words === '' ? [] : suggest(words, [...allHeaderWords().keys()]);
  const suggestion = near === undefined ? undefined : allHeaderWords().get(near);
  return suggestion === undefined ? { kind: 'text' } : { kind: 'text', suggestion };
}
