import { numberLength } from './number.js';
import { unitLength } from './unit-text.js';

export type TokenType =
  | 'number' | 'code' | 'unit' | 'sign' | 'plus-minus' | 'range' | 'slash' | 'limit' | 'times' | 'open' | 'close' | 'separator' | 'approximate' | 'other';

/** A piece of the normalised text, [start, end). */
export interface Token {
  readonly type: TokenType;
  readonly text: string;
  readonly start: number;
  readonly end: number;
  /** For `limit`: what the word or sign says. `nominal` says nothing about a limit. */
  readonly limit?: LimitWord;
}
export type LimitWord = 'min' | 'typ' | 'max' | 'nominal';

/** Cuts normalised text into tokens; blanks are dropped. Never fails: what is not known becomes `other`. */
export function tokenise(text: string): Token[] {
  const tokens: Token[] = [];
  for (let index = 0; index < text.length; ) {
    if (text[index] === ' ') {
      index += 1;
      continue;
    }
    const token = nextToken(text, index, tokens.at(-1));
    tokens.push(token);
    index = token.end;
  }
  return tokens;
}

/** Words and signs of rule Q-13 and of the canonical echo. */
const LIMIT_WORDS: readonly [RegExp, LimitWord][] = [
  [/^(?:(?:max(?:imum)?\b\.?|at most\b|up to\b|less than\b|no more than\b|not more than\b)|<=?|≤|=<)/i, 'max'],
  [/^(?:(?:min(?:imum)?\b\.?|at least\b|more than\b|no less than\b|not less than\b)|>=?|≥|=>)/i, 'min'],
  [/^typ(?:ical(?:ly)?)?\b\.?/i, 'typ'],
  [/^nom(?:inal)?\b\.?/i, 'nominal'],
];

const FIXED: readonly [RegExp, TokenType][] = [
  [/^(?:±|\+ ?\/ ?-|\+-|- ?\/ ?\+|magnitude at most\b)/i, 'plus-minus'],
  [/^(?:~|(?:about|approx(?:\.|imately)?|around|circa|ca\.|roughly)(?![A-Za-z]))/i, 'approximate'],
  [/^(?:\.{2,3}|–|to\b)/i, 'range'],
  [/^[+-]/, 'sign'],
  [/^\//, 'slash'],
  [/^\(/, 'open'],
  [/^\)/, 'close'],
  [/^[,;]/, 'separator'],
  [/^[xX*](?= *[\d.])/, 'times'],
];

/** One letter between, or before, digits stands for the point: `4k7`, `R47`, `3V3`. E starts an exponent and x a factor. */
const LETTER_CODE = /^(?:\d+[A-DF-WYZa-df-wyzµ]\d+|[RKMGTLkpnuµm]\d+)(?![\d.])/;

function nextToken(text: string, start: number, before: Token | undefined): Token {
  const rest = text.slice(start);
  const make = (type: TokenType, length: number): Token => ({ type, text: rest.slice(0, length), start, end: start + length });
  const code = LETTER_CODE.exec(rest)?.[0];
  if (code !== undefined && before?.type !== 'number' && before?.type !== 'code') return make('code', code.length);
  const opens = before === undefined || before.type === 'sign' || before.type === 'range' || before.type === 'plus-minus';
  const number = numberLength(rest, opens);
  if (number > 0) return make('number', number);
  for (const [pattern, limit] of LIMIT_WORDS) {
    const length = pattern.exec(rest)?.[0].length;
    if (length !== undefined) return { ...make('limit', length), limit };
  }
  for (const [pattern, type] of FIXED) {
    const length = pattern.exec(rest)?.[0].length;
    if (length !== undefined) return make(type, length);
  }
  const unit = unitLength(rest);
  return unit > 0 ? make('unit', unit) : make('other', String.fromCodePoint(rest.codePointAt(0) ?? 0).length);
}
