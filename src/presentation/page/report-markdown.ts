import { aheadLines } from '../ahead-text.js';
import { amount, compared, priceText } from '../amounts.js';
import { confirmationInFull } from '../confirm-text.js';
import { emptyReason } from '../empty-answer.js';
import { aboutPart } from '../fit-table.js';
import { failures } from '../rejected-text.js';
import { countsLine } from '../shortlist-text.js';
import { stageInShort } from '../stage-text.js';
import { spareText, unknownText } from '../verdict-words.js';
import { checkWords } from '../words.js';
import { codeMarkdown, plainMarkdown, tableMarkdown } from './markdown-signs.js';
import { pageStyle, sentence } from './page-style.js';
import type { Review, ReviewedStage } from './review.js';
import { cautionsOfAnswer } from './sections/answer.js';
import { checksLine, chosenBy } from './sections/answer-words.js';
import { outcomeWords } from './sections/outcome.js';
import { reviewTitle } from './sections/summary.js';

/** The review for a pull request: the answer, margins, shortlist, near misses, assumptions, how to get it again. */
export function reportMarkdown(review: Review): string {
  const lines = [`# Design review: ${plainMarkdown(reviewTitle(review))}`, '', ...summary(review), ...review.stages.flatMap((stage) => stageLines(review, stage)), ...reproduce(review)];
  return `${lines.join('\n').replace(/\n{3,}/gu, '\n\n').trimEnd()}\n`;
}

function summary({ stages }: Review): string[] {
  if (stages.length < 2) return [];
  return tableMarkdown(['Stage', 'Part', 'Verdict', 'Fit', 'Open', 'Do not fit'], stages.map(({ file, chosen, report }) => {
    const { fit, undecided, rejected } = report.counts;
    return [nameOf(file, report.stage.name), ...answerCells(chosen), String(fit), String(undecided), String(rejected)];
  }));
}

const nameOf = (file: string | null, name: string | null): string => (name === null && file === null ? 'stage' : codeMarkdown(name ?? file ?? ''));

function answerCells(chosen: ReviewedStage['chosen']): string[] {
  return chosen === null ? ['none', 'nothing fits'] : [codeMarkdown(chosen.judged.part.id), outcomeWords(chosen.judged.outcome)];
}

function stageLines(review: Review, stage: ReviewedStage): string[] {
  const { report, file } = stage;
  const heading = review.stages.length < 2 ? [] : [`## ${nameOf(file, report.stage.name)}`, ''];
  return [...heading, plainMarkdown(`${stageInShort(report.stage)}.`), '', ...answer(review, stage), ...margins(stage), ...shortlist(review, stage), ...nearMisses(stage), ...assumptions(stage)];
}

function answer(review: Review, stage: ReviewedStage): string[] {
  const { chosen, report } = stage;
  const style = pageStyle(review);
  if (chosen === null) return ['**No part fits.**', '', ...emptyReason(report, style).map(plainMarkdown), '', plainMarkdown(countsLine(report)), '', ...cautionLines(stage)];
  const ahead = chosen.rank === 1 ? aheadLines(report, style) : [];
  return [
    `**${codeMarkdown(chosen.judged.part.id)} ${outcomeWords(chosen.judged.outcome)}.** ${plainMarkdown(chosenBy(stage, chosen))}`,
    '',
    `- ${plainMarkdown(checksLine(chosen))}`,
    `- ${plainMarkdown(countsLine(report))}`,
    ...(ahead.length === 0 ? [] : [`- ${plainMarkdown(sentence(ahead))}`]),
    '',
    ...cautionLines(stage),
    ...(chosen.judged.confirm.length === 0 ? [] : ['Confirm before release:', '', ...chosen.judged.confirm.map((one) => `- ${plainMarkdown(confirmationInFull(one))}`), '']),
  ];
}

function cautionLines(stage: ReviewedStage): string[] {
  const cautions = cautionsOfAnswer({ stage });
  return cautions.length === 0 ? [] : ['Cautions:', '', ...cautions.map((caution) => `- ${plainMarkdown(caution)}`), ''];
}

const WORDS = { pass: '✓ pass', fail: '✕ fail', unknown: '? open' } as const;

function margins({ chosen }: ReviewedStage): string[] {
  if (chosen === null) return [];
  const rows = chosen.judged.verdicts.map((verdict) => {
    const numbers = compared(verdict);
    const left = verdict.outcome === 'unknown' ? unknownText([verdict]) : verdict.outcome === 'pass' ? spareText(verdict) : failures({ ...chosen.judged, verdicts: [verdict] });
    return [plainMarkdown(verdict.title), WORDS[verdict.outcome], plainMarkdown(numbers?.offered ?? String(verdict.offered ?? '')), plainMarkdown(numbers?.required ?? ''), plainMarkdown(left)];
  });
  return ['### Margins, worst case', '', ...tableMarkdown(['Check', 'Verdict', 'Part', 'Limit', 'Left'], rows)];
}

function shortlist({ top }: Review, { report }: ReviewedStage): string[] {
  const rows = report.fit.slice(0, top).map((one) => {
    const tightest = one.verdicts.find((verdict) => verdict.check === one.tightest);
    const about = aboutPart(one.part);
    return [String(one.rank), codeMarkdown(one.part.id), one.part.tier, about === '' ? '' : codeMarkdown(about), tightest === undefined ? '' : plainMarkdown(`${checkWords(tightest.check)}, ${spareText(tightest)}`), one.current === null ? '' : plainMarkdown(amount(one.current, 'A', { round: 'up' })), plainMarkdown(priceText(one.part.price)), one.proof ?? ''];
  });
  return rows.length === 0 ? [] : ['### Shortlist', '', ...tableMarkdown(['#', 'Part', 'List', 'About', 'Tightest', 'Current', 'Price', 'Proof'], rows)];
}

function nearMisses({ report }: ReviewedStage): string[] {
  if (report.nearest.length === 0) return [];
  return ['### Nearest of those that do not fit', '', ...report.nearest.map((one) => `- ${codeMarkdown(one.part.id)}: ${plainMarkdown(failures(one))}`), ''];
}

function assumptions({ report: { stage, asking } }: ReviewedStage): string[] {
  const all = [...stage.assumptions, ...asking.assumed.map((wish) => `for this run ${wish}`)];
  return all.length === 0 ? [] : ['Assumed:', '', ...all.map((text) => `- ${plainMarkdown(text)}`), ''];
}

function reproduce({ command, tool, time, stages }: Review): string[] {
  const catalog = stages[0]?.report.data.catalog.sha256 ?? '';
  const hashes = stages.flatMap(({ file, sha256 }) => (sha256 === null ? [] : [`- ${codeMarkdown(file ?? 'stage')}, SHA-256 \`${sha256}\``]));
  return ['### Reproduce', '', codeMarkdown(command), '', `- ${plainMarkdown(tool)}, ${plainMarkdown(time)}`, `- catalog, SHA-256 \`${catalog}\``, ...hashes, ''];
}
