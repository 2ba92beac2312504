import { refuseRest } from './phrase-refusals.js';
import { Reader } from './phrase-reader.js';
import type { Phrase, Segment } from './syntax.js';
import { tokenise, type Token } from './tokens.js';

/** Reads the grammar of a quantity: segments of figures, ranges, lists and tolerances. Throws Refusal. */
export function readPhrase(text: string): Phrase {
  const { tokens, aside } = withoutParentheses(tokenise(text), text);
  const reader = new Reader(tokens, text);
  const segments: Segment[] = [];
  while (reader.peek() !== null) {
    segments.push(reader.segment());
    reader.separator();
  }
  return { segments, aside, end: text.length };
}

/**
 * `(max)` and `(±5 %)` are what they say without the parentheses; `2 (5 max)` opens a segment of its own; anything else
 * in parentheses repeats the value and is compared later.
 */
function withoutParentheses(tokens: readonly Token[], text: string): { tokens: readonly Token[]; aside: Phrase['aside'] } {
  const open = tokens.findIndex((token) => token.type === 'open');
  if (open < 0) return { tokens, aside: null };
  const close = tokens.findIndex((token) => token.type === 'close');
  const unitAfter = close === tokens.length - 2 && tokens[close + 1]?.type === 'unit' ? tokens.slice(close + 1) : [];
  const inside = withUnit(tokens.slice(open + 1, close), unitAfter);
  if (close + unitAfter.length !== tokens.length - 1 || inside.length === 0) refuseRest(tokens[open]?.start ?? 0, text);
  if (tokens.slice(0, open).length === 0) refuseRest(tokens[open]?.start ?? 0, text);
  const first = inside[0];
  const before = tokens.slice(0, open);
  if (first?.type === 'plus-minus' || isOffset(inside)) return { tokens: [...before, ...inside], aside: null };
  const isUnit = inside.length === 1 && first?.type === 'unit' && before.at(-1)?.type === 'number';
  if (isUnit) return { tokens: [...before, ...inside], aside: null };
  const worded = inside.some((token) => token.type === 'limit');
  if (worded && inside.length === 1) return { tokens: [...before, ...inside], aside: null };
  const last = inside.at(-1);
  if (first === undefined || last === undefined) refuseRest(tokens[open]?.start ?? 0, text);
  const { start } = first;
  const { end } = last;
  if (worded) return { tokens: [...before, { type: 'separator', text: '(', start, end: start }, ...inside], aside: null };
  return { tokens: before, aside: { text: text.slice(start, end), start, end } };
}

/** `2 (5 max) mV`: the unit after the parentheses belongs to the number inside, and is shared from there. */
function withUnit(inside: readonly Token[], unit: readonly Token[]): readonly Token[] {
  const number = inside.findIndex((token) => token.type === 'number');
  return unit.length === 0 || number < 0 ? inside : [...inside.slice(0, number + 1), ...unit, ...inside.slice(number + 1)];
}

const isOffset = (tokens: readonly Token[]): boolean => tokens[0]?.type === 'sign' && tokens[1]?.type === 'number' && !tokens.some((token) => token.type === 'range');
