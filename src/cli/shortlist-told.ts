import { lookupsJson, renderLookups, renderShortlist, shortlistCsv, withLookups, type CommandContext, type PartSource, type Report } from '../index.js';
import { lookupSheet } from './lookup-sheet.js';
import { writeNewFile } from './new-file.js';
import { styleFor, type Outcome, type Session } from './session.js';
import type { ShortlistOptions } from './shortlist.js';

/** With more undecided parts of the list than this the end of a shortlist does not search for what would decide them. */
const MOST_SEARCHED = 30;

export interface Told {
  readonly session: Session;
  readonly options: ShortlistOptions;
  readonly context: CommandContext;
}

/** A shortlist as text or table, or what to look up; loaded only when one of them is wanted, so that `--json` need not wait for them. */
export function told(report: Report, source: PartSource, { session, options, context }: Told): Pick<Outcome, 'text'> {
  if (options.lookups === true) return lookedUp(withLookups(report, source), { session, options, context });
  if (options.csv === true) return { text: shortlistCsv(report) };
  return { text: renderShortlist(isLong(report) ? report : withLookups(report, source), styleFor(session, options), context) };
}

/** No more parts are read than are counted. */
function isLong({ undecided }: Report): boolean {
  let approved = 0;
  for (const { part } of undecided) {
    if (part.tier === 'approved') approved += 1;
    if (approved > MOST_SEARCHED) return true;
  }
  return false;
}

function lookedUp(report: Report, { session, options, context }: Told): Pick<Outcome, 'text'> {
  const written = writeSheetOf(report, options);
  if (options.json === true) return { text: lookupsJson(report, written) };
  return { text: renderLookups(report, styleFor(session, options), { context, written }) };
}

/** Nothing is written when there is nothing to fill in. */
function writeSheetOf({ lookups }: Report, { output, force }: ShortlistOptions): string | null {
  if (output === undefined || lookups === undefined || lookups.settled.parts === 0) return null;
  writeNewFile(output, lookupSheet(lookups), force === true);
  return output;
}
