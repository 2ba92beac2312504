import type { InputType, Lifecycle, Status } from '../parts/part.js';
import { LIFECYCLES, STATUSES } from '../parts/part.js';
import { suggest } from '../quantities/suggest.js';
import { foldWords } from './canonical-header.js';
import { foldPhrase } from './header-parts.js';
import { LIFECYCLE_TERMS } from './vocabulary.js';
import type { CellFault } from './cell-fault.js';

export type WordResult<Word> = { readonly ok: true; readonly word: Word } | { readonly ok: false; readonly fault: CellFault };

/** Reads one word of a closed list; case, spaces and hyphens do not matter (`Not approved` is `not-approved`). */
type WordReader<Word> = (text: string) => WordResult<Word>;

export const readStatus: WordReader<Status> = reader('I501', 'a status', STATUSES);
const plainLifecycle: WordReader<Lifecycle> = reader('I509', 'a lifecycle', LIFECYCLES);

/** A lifecycle in the canonical word or another of the trade's (`Not recommended for new designs`). */
export function readLifecycle(text: string): WordResult<Lifecycle> {
  const known = LIFECYCLE_TERMS[foldPhrase(text)];
  return known === undefined ? plainLifecycle(text) : { ok: true, word: known };
}
export const readInputType: WordReader<InputType> = reader('I503', 'an input type', ['fet', 'bipolar']);

export function readYesNo(text: string): WordResult<boolean> {
  const read = YES_NO(text);
  return read.ok ? { ok: true, word: read.word === 'yes' } : read;
}

const YES_NO: WordReader<'yes' | 'no'> = reader('I503', 'yes or no', ['yes', 'no']);

function reader<Word extends string>(code: string, what: string, words: readonly Word[]): WordReader<Word> {
  return (text) => {
    const folded = foldWords(text);
    const word = words.find((candidate) => foldWords(candidate) === folded);
    if (word !== undefined) return { ok: true, word };
    const [near] = suggest(text.trim().toLowerCase(), words);
    const reason = `${text.trim()} is not ${what}; accepted: ${words.join(', ')}`;
    return { ok: false, fault: { code, reason, fix: near ?? `one of ${words.join(', ')}` } };
  };
}
