import type { Datasheet, LookupList, PartLookups } from '../explanation/index.js';
import type { Report } from '../report.js';
import { commandOf, nextLines, type Offer } from './commands.js';
import { confirmationText } from './confirm-text.js';
import { paragraph } from './layout.js';
import { cellText, identityText, lookupName, neededText, placeText, spanText } from './lookup-words.js';
import { safeLine } from './safe-text.js';
import { finished, GLUE } from './spelling.js';
import { stageInShort } from './stage-text.js';
import type { CommandContext, Style } from './style.js';
import { checkWords, counted } from './words.js';

/** `railfit shortlist STAGE --lookups`: what to look up, most worth first; `written` the sheet that was made. */
export function renderLookups(report: Report, style: Style, { context, written }: { readonly context: CommandContext; readonly written: string | null }): string {
  const list = report.lookups;
  if (list === undefined) throw new RangeError('the report carries no look-ups');
  const blocks = [
    [...paragraph(summaryText(list), style), ...paragraph(stageInShort(report.stage), style, { lead: 'Stage   ' })],
    list.datasheets.slice(0, style.top).flatMap((sheet, at) => datasheetLines(sheet, at + 1, style)),
    list.datasheets.length > style.top ? paragraph(`… and ${counted(list.datasheets.length - style.top, 'datasheet')} more (--top ${list.datasheets.length} shows all)`, style, { lead: ' ' }) : [],
    list.datasheets.some(({ parts }) => parts.some(({ lookups }) => lookups.length > 1)) ? paragraph('Where a part asks for several figures, each value holds while the others are good ones.', style) : [],
    restLines(list, style),
    confirmLines(list, style),
    written === null ? [] : paragraph(`Written: ${safeLine(written)}. Fill the cells that hold a question mark, leave the others as they are.`, style),
    nextLines(offers(list, context, written), style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

/** At the end of a shortlist: one sentence, and the command that says more. */
export function lookupSummary({ lookups }: Report, style: Style, context: CommandContext): string[] {
  if (lookups === undefined || lookups.settled.parts === 0) return [];
  return [...paragraph(summaryText(lookups), style), ...nextLines([{ words: commandOf(context, ['shortlist'], ['--lookups']), why: 'which figures, where, and what they must be' }], style)];
}

/** `Look up these 4 figures in 3 datasheets and 9 undecided parts are settled; the first could rank 1.` */
export function summaryText({ settled, firstRank }: LookupList): string {
  const { parts, figures, datasheets } = settled;
  if (parts === 0) return 'Nothing to look up: no undecided part of the approved list would be settled by a figure.';
  const these = figures === 1 ? 'this 1 figure' : `these ${figures} figures`;
  return `Look up ${these} in ${counted(datasheets, 'datasheet')} and ${counted(parts, 'undecided part')} ${parts === 1 ? 'is' : 'are'} settled; the first could rank ${firstRank ?? 1}.`;
}

function datasheetLines({ name, parts }: Datasheet, number: number, style: Style): string[] {
  const family = parts.length === 1 && parts[0]?.part.id === name ? [] : paragraph(`${String(number).padStart(2)}  ${safeLine(name)}: one datasheet for ${counted(parts.length, 'part')}`, style);
  return [...family, ...parts.flatMap((one) => partLines(one, family.length === 0 ? `${String(number).padStart(2)}  ` : '    ', style))];
}

function partLines(one: PartLookups, lead: string, style: Style): string[] {
  const place = one.place === null ? '' : `, would rank ${placeText(one.place)}`;
  const likely = one.likely ? ', likely to fit' : '';
  return [
    ...paragraph(`${safeLine(one.part.id)}: ${identityText(one)}${place}${likely}`, style, { lead, indent: 6 }),
    ...one.lookups.flatMap((lookup) => {
      const scale = spanText(lookup, one.part.tier);
      return [
        ...paragraph(`${lookupName(lookup)}: ${neededText(lookup)} (${lookup.checks.map(checkWords).join(', ')})`, style, { lead: '      ', indent: 8 }),
        ...paragraph([cellText(lookup, one), ...(scale === null ? [] : [scale])].join('; '), style, { lead: '        ' }),
      ];
    }),
  ];
}

/** What no look-up settles. */
function restLines({ unsettled, generic }: LookupList, style: Style): string[] {
  const said = unsettled.map(({ part, remains, lookups }) => {
    const why = remains.length > 0 ? remains.map(checkWords).join(', ') : lookups.map(lookupName).join(', ') || 'no figure found';
    return `${safeLine(part.id)} (${why})`;
  });
  return [
    ...(said.length === 0 ? [] : paragraph(`Not settled by look-ups alone: ${said.join('; ')}.`, style, { indent: 2 })),
    ...(generic === 0 ? [] : paragraph(`${counted(generic, 'generic set')} cannot be decided either: ${generic === 1 ? 'a class of parts' : 'classes of parts'}, with no datasheet to look into.`, style)),
  ];
}

/** Fits that stand on typical figures: asked apart, since nothing above depends on them. */
function confirmLines({ confirm }: LookupList, style: Style): string[] {
  if (confirm.length === 0) return [];
  const shown = confirm.slice(0, style.top);
  return [
    ...paragraph('Apart from these, to confirm before release (parts that fit, on typical or assumed figures):', style),
    ...shown.flatMap((one) => paragraph(`${safeLine(one.part)} (rank${GLUE}${one.rank}): ${one.confirm.map(confirmationText).join(', ')}`, style, { lead: '  ', indent: 6 })),
  ];
}

function offers({ settled, datasheets }: LookupList, context: CommandContext, written: string | null): Offer[] {
  const first = datasheets[0]?.parts[0];
  if (settled.parts === 0 || first === undefined) return [];
  const explain = { words: commandOf(context, ['explain', first.part.id]), why: 'the first in full' };
  if (written === null) return [{ words: commandOf(context, ['shortlist'], ['--lookups', '-o', 'lookups.csv']), why: 'a sheet to fill in' }, explain];
  return [{ words: commandOf({ ...context, stageFile: null, changes: [] }, ['import', written], ['--patch']), why: 'takes the filled sheet into the list' }, explain];
}
