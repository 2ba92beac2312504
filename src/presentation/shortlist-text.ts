import { asciiText } from '../quantities/ascii.js';
import { formatQuantity } from '../quantities/format.js';
import type { RankedPart } from '../ranking/index.js';
import type { Report } from '../report.js';
import { aheadLines } from './ahead-text.js';
import { firstSwing } from './bars/shortlisted.js';
import { commandOf, nextLines, type Offer } from './commands.js';
import { dataLine } from './data-text.js';
import { emptyReason, nearestLines, swingLossToTry } from './empty-answer.js';
import { legendLine, fitLines } from './fit-table.js';
import { flow, paragraph } from './layout.js';
import { lookupSummary } from './lookup-text.js';
import { noteLines } from './notes.js';
import { finished, GLUE } from './spelling.js';
import { assumptionLines, stageCautions, stageLines } from './stage-text.js';
import type { CommandContext, Style } from './style.js';
import { conflictLines, waysOutLines } from './ways-out-text.js';
import { undecidedLines } from './undecided-text.js';
import { rejectedLines } from './rejected-text.js';
import { checkWords, counted } from './words.js';

/** The ranked shortlist on one screen: what was asked, what fits and why, what is open, why the rest is out. */
export function renderShortlist(report: Report, style: Style, context: CommandContext): string {
  const fits = report.fit.length > 0;
  const blocks = [
    fits ? [] : [...emptyReason(report, style), ...paragraph(countsLine(report), style)],
    [...stageLines(report.stage, style), ...stageCautions(report.stage, style)],
    fits ? paragraph(countsLine(report), style) : [],
    [...fitLines(report, style), ...undecidedLines(report, style)],
    [...legendLine(report, style), ...orderLine(report, style)],
    firstSwing(report, style),
    aheadLines(report, style),
    conflictLines(report, style),
    waysOutLines(report, style, context),
    report.fit.length < FEW ? nearestLines(report, style) : [],
    histogram(report, style),
    style.all ? rejectedLines(report, style) : [],
    noteLines(report, style),
    lookupSummary(report, style, context),
    closing(report, style),
    nextLines(offers(report, context), style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

/** With fewer parts than this the nearest of the others are shown. */
const FEW = 3;

export function countsLine(report: Report): string {
  const { parts, fit, undecided, rejected } = report.counts;
  const lines = report.fit.length === fit ? '' : `, on ${counted(report.fit.length, 'line')} (packages of one die share a line)`;
  return `${fit} of ${counted(parts, 'part')} ${fit === 1 && parts === 1 ? 'fits' : 'fit'}${lines}, ${undecided} cannot be decided, ${rejected} ${rejected === 1 ? 'does' : 'do'} not fit.`;
}

export const ORDER_WORDS = {
  merit: 'approved before generic, all limits before some typical, then merit: margins, price and current in equal shares.',
  price: 'price as asked, then approved before generic, limits before typical, then merit.',
  current: 'supply current as asked, then approved before generic, limits before typical, then merit.',
  margin: 'least margin as asked, then approved before generic, limits before typical, then merit.',
} as const;

function orderLine({ fit, asking }: Report, style: Style): string[] {
  return fit.length < 2 ? [] : paragraph(`Order: ${ORDER_WORDS[asking.order]}`, style, { lead: ' ' });
}

function histogram({ rejections, counts }: Report, style: Style): string[] {
  if (rejections.length === 0) return [];
  const one = counts.rejected === 1;
  const title = one ? 'Why the other one is out:' : `Why the other ${counts.rejected} are out (one part can fail several checks):`;
  const cells = rejections.map(({ check, parts }) => `${checkWords(check).replaceAll(' ', GLUE)}${GLUE}${parts}`);
  return [...paragraph(counts.fit + counts.undecided === 0 ? title.replace('the other ', one ? 'the ' : 'all ') : title, style), ...flow(cells, style, { lead: '  ' })];
}

function closing(report: Report, style: Style): string[] {
  const { stage, asking, data } = report;
  const strict = asking.strict ? ['only limits count (strict)'] : [];
  return [
    ...assumptionLines([...stage.assumptions, ...strict, ...asking.assumed.map((wish) => `for this run ${wish}`)], style),
    ...dataLine(data, style),
  ];
}

function offers(report: Report, context: CommandContext): Offer[] {
  const { fit, undecided, rejections } = report;
  const out = report.nearest[0] ?? report.rejected[0];
  const first: RankedPart | undefined = fit[0];
  const often = rejections[0];
  // `parts` takes the stage as it stands in its file.
  const asFiled = context.stageFile !== 'standard input' && (context.changes ?? []).length === 0;
  const listing = asFiled ? context.stageFile : null;
  return [
    ...(first === undefined ? [] : [{ words: commandOf(context, ['explain', first.part.id]), why: 'every check of the first' }]),
    ...(first === undefined && undecided[0] !== undefined ? [{ words: commandOf(context, ['explain', undecided[0].part.id]), why: 'what is missing' }] : []),
    ...lossOffer(report, context),
    ...(out === undefined ? [] : [{ words: commandOf(context, ['explain', out.part.id]), why: 'the nearest that is out' }]),
    ...(often === undefined || listing === null ? [] : [{ words: commandOf({ ...context, stageFile: null }, ['parts'], ['--failing', often.check, '--stage', listing]), why: `all that fail on ${checkWords(often.check)}` }]),
  ];
}

/** Giving up a little swing is the usual way out where only the rails stand in the way; tried, not promised. */
function lossOffer(report: Report, context: CommandContext): Offer[] {
  const loss = report.fit.length > 0 || (report.nothingFits?.changes.length ?? 0) > 0 ? null : swingLossToTry(report);
  if (loss === null) return [];
  const text = asciiText(formatQuantity(loss, 'V', { digits: 2, round: 'up' }));
  return [{ words: commandOf(context, ['shortlist'], ['--set', `limits.swingLoss=${text.replace(' ', '')}`]), why: `to try: gives up ${text} of swing at each rail` }];
}
