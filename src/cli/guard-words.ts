import { InvalidArgumentError } from 'commander';

/** The guards of the catalog, which is not loaded for help; a test holds the two lists equal. */
export const GUARD_WORDS = ['removed', 'scaled', 'lifecycle', 'older'] as const;

/** One more guard that is accepted; any other word is refused with those there are. */
export function guardWord(word: string, all: readonly string[] = []): string[] {
  if (!(GUARD_WORDS as readonly string[]).includes(word)) throw new InvalidArgumentError(`Allowed choices are ${GUARD_WORDS.join(', ')}.`);
  return [...all, word];
}
