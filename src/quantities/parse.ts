import { readAside } from './aside.js';
import { assemble } from './assemble.js';
import { normaliseCharacters } from './characters.js';
import { refuseDamage } from './damage.js';
import { readHeader } from './header.js';
import { KIND_RULES } from './kind-rules.js';
import type { FieldKind } from './kinds.js';
import { readPhrase } from './phrase.js';
import type { QuantityResult, ReadingContext } from './quantity.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';

/**
 * Reads one quantity as an engineer types it, for a field of the given kind: SI numbers and canonical echo, or the one
 * reason why it is refused. Never throws, whatever the text. A limit never becomes a nominal value.
 */
export function parseQuantity(text: string, kind: FieldKind, context: ReadingContext = {}): QuantityResult {
  let origin: readonly number[] | null = null;
  try {
    const normalised = normaliseCharacters(text);
    origin = normalised.origin;
    const header = context.headerUnit === undefined ? null : readHeader(context.headerUnit, kind);
    return { ok: true, quantity: read({ text: normalised.text, kind, rule: KIND_RULES[kind], context, header }, text) };
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    return { ok: false, problem: report(problem, origin, text) };
  }
}

function read(reading: Reading, typed: string): ReturnType<typeof assemble> {
  refuseDamage(reading);
  const phrase = readPhrase(reading.text);
  const quantity = assemble(phrase, reading, typed);
  return phrase.aside === null ? quantity : readAside(quantity, phrase.aside, reading);
}

/** The span back in the indices of the typed text. */
function report(refusal: Refusal, origin: readonly number[] | null, text: string): { code: string; message: string; span: readonly [number, number]; fix?: string } {
  const at = (index: number): number => Math.min(text.length, origin === null ? index : (origin[Math.min(index, origin.length - 1)] ?? text.length));
  const span = [at(refusal.span[0]), at(refusal.span[1])] as const;
  const problem = { code: refusal.code, message: refusal.message, span };
  return refusal.fix === undefined ? problem : { ...problem, fix: refusal.fix };
}
