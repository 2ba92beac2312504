import { cellProblem } from './cell-fault.js';
import { columnKey } from './columns.js';
import type { DecimalRule } from './decimal-mark.js';
import { valueReader } from './figure-readers.js';
import { foldPhrase } from './header-parts.js';
import type { ListColumn, ListRecord } from './list.js';
import type { ProblemLog } from './problem-log.js';
import { isMissing } from './text-cell.js';

interface Table {
  readonly header: ListRecord;
  readonly rows: readonly ListRecord[];
  readonly decimal: DecimalRule;
  readonly log: ProblemLog;
}

/**
 * Two columns of one field: of the same name an error, told with the first row in which they disagree; of other names but equal in
 * every row a warning, and the first is used. The later one is read no further.
 */
export function withoutDuplicates(columns: readonly ListColumn[], table: Table): readonly ListColumn[] {
  const first = new Map<string, ListColumn>();
  return columns.map((column) => {
    const key = columnKey(column);
    const earlier = key === null ? undefined : first.get(key);
    if (key === null) return column;
    if (earlier === undefined) {
      first.set(key, column);
      return column;
    }
    report(column, earlier, table);
    return { ...column, reading: { kind: 'known', field: null, unit: null } };
  });
}

function report(column: ListColumn, earlier: ListColumn, table: Table): void {
  const { header: record, log } = table;
  const disagreement = firstDisagreement(column, earlier, table);
  const place = { file: log.file, record, column, part: null };
  const sameName = foldPhrase(column.header) === foldPhrase(earlier.header) && column.header.toLowerCase() === earlier.header.toLowerCase();
  if (disagreement === null && !sameName) {
    const reason = `"${column.header}" and column ${earlier.letter} "${earlier.header}" are the same field; they agree in every row, ${earlier.letter} is used`;
    log.add(cellProblem({ code: 'I202', reason, fix: 'drop one column' }, place, 'warning'));
    return;
  }
  const which = sameName ? `header "${column.header}" is also in column ${earlier.letter}` : `"${column.header}" is the same field as column ${earlier.letter} "${earlier.header}"`;
  const differ = disagreement === null ? '' : `; the columns disagree in row ${disagreement.row} (${disagreement.was} and ${disagreement.now})`;
  log.add(cellProblem({ code: 'I201', reason: which + differ, fix: `keep one of the two columns, or name kind and condition of each; or --map "${column.letter}=text"` }, place));
}

interface Disagreement {
  readonly row: number;
  readonly was: string;
  readonly now: string;
}

function firstDisagreement(column: ListColumn, earlier: ListColumn, { rows, decimal }: Table): Disagreement | null {
  const [a, b] = [comparable(earlier, decimal), comparable(column, decimal)];
  for (const { cells, row } of rows) {
    const [was, now] = [(cells[earlier.number - 1] ?? '').trim(), (cells[column.number - 1] ?? '').trim()];
    if (!same(a(was), b(now))) return { row, was: was === '' ? 'empty' : was, now: now === '' ? 'empty' : now };
  }
  return null;
}

type Comparable = (cell: string) => string | readonly number[];

function comparable({ reading }: ListColumn, decimal: DecimalRule): Comparable {
  const read = valueReader(reading, decimal);
  return (cell) => {
    if (isMissing(cell)) return '';
    const found = read?.(cell, { load: null, channels: null });
    return found?.ok === true && found.figures.length > 0 ? found.figures.map(({ value }) => value) : cell;
  };
}

function same(a: string | readonly number[], b: string | readonly number[]): boolean {
  if (typeof a === 'string' || typeof b === 'string') return a === b;
  return a.length === b.length && a.every((value, index) => Math.abs(value - (b[index] ?? 0)) <= 1e-9 * Math.abs(value));
}
