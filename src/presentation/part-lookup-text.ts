import type { Lookup, PartLookups } from '../explanation/index.js';
import type { Explanation } from '../report.js';
import { commandLines, commandOf } from './commands.js';
import { paragraph } from './layout.js';
import { assumeWords, cellText, identityText, lookupName, neededText, placeText, spanText } from './lookup-words.js';
import { safeLine } from './safe-text.js';
import type { CommandContext, Style } from './style.js';
import { checkWords } from './words.js';

/** What would decide an undecided part: each figure with the value it turns at, its cell and its class, then the place it would take. */
export function partLookupLines({ lookups: found, asking }: Explanation, style: Style, context: CommandContext): string[] {
  if (found === null) return [];
  const { lookups, settles, part } = found;
  return [
    lookups.length === 0 ? '' : 'What would decide it:',
    ...lookups.flatMap((lookup) => figureLines(lookup, found, style)),
    ...(part.tier === 'generic' ? paragraph('A generic set is a class of parts: there is no datasheet to look into, and no cell to fill.', style) : []),
    ...(settles ? endLines(found, style) : paragraph(unsettledText(found), style)),
    ...assumeLines(found, style, context),
    ...(asking.strict ? paragraph('Only limits count here (strict): an assumption decides nothing.', style) : []),
  ].filter((line) => line !== '');
}

function figureLines(lookup: Lookup, found: PartLookups, style: Style): string[] {
  const { part, lookups } = found;
  const others = lookups.length > 1 && lookup.turn !== null && found.settles ? ', the others at good values' : '';
  const checks = lookup.checks.map(checkWords).join(', ');
  const where = cellText(lookup, found);
  const span = spanText(lookup, part.tier);
  return [
    ...paragraph(`${lookupName(lookup)}: ${neededText(lookup)} decides ${checks}${others}`, style, { lead: '  ', indent: 6 }),
    ...(where === '' ? [] : paragraph(`belongs in ${where}`, style, { lead: '      ' })),
    ...(span === null ? [] : paragraph(span, style, { lead: '      ' })),
  ];
}

function endLines(found: PartLookups, style: Style): string[] {
  const { remains, place, part, lookups } = found;
  if (remains.length > 0) return paragraph(`${remains.map(checkWords).join(', ')} ${remains.length === 1 ? 'stays' : 'stay'} open whatever is looked up.`, style);
  if (place === null) return [];
  const so = lookups.length === 1 ? 'it is so' : 'all are so';
  return paragraph(`If ${so}, ${safeLine(part.id)} would rank ${placeText(place)}: ${identityText(found)}.`, style);
}

function unsettledText({ lookups, remains }: PartLookups): string {
  if (lookups.length === 0) return remains.length > 0 ? `Nothing to look up: ${remains.map(checkWords).join(', ')} stays open whatever is known of the part.` : 'No figure of a datasheet was found that would decide it: a measurement would.';
  return 'No values of these figures were found that make every check pass together: a measurement would decide it.';
}

function assumeLines(found: PartLookups, style: Style, context: CommandContext): string[] {
  const words = assumeWords(found);
  if (words === null) return [];
  return [...paragraph('Or accept it for this run, written into the report as an assumption:', style), ...commandLines(commandOf(context, ['explain', found.part.id], words), style, '  ')];
}
