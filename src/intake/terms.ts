import type { Parameter } from '../parts/figures.js';
import type { FieldKind } from '../quantities/kinds.js';
import { foldPhrase } from './header-parts.js';
import type { IdentityField, Statement } from './header-words.js';
import { IDENTITY_FIELDS, STATEMENTS } from './header-words.js';
import { FIGURE_WORDS, IDENTITY_TERMS, KNOWN_WORDS, LOAD_WORDS, PRICE_WORDS, RAIL_WORDS, SPECIAL_WORDS, STATEMENT_TERMS } from './vocabulary.js';
import { PARAMETERS } from '../parts/figures.js';

export type Special = keyof typeof SPECIAL_WORDS;
export type RailSense = keyof typeof RAIL_WORDS;

/** What a phrase of the vocabulary stands for. */
export type Term =
  | { readonly kind: 'figure'; readonly parameter: Parameter }
  | { readonly kind: 'special'; readonly special: Special }
  | { readonly kind: 'identity'; readonly field: IdentityField }
  | { readonly kind: 'statement'; readonly statement: Statement }
  | { readonly kind: 'price' }
  | { readonly kind: 'rail'; readonly sense: RailSense }
  | { readonly kind: 'load' }
  | { readonly kind: 'known'; readonly field: FieldKind | null };

/** The meaning of folded header words; null when the vocabulary does not have them. */
export function termOf(words: string): Term | null {
  return TERMS.get(words) ?? null;
}

/** Every phrase of the vocabulary, for offering a near one. */
export function allPhrases(): readonly string[] {
  return PHRASES;
}

/** `[input] offset` → `input offset`, `offset`. */
function spellings(phrase: string): string[] {
  let all = [''];
  for (const word of phrase.split(' ')) {
    const optional = /^\[(.*)\]$/u.exec(word)?.[1];
    all = optional === undefined ? all.map((start) => `${start} ${word}`) : [...all.map((start) => `${start} ${optional}`), ...all];
  }
  return all.map((one) => foldPhrase(one));
}

function entries(phrases: readonly string[], term: Term): [string, Term][] {
  // Words in one pair of brackets stay together: `[low side]` is not used, so a blank ends a word.
  return phrases.flatMap((phrase) => spellings(phrase)).map((words) => [words, term]);
}

const keys = <Key extends string>(table: Readonly<Partial<Record<Key, unknown>>>): Key[] => Object.keys(table) as Key[];

// The first meaning of a phrase stands: what is more particular comes first.
const TERMS: ReadonlyMap<string, Term> = new Map(
  [
    ...IDENTITY_FIELDS.flatMap((field) => entries([field, ...(IDENTITY_TERMS[field] ?? [])], { kind: 'identity', field })),
    ...keys(STATEMENTS).flatMap((statement) => entries([STATEMENTS[statement], ...STATEMENT_TERMS[statement]], { kind: 'statement', statement })),
    ...entries(PRICE_WORDS, { kind: 'price' }),
    ...keys(RAIL_WORDS).flatMap((sense) => entries(RAIL_WORDS[sense], { kind: 'rail', sense })),
    ...entries(LOAD_WORDS, { kind: 'load' }),
    ...KNOWN_WORDS.flatMap(({ words, field }) => entries(words, { kind: 'known', field })),
    ...keys(SPECIAL_WORDS).flatMap((special) => entries(SPECIAL_WORDS[special], { kind: 'special', special })),
    ...keys(PARAMETERS).flatMap((parameter) => entries([PARAMETERS[parameter].words, ...(FIGURE_WORDS[parameter] ?? [])], { kind: 'figure', parameter })),
  ].reverse(),
);

const PHRASES: readonly string[] = [...TERMS.keys()];
