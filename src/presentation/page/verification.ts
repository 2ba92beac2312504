import { document } from '../json.js';
import { paragraph } from '../layout.js';
import { safeLine } from '../safe-text.js';
import { finished, glued } from '../spelling.js';
import { toned, type Style } from '../style.js';
import { counted } from '../words.js';
import type { Difference } from './differences.js';

/** What became of a report when it was judged again. */
export interface Verification {
  readonly file: string;
  readonly time: string;
  /** Versions that made the report, and that judged it again. */
  readonly tool: { readonly was: string; readonly is: string };
  readonly stages: number;
  readonly differences: readonly Difference[];
}

export function verificationJson({ file, time, tool, stages, differences }: Verification): string {
  return document('verification', { file, time, tool, stages, outcome: differences.length === 0 ? 'same' : 'differs', differences });
}

/** Same or not, then every difference; that another list is in force comes first. */
export function renderVerification(verification: Verification, style: Style): string {
  const { file, time, tool, stages, differences } = verification;
  const name = safeLine(file);
  const made = `made ${time} by ${safeLine(tool.was)}`;
  const all = counted(stages, 'stage');
  const head = differences.length === 0
    ? [`${name}: ${toned('the same', 'good', style)}. ${all}, ${made}: judged again with the catalog in force, every number and every word is as the report says.`]
    : [`${name}: ${toned('differs', 'bad', style)}. ${all}, ${made}; judged again, ${counted(differences.length, 'difference')}${olderList(differences)}.`];
  const shown = style.all ? differences : differences.slice(0, style.top);
  const rest = differences.length - shown.length;
  return finished([
    ...head.flatMap((text) => paragraph(glued(text), style)),
    ...(tool.was === tool.is ? [] : paragraph(glued(`This is ${tool.is}.`), style)),
    ...(shown.length === 0 ? [] : ['']),
    ...shown.flatMap((one) => differenceLines(one, stages, style)),
    ...(rest > 0 ? paragraph(`… and ${counted(rest, 'more difference')} (--all shows them)`, style, { lead: '  ' }) : []),
  ], style);
}

const olderList = (differences: readonly Difference[]): string => (differences.some(({ what }) => what === 'catalog') ? ': it was made with another catalog than the one in force' : '');

function differenceLines({ stage, subject, was, is }: Difference, stages: number, style: Style): string[] {
  const where = stages > 1 && stage !== null ? `${safeLine(stage)}: ` : '';
  return [
    ...paragraph(glued(`${where}${safeLine(subject)}`), style, { lead: '  ', indent: 4 }),
    ...paragraph(glued(safeLine(cut(was))), style, { lead: '    was  ' }),
    ...paragraph(glued(safeLine(cut(is))), style, { lead: '    is   ' }),
  ];
}

const LONGEST = 300;
const cut = (text: string): string => (text.length > LONGEST ? `${text.slice(0, LONGEST)}…` : text);
