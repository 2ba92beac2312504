import type { CheckId, Problem } from '../../index.js';

/** Answers so far, as typed, by question id; an empty text is a question that was passed over. */
export type Answers = ReadonlyMap<string, string>;

export interface Choice {
  readonly value: string;
  readonly words: string;
}

/** One question of guided entry, in the engineer's words. */
export interface Question {
  /** The field of the stage file it fills, unless `field` says another. */
  readonly id: string;
  /** The field an answer goes to; null for a question that only steers the others. */
  readonly field?: (text: string) => string | null;
  readonly words: string;
  /** What an answer looks like. */
  readonly example?: string;
  /** One of these instead of free text. */
  readonly choices?: readonly Choice[];
  readonly asked?: (answers: Answers) => boolean;
  /** What an empty answer means, after "Enter:"; absent where an answer is needed. */
  readonly without?: (answers: Answers) => string | null;
  /** Taken by Enter alone, and shown. */
  readonly suggested?: (answers: Answers) => string | null;
  /** What is wrong with an answer, for a question that is no field of the stage file. */
  readonly refuse?: (text: string) => readonly Problem[];
  /** How the assumptions begin that stand for this question until it is answered. */
  readonly pending?: readonly string[];
  /** Demands that its answer settles. */
  readonly shows?: readonly CheckId[];
}
