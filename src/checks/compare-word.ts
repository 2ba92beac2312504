import type { WordDemand } from '../demands/index.js';
import type { Missing, UndecidedFinding, WordFinding } from '../verdicts/finding.js';

/** A word of the part against the words asked for; undecided when the list has none. */
export function compareWord(asked: WordDemand, figure: Missing['figure'], word: string | null): WordFinding | UndecidedFinding {
  if (word !== null) return { kind: 'words', required: asked.required, offered: word };
  return { kind: 'undecided', required: asked.required, unit: null, sense: null, cause: 'missing-figure', missing: [{ figure, kind: null }] };
}
