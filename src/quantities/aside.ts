import { assemble } from './assemble.js';
import { readPhrase } from './phrase.js';
import type { Phrase } from './syntax.js';
import type { Quantity } from './quantity.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';

type Aside = NonNullable<Phrase['aside']>;

/** The echo rounds derived figures to four digits; a decibel figure of four digits leaves 0.6 %. */
const AGREES_WITHIN = 0.006;

/**
 * The canonical echo repeats a value in parentheses: `2 Vpp (1 Vpk)`, `5 V ±5 % (4.75 V..5.25 V)`, `-10 V/V (inverting)`.
 * It must agree with what stands before it. A ratio is taken from the parentheses, where its exact figure is.
 * Throws Refusal Q013 when the two differ.
 */
export function readAside(quantity: Quantity, aside: Aside, reading: Reading): Quantity {
  if (/^inverting$/i.test(aside.text) && (quantity.nominal ?? 0) < 0) return quantity;
  const text = aside.text.replace(/,? *sine$/, '');
  if (text === '') return quantity;
  const inner = readInside(text, aside, reading);
  const ends: [number | undefined, number | undefined][] = [[quantity.min, inner.min], [quantity.max, inner.max]];
  if (inner.nominal !== undefined) ends.push([quantity.nominal, inner.nominal]);
  if (ends.some(([outer, repeated]) => !agree(outer, repeated))) refuse(aside, reading);
  return reading.kind === 'ratio' && inner.nominal !== undefined ? { ...inner, text: quantity.text } : quantity;
}

function readInside(text: string, aside: Aside, reading: Reading): Quantity {
  const padded = ' '.repeat(aside.start) + text;
  const inside = { ...reading, text: padded };
  const phrase = readPhrase(padded);
  if (phrase.aside !== null) refuse(aside, reading);
  return assemble(phrase, inside, text);
}

function agree(outer: number | undefined, repeated: number | undefined): boolean {
  if (outer === undefined || repeated === undefined) return outer === repeated;
  return Math.abs(outer - repeated) <= AGREES_WITHIN * Math.abs(outer);
}

function refuse(aside: Aside, reading: Reading): never {
  throw new Refusal('Q013', `(${aside.text}) does not repeat what stands before it`, {
    start: aside.start,
    end: aside.end,
    fix: reading.text.slice(0, Math.max(0, reading.text.lastIndexOf('(', aside.start))).trim(),
  });
}
