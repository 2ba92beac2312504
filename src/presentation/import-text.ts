import { differenceLines } from './import-difference.js';
import type { ImportReport } from './import-json.js';
import { stageChangeLines } from './import-stages.js';
import { safeText } from './safe-text.js';
import { GLUE, spelled } from './spelling.js';
import type { Style } from './style.js';

/** What an import did, or why it did nothing; the faults themselves are listed apart. */
export function renderImport(report: ImportReport, style: Style): string {
  return written(linesOf(report), style);
}

/** What a list that was refused would have changed; empty when it was not compared. */
export function renderDifference(report: ImportReport, style: Style): string {
  if (report.difference === undefined) return '';
  const { file, counts } = report;
  return `${written([`${file}: ${plural(counts.rows, 'part')}; ${tally(counts)}.`, ...namedLines(report)], style)}\n`;
}

function namedLines({ difference, counts, stages = [] }: ImportReport): string[] {
  return [...(difference === undefined ? [] : differenceLines(difference, counts)), ...stageChangeLines(stages)];
}

function written(lines: readonly string[], style: Style): string {
  const shown = lines.map((line) => spelled(safeText(line), style));
  return `${shown.flatMap((line) => wrapped(line, style.width)).join('\n')}\n`;
}

function linesOf(report: ImportReport): string[] {
  const { file, counts, sha256, patch } = report;
  const hash = sha256 === null ? '' : ` (sha256 ${sha256.slice(0, 8)})`;
  if (report.outcome === 'refused') return [refusal(report)];
  if (report.outcome === 'undone') return [`The list before the last import is in force again: ${plural(counts.rows, 'part')}.`, ...stageChangeLines(report.stages ?? [])];
  if (patch !== undefined && report.outcome !== 'imported') return patchLines(report, patch);
  if (report.outcome === 'no-change') {
    return file === '' ? ['Nothing to take back: no list was imported before. Nothing was changed.'] : [`${file}${hash}: no change. ${plural(counts.rows, 'part')}, as imported before.`];
  }
  const named = namedLines(report);
  if (report.outcome === 'dry-run') return [`${file}${hash}: ${plural(counts.rows, 'part')}; ${tally(counts)}.`, ...named, 'Dry run: nothing was written. Run again without --dry-run to import.'];
  if (patch !== undefined) return patchLines(report, patch);
  return [`Imported ${plural(counts.rows, 'part')} from ${file}${hash}: ${tally(counts)}.`, ...named, 'Next  railfit shortlist STAGE     railfit parts --tier approved     railfit import --undo'];
}

/** What a look-up sheet added. */
function patchLines(report: ImportReport, { cells, parts, list }: NonNullable<ImportReport['patch']>): string[] {
  const { file, outcome, sha256 } = report;
  const hash = sha256 === null ? '' : ` (sha256 ${sha256.slice(0, 8)})`;
  if (outcome === 'no-change') return [`${file}${hash}: no change. The list says all of it already.`];
  const what = `${plural(cells, 'cell')} of ${plural(parts, 'part')}`;
  if (outcome === 'dry-run') return [`${file}${hash} would fill ${what} of ${list}.`, ...namedLines(report), 'Dry run: nothing was written. Run again without --dry-run to import.'];
  return [
    `Filled ${what} of ${list} from ${file}${hash}; everything else stays.`,
    ...namedLines(report),
    `${list} itself does not have them yet: importing it again would take them out. railfit parts --csv writes the list with them.`,
    'Next  railfit shortlist STAGE     railfit parts --csv     railfit import --undo',
  ];
}

/** Counts that are not zero. */
function tally({ added, changed, removed, unchanged }: ImportReport['counts']): string {
  const all = [[added, 'added'], [changed, 'changed'], [removed, 'withdrawn'], [unchanged, 'unchanged']] as const;
  return all.filter(([count]) => count > 0).map(([count, word]) => `${count} ${word}`).join(', ');
}

function refusal({ refused, held, file }: ImportReport): string {
  if (held === true) return `${file} was not imported: what it changes must be said in so many words. Nothing was changed. (exit${GLUE}3)`;
  return `${file} was not imported: ${refused === undefined ? 'the file' : faultyWords(refused)} must be corrected first. Nothing was changed. (exit${GLUE}3)`;
}

/** Faults of the structure are of whole rows, those of headers of no part. */
function faultyWords({ cells, parts }: NonNullable<ImportReport['refused']>): string {
  if (cells === 0 && parts === 0) return 'the file';
  if (cells < parts) return plural(parts, 'row');
  return parts === 0 ? plural(cells, 'header') : `${plural(cells, 'cell')} in ${plural(parts, 'part')}`;
}

const plural = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? '' : 's'}`;

function wrapped(line: string, width: number): string[] {
  const out: string[] = [];
  const indent = ' '.repeat(line.length - line.trimStart().length + 2);
  let rest = line;
  while (rest.length > width) {
    const at = rest.lastIndexOf(' ', width);
    if (at < indent.length) break;
    out.push(rest.slice(0, at).trimEnd());
    rest = indent + rest.slice(at + 1).trimStart();
  }
  return [...out, rest];
}
