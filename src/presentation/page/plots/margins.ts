import type { Verdict } from '../../../verdicts/verdict.js';
import { checkAmount, compared } from '../../amounts.js';
import { tightestVerdict } from '../../tightest.js';
import { checkWords } from '../../words.js';
import { linearAxis } from '../drawing/axis.js';
import { INK } from '../drawing/colours.js';
import { gridLine, segment, text } from '../drawing/marks.js';
import { NOTE_LINE, noteLines, notesMarkup } from '../drawing/notes.js';
import { named, paged, said } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';
import { marginRow, ROW, SCALE } from './margin-rows.js';

/** Beyond these a spare is cut off and says so, as a share of the limit. */
export const [LEAST, MOST] = [-1, 2] as const;
const TOP = 30;
const NOTES = ['✓ met · ✕ not met · ? not decided: a broken line from the worst to the best reading, without an end where none is known.', 'Cut off at −100 % and 200 %. Temperatures, counts and words have no share.', 'Tightest is the least comfortable margin, each check on its own scale as in the order of the shortlist; it need not be the shortest bar.'];

/** P6: every check that compares numbers, its spare as a share of its limit. Null without a chosen part. */
export function margins({ report, chosen }: PageInput): Figure | null {
  if (chosen === null || chosen.verdicts.length === 0) return null;
  const rows = chosen.verdicts.map(marginOf);
  const axis = linearAxis({ words: 'spare, share of the limit', unit: '%', domain: [100 * LEAST, 100 * MOST], pixels: SCALE });
  const bottom = TOP + rows.length * ROW + 6;
  const zero = axis.place(0);
  const notes = noteLines(NOTES, WIDTH - 14);
  const body = [
    ...axis.ticks.map(({ at }) => gridLine({ x: at, y: TOP }, { x: at, y: bottom })),
    segment({ x: zero, y: TOP - 8 }, { x: zero, y: bottom }, { colour: INK, width: '1.5' }),
    text({ x: zero, y: TOP - 13 }, 'limit', { anchor: 'middle', size: 12 }),
    ...rows.map((row, at) => marginRow(row, axis, TOP + 3 + at * ROW)),
    ...axis.ticks.map(({ at, label }) => text({ x: at, y: bottom + 18 }, label, { anchor: 'middle' })),
    text({ x: (SCALE[0] + SCALE[1]) / 2, y: bottom + 37 }, axis.title, { anchor: 'middle' }),
    notesMarkup(notes, bottom + 60),
  ].join('');
  return figureOf({ id: 'margins', title: 'Margins', finding: findingOf(rows, chosen.part.id, tightestVerdict(report, chosen)), table: tableOf(rows), width: WIDTH, height: bottom + 52 + notes.length * NOTE_LINE, body, csv: csvOf(rows) });
}

/** One check as the plot shows it. */
export interface Margin {
  readonly check: string;
  readonly name: string;
  readonly outcome: Verdict['outcome'];
  /** Spare over the limit; null of words, temperatures and limits of zero. */
  readonly share: number | null;
  /** On the other reading; null where it is not known. */
  readonly best: number | null;
  /** What is left or short, with its unit; the word of a wish; empty when nothing is known. */
  readonly words: string;
  readonly numbers: { readonly offered: string; readonly required: string };
}

export function marginOf(verdict: Verdict): Margin {
  const { check, outcome, required, offered, offeredBest, sense } = verdict;
  const share = (value: number | string | null): number | null => (typeof value === 'number' && typeof required === 'number' ? shareOf(verdict, { value, required }) : null);
  const print = comparedOrNull(verdict);
  return {
    check,
    name: checkWords(check),
    outcome,
    share: share(offered),
    best: share(offeredBest),
    words: spareWords(verdict),
    numbers: { offered: paged(print?.offered ?? shown(verdict, offered)), required: `${sense === 'at-most' ? '≤' : sense === 'at-least' ? '≥' : ''}${paged(print?.required ?? shown(verdict, required))}` },
  };
}

function shareOf({ check, unit, sense }: Verdict, { value, required }: { readonly value: number; readonly required: number }): number | null {
  if (unit === '°C' || check === 'channels' || required === 0 || !Number.isFinite(value)) return null;
  return (sense === 'at-most' ? required - value : value - required) / Math.abs(required);
}

/** What is as good as can be has no number to compare. */
const comparedOrNull = (verdict: Verdict): ReturnType<typeof compared> => (typeof verdict.offered === 'number' && !Number.isFinite(verdict.offered) ? null : compared(verdict));

function shown(verdict: Verdict, value: Verdict['offered'] | Verdict['required']): string {
  if (value === null) return 'not known';
  if (typeof value === 'number') return checkAmount(verdict, value);
  return typeof value === 'string' ? value : value.join(' or ');
}

function spareWords(verdict: Verdict): string {
  const { check, spare, offered, outcome, unit } = verdict;
  if (typeof offered === 'string') return offered;
  if (check === 'channels') return paged(shown(verdict, offered));
  if (spare === null || !Number.isFinite(spare)) return outcome === 'unknown' ? 'not known' : '';
  const print = comparedOrNull(verdict);
  const amount = print === null ? said(Math.abs(spare), unit ?? '') : paged(print.difference);
  return spare < 0 ? `${amount} short` : `${amount} spare`;
}

function findingOf(rows: readonly Margin[], id: string, tightest: Verdict | null): string {
  const count = (outcome: Verdict['outcome']): number => rows.filter((row) => row.outcome === outcome).length;
  const [failed, open] = [count('fail'), count('unknown')];
  const counts = `${named(id)} meets ${count('pass')} of ${rows.length} checks${failed === 0 ? '' : `, fails ${failed}`}${open === 0 ? '' : `, ${open} cannot be decided`}`;
  if (tightest === null) return `${counts}.`;
  const { name, share, words } = marginOf(tightest);
  return `${counts}; the tightest is ${name} with ${words}${share === null ? '' : `, ${said(100 * share, '%', 2)} of the limit`}.`;
}

const OUTCOME_WORDS = { pass: '✓ met', fail: '✕ not met', unknown: '? not decided' } as const;

function tableOf(rows: readonly Margin[]): Figure['table'] {
  const percent = (share: number | null): string => (share === null ? '' : said(100 * share, '%', 2));
  return { columns: ['check', 'outcome', 'part', 'limit', 'spare', 'share of the limit'], rows: rows.map(({ name, outcome, numbers, words, share }) => [name, OUTCOME_WORDS[outcome], numbers.offered, numbers.required, words, percent(share)]) };
}

function csvOf(rows: readonly Margin[]): (string | number | null)[][] {
  return [['check', 'outcome', 'spare_share', 'spare_share_best'], ...rows.map(({ check, outcome, share, best }) => [check, outcome, share, best])];
}
