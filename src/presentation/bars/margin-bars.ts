import type { Verdict } from '../../verdicts/verdict.js';
import { amount } from '../amounts.js';
import { basisMark } from '../check-text.js';
import { displayWidth, padded, paragraph } from '../layout.js';
import { LEAST, marginOf, MOST, type Margin } from '../page/plots/margins.js';
import { GLUE, spelled } from '../spelling.js';
import type { Style } from '../style.js';
import { shortfall, spareText } from '../verdict-words.js';
import { limitCell, marginCells, type ShareScale } from './margin-cells.js';
import { inToneOf, markOf } from './outcome-mark.js';
import { signsOf } from './signs.js';

/** A bar for every check that has a margin, or why there is none: the lines, and the verdicts that stand in them. */
export interface MarginBars {
  readonly lines: readonly string[];
  readonly told: ReadonlySet<Verdict>;
}

/** Fewer cells tell nothing apart; more say no more. */
const [FEWEST, MOST_CELLS] = [18, 46];
/** Columns of a mark with its gap: `PASS  `. */
const MARK = 6;
const GAP = 2;
/** Every margin of one part on one line each, all on one scale: what fails first, then what is open, then what passes, the tightest first. */
export function marginBars(verdicts: readonly Verdict[], style: Style): MarginBars {
  const rows = inOrder(verdicts.flatMap((verdict) => rowOf(verdict, style)));
  const widest = (pick: (row: Row) => string): number => Math.max(0, ...rows.map((row) => displayWidth(pick(row))));
  const [titles, words] = [widest(({ title }) => title), widest(({ said }) => said)];
  const cells = Math.min(MOST_CELLS, style.width - MARK - titles - words - 2 * GAP);
  if (rows.length === 0 || cells < FEWEST) return { lines: [], told: new Set() };
  const scale: ShareScale = { least: rows.some(isBelow) ? LEAST : 0, most: MOST, cells };
  const bars = rows.map(({ margin }) => barOf(margin, scale, style));
  const lines = rows.map((row, at) => `${padded(markOf(row.margin.outcome, style), MARK)}${padded(row.title, titles)}  ${bars[at] ?? ''}  ${row.said}`);
  return { lines: [...titleLines(rows, bars, style), axisLine(scale, MARK + titles + GAP, style), ...lines], told: new Set(rows.map(({ verdict }) => verdict)) };
}

interface Row {
  readonly verdict: Verdict;
  readonly margin: Margin;
  readonly title: string;
  readonly said: string;
}

/** Fails and open checks in the order of the checks, as their terms are told; passes by what they leave. */
function inOrder(rows: readonly Row[]): Row[] {
  const of = (outcome: Verdict['outcome']): Row[] => rows.filter(({ margin }) => margin.outcome === outcome);
  return [...of('fail'), ...of('unknown'), ...of('pass').sort((a, b) => tightness(a) - tightness(b))];
}

/** A part stable from unity on meets the noise gain of a follower exactly, and nothing is tight there. */
const tightness = ({ margin: { check, share } }: Row): number => (check === 'stable-gain' && share === 0 ? Infinity : (share ?? 0));

/** What has no share of its limit (temperatures, words) has no bar. */
function rowOf(verdict: Verdict, style: Style): Row[] {
  const margin = marginOf(boundAsBest(verdict));
  const hasBar = margin.share !== null || (margin.outcome === 'unknown' && margin.best !== null);
  return hasBar ? [{ verdict, margin, title: spelled(verdict.title, style), said: spelled(wordsOf(verdict, margin), style) }] : [];
}

/** Where a figure is missing, what is known is as good as it can get. */
function boundAsBest(verdict: Verdict): Verdict {
  const { offered, offeredBest, known, outcome } = verdict;
  return outcome === 'unknown' && offered === null && offeredBest === null && known !== null ? { ...verdict, offeredBest: known } : verdict;
}

/** The words of the text without bars; of an open check what its two readings leave. */
function wordsOf(verdict: Verdict, { words, share, best }: Margin): string {
  if (verdict.outcome === 'pass') return spareText(verdict) + basisMark(verdict);
  if (verdict.outcome === 'fail') return shortfall(verdict);
  if (share !== null) return `at worst ${words}`;
  return best === null ? 'not known' : `at best ${amount(100 * best, '%', { digits: 2, round: 'down' })} spare`;
}

const isBelow = ({ margin: { share, best, outcome } }: Row): boolean => outcome !== 'pass' || (share ?? 0) < 0 || (best ?? 0) < 0;

/** The tone lies on the signs alone, not on the mark of the limit. */
function barOf(margin: Margin, scale: ShareScale, style: Style): string {
  const row = marginCells(margin, scale, signsOf(style));
  const limit = limitCell(scale);
  const tone = (part: string): string => part.replace(/[^ ]+/gu, (signs) => inToneOf(signs, margin.outcome, style));
  return `${tone(row.slice(0, limit))}|${tone(row.slice(limit + 1))}`;
}

/** What the bars are, and the signs that occur. */
function titleLines(rows: readonly Row[], bars: readonly string[], style: Style): string[] {
  const signs = signsOf(style);
  const occurs = (sign: string): boolean => bars.some((bar) => bar.includes(sign));
  const meanings = [
    'spare as a share of the limit, linear',
    ...(occurs(signs.missing) ? [`${signs.missing}${GLUE}missing`] : []),
    ...(occurs('<') || occurs('>') ? [`>${GLUE}beyond the scale`] : []),
    ...(rows.some(({ margin }) => margin.outcome === 'unknown') ? [`${signs.open}${GLUE}worst and best reading, without an end where none is known`] : []),
  ];
  return paragraph(meanings.join('; '), style, { lead: 'Margins ' });
}

/** The ends of the scale and the limit, over their cells. */
function axisLine(scale: ShareScale, indent: number, style: Style): string {
  const percent = (share: number): string => spelled(amount(100 * share, '%'), style);
  const limit = limitCell(scale);
  const left = limit === 0 ? 'limit' : padded(padded(percent(scale.least), limit - 2), limit - 2) + 'limit';
  const right = percent(scale.most);
  return ' '.repeat(indent) + padded(left, scale.cells - displayWidth(right)) + right;
}
