import type { RankedPart } from '../ranking/index.js';
import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import { confirmationText } from './confirm-text.js';
import { cautionsOf } from './json.js';
import { paragraph } from './layout.js';
import { likeCautions } from './like-cautions.js';
import { safeLine } from './safe-text.js';
import { glued } from './spelling.js';
import type { Style } from './style.js';
import { checkWords, counted } from './words.js';

/** What qualifies the answer: cautions, figures to confirm, parts that another one beats everywhere. */
export function noteLines(report: Report, style: Style): string[] {
  const shown = report.fit.slice(0, style.top);
  return [
    ...cautionNotes(shown, style.all).flatMap((note) => paragraph(note, style, { lead: 'caution: ', indent: 9 })),
    ...confirmNotes(shown).flatMap((note) => paragraph(note, style, { lead: 'confirm: ', indent: 9 })),
    ...dominatedNotes(shown).flatMap((note) => paragraph(note, style, { lead: 'note: ', indent: 9 })),
  ];
}

/** The same caution once, with the parts it holds for. That a generic set cannot be ordered is in the legend. */
function cautionNotes(shown: readonly JudgedPart[], all: boolean): string[] {
  const sentencesOf = (one: JudgedPart): string[] => [...cautionsOf({ ...one, part: { ...one.part, tier: 'approved' } }), ...checkCautions(one)];
  return all ? grouped(shown, sentencesOf) : likeCautions(shown, sentencesOf);
}

function checkCautions({ verdicts }: JudgedPart): string[] {
  return verdicts.flatMap((verdict) => verdict.cautions.map((caution) => `${checkWords(verdict.check)}: ${caution}`));
}

/** Of so many parts the figures to confirm are listed. */
const CONFIRMED = 3;

function confirmNotes(all: readonly RankedPart[]): string[] {
  const open = all.filter(({ confirm }) => confirm.length > 0);
  const notes = grouped(open.slice(0, CONFIRMED), ({ confirm }) => {
    const which = confirm.length === 1 ? 'this one' : `these ${confirm.length}`;
    return [`${which} before release: ${confirm.map(confirmationText).join('; ')}`];
  });
  const rest = open.length - CONFIRMED;
  return rest > 0 ? [...notes, `${counted(rest, 'more part')} ${rest === 1 ? 'has' : 'have'} figures to confirm; "railfit explain PART" lists them`] : notes;
}

function dominatedNotes(shown: readonly RankedPart[]): string[] {
  const by = new Map<string, string[]>();
  for (const one of shown) {
    if (one.dominatedBy === null) continue;
    by.set(one.dominatedBy, [...(by.get(one.dominatedBy) ?? []), safeLine(one.part.id)]);
  }
  return [...by].map(([dominator, parts]) => `${parts.join(', ')}: nowhere better than ${safeLine(dominator)} in margins, price or current; margins beyond comfort do not count`);
}

function grouped<T extends JudgedPart>(shown: readonly T[], sentencesOf: (one: T) => readonly string[]): string[] {
  const byText = new Map<string, string[]>();
  for (const one of shown) {
    for (const sentence of new Set(sentencesOf(one))) byText.set(sentence, [...(byText.get(sentence) ?? []), safeLine(one.part.id)]);
  }
  return [...byText].map(([sentence, parts]) => `${parts.join(', ')}: ${glued(safeLine(sentence))}`);
}
