import type { Explanation } from '../report.js';
import { priceText } from './amounts.js';
import { marginBlocks, swingBlock } from './bars/explained.js';
import { cautionLine, failingCheck, openCheck, passingCheck } from './check-text.js';
import { changesLines } from './changes-text.js';
import { batteryText, swingText } from './budget-text.js';
import { commandOf, nextLines, type Offer } from './commands.js';
import { confirmationInFull } from './confirm-text.js';
import { dataLine } from './data-text.js';
import { cautionsOf } from './json.js';
import { formulaLines } from './formula-text.js';
import { paragraph } from './layout.js';
import { partLookupLines } from './part-lookup-text.js';
import { remedyLines } from './remedy-text.js';
import { predictedLines } from './predicted-text.js';
import { safeLine } from './safe-text.js';
import { sensitivityLines } from './sensitivity-text.js';
import { finished, glued, held } from './spelling.js';
import { assumptionLines, stageCautions, stageInShort } from './stage-text.js';
import { toned, type CommandContext, type Style } from './style.js';
import type { Origins } from './term-text.js';
import { counted } from './words.js';

/** One part on one stage: what decides it, with every term and origin; what passes, in short. */
export function renderExplanation(explanation: Explanation, style: Style, context: CommandContext): string {
  const { judged, asking, stage } = explanation;
  const origins: Origins = { part: judged.part, origin: (partId, slot) => explanation.origin(partId, slot) };
  const of = (outcome: string): typeof judged.verdicts => judged.verdicts.filter((verdict) => verdict.outcome === outcome);
  const blocks = [
    [...paragraph(verdictLine(explanation, style), style), ...aboutLines(explanation, style), ...stageCautions(stage, style)],
    ...of('fail').map((verdict) => failingCheck(verdict, origins, style)),
    ...of('unknown').map((verdict) => openCheck(verdict, origins, style)),
    ...(style.all ? of('pass').map((verdict) => passingCheck(verdict, origins, style)) : []),
    ...marginBlocks(judged.verdicts, style),
    swingBlock(explanation, style),
    formulaLines(explanation, style),
    predictedLines(explanation, style),
    informedLines(judged, style),
    cautionsOf(judged).flatMap((caution) => cautionLine(caution, style)),
    sensitivityLines(explanation.sensitivity, style),
    partLookupLines(explanation, style, context),
    remedyLines(explanation, style, context),
    changesLines(explanation, style, context),
    confirmLines(explanation, style),
    fittingLines(explanation, style),
    [
      ...assumptionLines([...stage.assumptions, ...(asking.strict ? ['only limits count (strict)'] : []), ...asking.assumed.map((wish) => `for this run ${wish}`)], style),
      ...dataLine(explanation.data, style),
    ],
    nextLines(offers(explanation, style, context), style),
    paragraph(CAUTION, style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

const CAUTION =
  'The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt someone, qualified review and the applicable codes decide.';

function verdictLine({ judged, rank, counts }: Explanation, style: Style): string {
  const id = safeLine(judged.part.id);
  const total = judged.verdicts.length;
  const number = (outcome: string): number => judged.verdicts.filter((verdict) => verdict.outcome === outcome).length;
  const [failing, open] = [number('fail'), number('unknown')];
  const fails = (count: number): string => `${count} ${count === 1 ? 'fails' : 'fail'}`;
  if (judged.outcome === 'does-not-fit') {
    return `${id} ${toned('does not fit', 'bad', style)}: ${failing} of ${counted(total, 'check')} ${failing === 1 ? 'fails' : 'fail'}, ${number('pass')} pass, ${open} cannot be decided.`;
  }
  if (judged.outcome === 'undecided') {
    const likely = judged.likely ? ' Likely to fit: with the figures of its class every check would pass.' : '';
    return `${id} ${toned('cannot be decided', 'open', style)}: ${number('pass')} of ${counted(total, 'check')} pass, ${open} open, ${fails(failing)}. It is not counted as fitting.${likely}`;
  }
  const proof = judged.proof === 'limits' ? 'all of it on limits' : `${judged.confirm.length === 0 ? 'nothing' : counted(judged.confirm.length, 'figure')} to confirm`;
  return `${id} ${toned('fits', 'good', style)}: all ${counted(total, 'check')} pass, ${proof}. Rank ${rank ?? '?'}; ${counted(counts.fit, 'part')} ${counts.fit === 1 ? 'fits' : 'fit'}.`;
}

function aboutLines({ judged, stage }: Explanation, style: Style): string[] {
  const { part } = judged;
  const words = [
    part.tier === 'approved' ? 'approved list' : 'generic set',
    ...[part.description, part.class === null ? null : `class ${part.class}`, part.package, part.status, part.lifecycle].flatMap((word) => (word === null ? [] : [glued(safeLine(word))])),
    ...(part.channels === null ? [] : [held(counted(part.channels, 'channel'))]),
    ...(part.price === null ? [] : [priceText(part.price)]),
  ];
  return [...paragraph(words.join(', '), style, { lead: 'Part    ' }), ...paragraph(stageInShort(stage), style, { lead: 'Stage   ' })];
}

/** What is told of a part and not judged: swing left by head-room, life of the battery. */
function informedLines({ dynamicRange, batteryHours }: Explanation['judged'], style: Style): string[] {
  const swing = dynamicRange === null ? [] : paragraph(swingText(dynamicRange), style, { lead: 'Swing   ', indent: 8 });
  return [...swing, ...(batteryHours === null ? [] : paragraph(batteryText(batteryHours), style, { lead: 'Battery ', indent: 8 }))];
}

function confirmLines({ judged }: Explanation, style: Style): string[] {
  const { confirm } = judged;
  if (confirm.length === 0) return [];
  const title = confirm.length === 1 ? 'Confirm this one before release:' : `Confirm these ${confirm.length} before release:`;
  return [title, ...confirm.flatMap((one) => paragraph(confirmationInFull(one), style, { lead: '  ', indent: 6 }))];
}

function fittingLines({ fitting, judged, counts }: Explanation, style: Style): string[] {
  if (judged.outcome === 'fits') return [];
  if (fitting.length === 0) return paragraph('No part fits as things stand.', style);
  const shown = fitting.map((one) => `${safeLine(one.part.id)} (rank ${one.rank}${one.part.price === null ? '' : `, ${priceText(one.part.price)}`})`);
  const rest = counts.fit - fitting.length;
  return paragraph(`Parts that fit as things stand: ${shown.join(', ')}${rest > 0 ? ` and ${rest} more` : ''}.`, style, { indent: 2 });
}

function offers({ judged }: Explanation, style: Style, context: CommandContext): Offer[] {
  const explain = (option: string): string[] => commandOf(context, ['explain', judged.part.id], [option]);
  return [
    ...(style.all ? [] : [{ words: explain('--all'), why: 'the passing checks in full' }]),
    ...(style.sources ? [] : [{ words: explain('--sources'), why: 'every cell a figure came from' }]),
    { words: commandOf(context, ['shortlist']), why: 'all parts on this stage' },
  ];
}
