import type { ImportReport, PartChange } from './import-json.js';
import { safeText } from './safe-text.js';
import { GLUE, spelled } from './spelling.js';
import type { Style } from './style.js';

/** What an import did, or why it did nothing; the faults themselves are listed apart. */
export function renderImport(report: ImportReport, style: Style): string {
  const lines = linesOf(report).map((line) => spelled(safeText(line), style));
  return `${lines.flatMap((line) => wrapped(line, style.width)).join('\n')}\n`;
}

function linesOf(report: ImportReport): string[] {
  const { file, counts, sha256 } = report;
  const hash = sha256 === null ? '' : ` (sha256 ${sha256.slice(0, 8)})`;
  if (report.outcome === 'refused') return [refusal(report)];
  if (report.outcome === 'undone') return [`The list before the last import is in force again: ${plural(counts.rows, 'part')}.`];
  if (report.outcome === 'no-change') {
    return file === '' ? ['Nothing to take back: no list was imported before. Nothing was changed.'] : [`${file}${hash}: no change. ${plural(counts.rows, 'part')}, as imported before.`];
  }
  const named = [...changeLines(report.changes ?? []), ...withdrawnLines(report.withdrawn ?? [])];
  if (report.outcome === 'dry-run') return [`${file}${hash}: ${plural(counts.rows, 'part')}; ${tally(counts)}.`, ...named, 'Dry run: nothing was written. Run again without --dry-run to import.'];
  return [`Imported ${plural(counts.rows, 'part')} from ${file}${hash}: ${tally(counts)}.`, ...named, 'Next  railfit shortlist STAGE     railfit parts --tier approved     railfit import --undo'];
}

/** Counts that are not zero. */
function tally({ added, changed, removed, unchanged }: ImportReport['counts']): string {
  const all = [[added, 'added'], [changed, 'changed'], [removed, 'withdrawn'], [unchanged, 'unchanged']] as const;
  return all.filter(([count]) => count > 0).map(([count, word]) => `${count} ${word}`).join(', ');
}

const NAMED = 10;

function changeLines(changes: readonly PartChange[]): string[] {
  const lines = changes.slice(0, NAMED).map(({ part, field, was, now }) => `  changed  ${part}: ${field}: ${was ?? 'empty'} → ${now ?? 'empty'}`);
  return changes.length <= NAMED ? lines : [...lines, `  … and ${plural(changes.length - NAMED, 'more field')} changed`];
}

function withdrawnLines(ids: readonly string[]): string[] {
  if (ids.length === 0) return [];
  const more = ids.length <= NAMED ? '' : `, … and ${ids.length - NAMED} more`;
  return [`  withdrawn  ${ids.slice(0, NAMED).join(', ')}${more}`];
}

function refusal({ refused, file }: ImportReport): string {
  const what = refused === undefined || refused.cells === 0 ? 'the file must be corrected first' : `${plural(refused.cells, 'cell')} in ${plural(refused.parts, 'part')} must be corrected first`;
  return `${file} was not imported: ${what}. Nothing was changed. (exit${GLUE}3)`;
}

const plural = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? '' : 's'}`;

function wrapped(line: string, width: number): string[] {
  const out: string[] = [];
  let rest = line;
  while (rest.length > width) {
    const at = rest.lastIndexOf(' ', width);
    if (at <= 0) break;
    out.push(rest.slice(0, at).trimEnd());
    rest = `  ${rest.slice(at + 1).trimStart()}`;
  }
  return [...out, rest];
}
