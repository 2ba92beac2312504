import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import { partName } from './fit-table.js';
import { paragraph } from './layout.js';
import type { Style } from './style.js';
import { shortfall } from './verdict-words.js';
import { checkWords, counted } from './words.js';

/** Every part that does not fit, with the checks it fails. */
export function rejectedLines({ rejected }: Report, style: Style): string[] {
  if (rejected.length === 0) return [];
  return ['Do not fit:', ...rejected.flatMap((one) => failingLine(one, style))];
}

/** One part with what it fails by. */
export function failingLine(one: JudgedPart, style: Style): string[] {
  return paragraph(`${partName(one.part)} ${failures(one)}`, style, { lead: '  ', indent: 6 });
}

/** What a part fails on; and how much is not known of it where that is more: a part that says little fails little. */
export function failures({ verdicts }: JudgedPart): string {
  const failing = verdicts.filter((verdict) => verdict.outcome === 'fail');
  const open = verdicts.filter((verdict) => verdict.outcome === 'unknown').length;
  const told = failing.map((verdict) => `${checkWords(verdict.check)} ${shortfall(verdict)}`);
  return [...told, ...(open <= failing.length ? [] : [`${counted(open, 'check')} cannot be decided`])].join('; ');
}
