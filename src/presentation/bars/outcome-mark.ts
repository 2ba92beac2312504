import type { Verdict } from '../../verdicts/verdict.js';
import { toned, type Style } from '../style.js';

type Outcome = Verdict['outcome'];

const MARKS = { pass: ['PASS', 'good'], fail: ['FAIL', 'bad'], unknown: ['?', 'open'] } as const;

/** The verdict in a word or sign, as the rest of the text has it; empty where nothing is asked. */
export function markOf(outcome: Outcome | null, style: Style): string {
  return outcome === null ? '' : toned(MARKS[outcome][0], MARKS[outcome][1], style);
}

/** A row of signs in the tone of its verdict. */
export const inToneOf = (signs: string, outcome: Outcome, style: Style): string => toned(signs, MARKS[outcome][1], style);

/** Of several: a fail before what cannot be decided, before a pass. */
export function worstOutcome(verdicts: readonly Pick<Verdict, 'outcome'>[]): Outcome {
  return (['fail', 'unknown'] as const).find((wanted) => verdicts.some(({ outcome }) => outcome === wanted)) ?? 'pass';
}
