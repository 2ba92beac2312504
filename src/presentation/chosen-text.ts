import type { Explanation } from '../report.js';
import { failingCheck, openCheck } from './check-text.js';
import { confirmationText } from './confirm-text.js';
import { dataLine } from './data-text.js';
import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished } from './spelling.js';
import { toned, type Style } from './style.js';
import type { Origins } from './term-text.js';
import { counted } from './words.js';

/** A stage with the part chosen for it. */
export type ChosenStage =
  | { readonly file: string; readonly part: string; readonly explanation: Explanation }
  /** Not judged: what is wrong with the choice or with the file, in words. */
  | { readonly file: string; readonly part: string | null; readonly reason: NotJudged; readonly words: string };

/** `withdrawn`: on the list no more. `unknown-part`: never was. `not-chosen`: the stage has no part. The rest is about the file. */
export type NotJudged = 'withdrawn' | 'unknown-part' | 'not-chosen' | 'gone' | 'unreadable' | 'wrong';

export interface ChosenReport {
  readonly stages: readonly ChosenStage[];
}

/** Whether the chosen parts still fit: one line a stage, what fails or is open below it, the tally last. */
export function renderChosen({ stages }: ChosenReport, style: Style): string {
  const [first] = stages.flatMap((one) => ('explanation' in one ? [one.explanation] : []));
  const lines = [
    ...stages.flatMap((one) => [...('explanation' in one ? judgedLines(one, style) : paragraph(`${safeLine(one.file)}: ${safeLine(one.words)}`, style, { indent: 2 })), '']),
    ...(first === undefined ? [] : dataLine(first.data, style)),
    ...paragraph(tally(stages), style),
  ];
  return finished(lines, style);
}

/** A part that does not fit is told by what fails; what is open would not change that. */
function judgedLines({ file, part, explanation }: Extract<ChosenStage, { explanation: Explanation }>, style: Style): string[] {
  const { judged } = explanation;
  const origins: Origins = { part: judged.part, origin: (partId, slot) => explanation.origin(partId, slot) };
  const of = (outcome: string): typeof judged.verdicts => judged.verdicts.filter((verdict) => verdict.outcome === outcome);
  const [failing, open] = [of('fail'), of('unknown')];
  return [
    ...paragraph(`${safeLine(file)}: ${safeLine(part)} ${outcomeWords(explanation, style)}`, style, { indent: 2 }),
    ...failing.flatMap((verdict) => failingCheck(verdict, origins, style)),
    ...(failing.length === 0 ? open.flatMap((verdict) => openCheck(verdict, origins, style)) : []),
    ...(failing.length === 0 || open.length === 0 ? [] : paragraph(`${counted(open.length, 'other check')} cannot be decided`, style, { lead: '      ' })),
  ];
}

function outcomeWords({ judged, rank, counts }: Explanation, style: Style): string {
  if (judged.outcome === 'does-not-fit') return `${toned('does not fit', 'bad', style)} on this catalog; ${counted(counts.fit, 'part')} ${counts.fit === 1 ? 'fits' : 'fit'}`;
  if (judged.outcome === 'undecided') return `${toned('cannot be decided', 'open', style)}${judged.likely ? ', likely to fit' : ''}; ${counted(counts.fit, 'part')} ${counts.fit === 1 ? 'fits' : 'fit'}`;
  const proof = judged.confirm.length === 0 ? 'on limits alone' : `to confirm: ${judged.confirm.map(confirmationText).join(', ')}`;
  return `${toned('fits', 'good', style)}, rank ${rank ?? '?'} of ${counts.fit}, ${proof}`;
}

function tally(stages: readonly ChosenStage[]): string {
  const judged = (outcome: string): number => stages.filter((one) => 'explanation' in one && one.explanation.judged.outcome === outcome).length;
  const not = (...reasons: readonly NotJudged[]): number => stages.filter((one) => 'reason' in one && reasons.includes(one.reason)).length;
  const all = [
    [judged('fits'), judged('fits') === 1 ? 'fits' : 'fit'],
    [judged('does-not-fit'), judged('does-not-fit') === 1 ? 'does not fit' : 'do not fit'],
    [judged('undecided'), 'cannot be decided'],
    [not('withdrawn'), 'withdrawn'],
    [not('not-chosen'), 'without a chosen part'],
    [not('unknown-part', 'gone', 'unreadable', 'wrong'), 'not judged'],
  ] as const;
  return `${counted(stages.length, 'stage')}: ${all.filter(([count]) => count > 0).map(([count, words]) => `${count} ${words}`).join(', ')}.`;
}
