import type { Lookup, PartLookups, Sensitivity } from '../explanation/index.js';
import type { Report } from '../report.js';
import { confirmationJson, dataJson, document } from './json.js';
import { assumeWords, headerText, summaryOfLookup } from './lookup-words.js';
import { sensitivityText } from './sensitivity-text.js';
import { stageJson } from './stage-json.js';

/** `railfit shortlist --lookups --json`; numbers in SI units. `written` the sheet that was made. */
export function lookupsJson(report: Report, written: string | null): string {
  const list = report.lookups;
  if (list === undefined) throw new RangeError('the report carries no look-ups');
  return document('lookups', {
    stage: stageJson(report.stage),
    counts: report.counts,
    settled: list.settled,
    firstRank: list.firstRank,
    datasheets: list.datasheets.map(({ name, figures, parts }) => ({ name, figures, parts: parts.map(partLookupsJson) })),
    unsettled: list.unsettled.map(partLookupsJson),
    generic: list.generic,
    confirm: list.confirm.map(({ part, rank, confirm }) => ({ part, rank, confirm: confirm.map(confirmationJson) })),
    written,
    asking: report.asking,
    data: dataJson(report.data),
  });
}

/** What would decide one part. */
export function partLookupsJson(one: PartLookups): object {
  const { part, likely, lookups, settles, remains, place, row } = one;
  return {
    part: part.id,
    tier: part.tier,
    status: part.status,
    likely,
    settles,
    remains,
    place,
    row: row === null ? null : { file: row.file, row: row.row },
    lookups: lookups.map(lookupJson),
    assume: assumeWords(one)?.filter((word) => word !== '--assume') ?? null,
  };
}

function lookupJson(lookup: Lookup): object {
  const { figure, kind, unit, checks, turn, wanted, span, cell } = lookup;
  return {
    figure,
    kind,
    unit,
    header: headerText(lookup),
    checks,
    decidesAt: turn,
    wanted,
    span,
    cell: cell === null ? null : { file: cell.file, row: cell.row, column: cell.column, letter: cell.columnLetter, header: cell.header, text: cell.cell, at: `${cell.file}#cell=${cell.row},${cell.column}` },
    text: summaryOfLookup(lookup),
  };
}

/** Whether one verdict hangs on weak figures. */
export function sensitivityJson(one: Sensitivity): object {
  const { check, on, figures, required, unit, best, worst, depends } = one;
  return { check, on, figures, required, unit, best, worst, depends, text: sensitivityText(one).replaceAll('\u00a0', ' ') };
}
