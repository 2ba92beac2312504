import type { PartOutcome } from '../../../screening/index.js';
import type { Outcome } from '../../../verdicts/verdict.js';
import { html, type Html } from '../html.js';
import { marked, type Cell } from '../cell.js';

export type Tone = 'good' | 'bad' | 'open';

/** A verdict by shape and word; colour comes last. */
const OUTCOMES: Readonly<Record<PartOutcome, readonly [sign: string, word: string, tone: Tone]>> = {
  fits: ['✓', 'fits', 'good'],
  'does-not-fit': ['✕', 'does not fit', 'bad'],
  undecided: ['?', 'cannot be decided', 'open'],
};
const CHECKS: Readonly<Record<Outcome, readonly [sign: string, word: string, tone: Tone]>> = {
  pass: ['✓', 'pass', 'good'],
  fail: ['✕', 'fail', 'bad'],
  unknown: ['?', 'open', 'open'],
};

export const outcomeTone = (outcome: PartOutcome): Tone => OUTCOMES[outcome][2];
export const checkTone = (outcome: Outcome): Tone => CHECKS[outcome][2];
export const outcomeWords = (outcome: PartOutcome): string => `${OUTCOMES[outcome][0]} ${OUTCOMES[outcome][1]}`;

export function outcomeCell(outcome: PartOutcome): Cell {
  const [sign, word, tone] = OUTCOMES[outcome];
  return marked(signed(sign, word, tone), word);
}

export function checkCell(outcome: Outcome): Cell {
  const [sign, word, tone] = CHECKS[outcome];
  return marked(signed(sign, word, tone), word);
}

/** The sign is for the eye: the word says it all. */
const signed = (sign: string, word: string, tone: Tone): Html => html`<span class="${tone}"><span class="w"><span aria-hidden="true">${sign}</span> ${word}</span></span>`;
