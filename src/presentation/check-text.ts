import type { Basis } from '../parts/basis.js';
import type { Verdict } from '../verdicts/verdict.js';
import { checkAmount, compared } from './amounts.js';
import { flow, padded, paragraph, displayWidth } from './layout.js';
import { safeLine } from './safe-text.js';
import { GLUE, glued, spelled } from './spelling.js';
import { toned, type Style } from './style.js';
import { termLines, type Origins } from './term-text.js';
import { comparisonText, conditionOf, cornerText, shortfall, spareText, turningValue } from './verdict-words.js';
import { figureWords, passingSide, REASON_WORDS } from './words.js';

const INDENT = 6;
const inside = { lead: ' '.repeat(INDENT) };

/** A failing check: value, limit, by how much, at which corner, and what adds up to it. */
export function failingCheck(verdict: Verdict, origins: Origins, style: Style): string[] {
  const numbers = compared(verdict);
  const what = numbers === null ? shortfall(verdict) : `${comparisonText(verdict)}: ${shortfall(verdict)}`;
  return [
    ...headline(toned('FAIL', 'bad', style), `${verdict.title}${GLUE}${GLUE} ${what}`, style),
    ...cornerLines(verdict, style),
    ...termLines(verdict, origins, style),
    ...readingLines(verdict, style),
    ...noteLines(verdict, style),
    ...cautionLines(verdict, style),
  ];
}

/** An open check: what is known, what is missing, where it would turn. */
export function openCheck(verdict: Verdict, origins: Origins, style: Style): string[] {
  const known = comparisonText(verdict);
  const reason = verdict.reason === null ? '' : REASON_WORDS[verdict.reason];
  return [
    ...headline(`${toned('?', 'open', style)}   `, `${verdict.title}${GLUE}${GLUE} ${[known, reason].filter((words) => words !== '').join(': ')}`, style),
    ...cornerLines(verdict, style),
    ...termLines(verdict, origins, style),
    ...turningLines(verdict, style),
    ...noteLines(verdict, style),
    ...cautionLines(verdict, style),
  ];
}

/** A passing check in full. */
export function passingCheck(verdict: Verdict, origins: Origins, style: Style): string[] {
  const numbers = compared(verdict) === null || verdict.check === 'channels' ? spareText(verdict) : `${comparisonText(verdict)}: ${spareText(verdict)}`;
  return [
    ...headline(toned('PASS', 'good', style), `${verdict.title}${GLUE}${GLUE} ${numbers}${basisMark(verdict)}`, style),
    ...cornerLines(verdict, style),
    ...termLines(verdict, origins, style),
    ...noteLines(verdict, style),
    ...cautionLines(verdict, style),
  ];
}

/** Passing checks side by side, with what each has left. */
export function passingInShort(verdicts: readonly Verdict[], style: Style): string[] {
  if (verdicts.length === 0) return [];
  const cells = verdicts.map((verdict) => ({ title: spelled(verdict.title, style), left: spelled(spareText(verdict) + basisMark(verdict), style) }));
  const titles = Math.max(...cells.map(({ title }) => displayWidth(title)));
  const widest = Math.max(...cells.map(({ left }) => displayWidth(left)));
  const pieces = cells.map(({ title, left }) => padded(`${padded(title, titles)}  ${left}`, titles + 2 + widest));
  const lines = flow(pieces, style, { lead: `${toned('PASS', 'good', style)}  ` });
  return [...lines, ...cautionsInShort(verdicts, style)];
}

/** Cautions of checks that are told in short, each with the check it belongs to. */
export function cautionsInShort(verdicts: readonly Verdict[], style: Style): string[] {
  return verdicts.flatMap((verdict) => verdict.cautions.flatMap((caution) => cautionLine(`${verdict.title}: ${caution}`, style)));
}

export function basisMark({ basis }: Verdict): string {
  return basis === null || basis === 'guaranteed' ? '' : ` (${MARKS[basis]})`;
}

/** The basis in one word. */
const MARKS: Readonly<Record<Basis, string>> = { guaranteed: 'limit', derated: 'typical', estimated: 'estimate', assumed: 'assumed', borrowed: 'class' };

function headline(mark: string, text: string, style: Style): string[] {
  return paragraph(text, style, { lead: `${mark}  `, indent: INDENT });
}

function cornerLines({ worstAt }: Verdict, style: Style): string[] {
  const corner = worstAt === null ? '' : cornerText(worstAt);
  return corner === '' ? [] : paragraph(`Worst case ${corner}`, style, inside);
}

/** A fail stands on the best reading; what the worst one gives stands beside it. */
function readingLines(verdict: Verdict, style: Style): string[] {
  const { offered, unit, terms } = verdict;
  const other = otherReading(verdict);
  const lines: string[] = [];
  if (typeof offered === 'number' && other !== null && unit !== null && offered !== other) {
    lines.push(`Figures count as printed here; with deratings and estimates it would be ${checkAmount(verdict, other)}.`);
  }
  if (terms.some((term) => term.basis === 'borrowed')) lines.push('Borrowed terms count as nothing here: the verdict does not depend on them.');
  return lines.flatMap((line) => paragraph(line, style, inside));
}

function turningLines(verdict: Verdict, style: Style): string[] {
  return [...bestReading(verdict), ...turning(verdict)].flatMap((line) => paragraph(line, style, inside));
}

function bestReading(verdict: Verdict): string[] {
  const { offered, unit } = verdict;
  const best = otherReading(verdict);
  if (typeof offered !== 'number' || best === null || unit === null || offered === best) return [];
  return [`Read at its best the figure gives ${checkAmount(verdict, best)}.`];
}

/** The other reading at the corner that is shown. */
function otherReading({ otherThere, offeredBest }: Verdict): number | null {
  if (otherThere !== undefined) return otherThere;
  return typeof offeredBest === 'number' ? offeredBest : null;
}

function turning({ decidesAt }: Verdict): string[] {
  if (decidesAt === null) return [];
  const [within, outside] = passingSide(decidesAt.figure, decidesAt.kind) === 'less' ? ['below', 'above'] : ['above', 'below'];
  const value = `${turningValue(decidesAt)}${conditionOf(decidesAt)}`;
  return [`Decides at: ${figureWords(decidesAt.figure, decidesAt.kind)} of ${value}. At or ${within} it this check passes, ${outside} it does not.`];
}

/** The same result as engineers also say it. */
function noteLines({ notes }: Verdict, style: Style): string[] {
  return (notes ?? []).flatMap((note) => paragraph(glued(safeLine(note)), style, inside));
}

function cautionLines({ cautions }: Verdict, style: Style): string[] {
  return cautions.flatMap((caution) => cautionLine(caution, style));
}

export function cautionLine(caution: string, style: Style): string[] {
  return paragraph(glued(safeLine(caution)), style, { lead: `${' '.repeat(INDENT)}caution: `, indent: INDENT + 2 });
}
