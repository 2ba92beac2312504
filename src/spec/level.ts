import type { Draft } from './draft.js';
import { leafAt, refuse } from './refuse.js';
import { field } from './schema.js';
import type { Swing } from './spec.js';
import { readSwing } from './value.js';
import { unknownWord } from './words.js';

/** A field that takes a word, or a voltage with its ends; undefined when absent or refused. */
export function readLevel(draft: Draft, path: string): string | Swing | undefined {
  const text = leafAt(draft, path)?.text.trim();
  if (text === undefined) return undefined;
  if (field(path).words?.includes(text) === true) return text;
  return /\d/.test(text) ? readSwing(draft, path) : refuse(draft, path, unknownWord(text, path));
}
