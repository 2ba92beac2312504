import type { Figure } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';
import { cellProblem } from './cell-fault.js';
import type { DecimalRule } from './decimal-mark.js';
import { contradictions } from './figure-rules.js';
import type { Problem } from '../quantities/problem.js';
import type { IdentityFault, ReadPart } from './identity.js';
import { checkIdentities } from './identity.js';
import type { ListColumn, ListOptions, ListRecord } from './list.js';
import type { PartReader } from './part-reader.js';
import { partReader } from './part-reader.js';
import type { ProblemLog } from './problem-log.js';

export interface RowReading {
  readonly columns: readonly ListColumn[];
  readonly options: ListOptions;
  readonly log: ProblemLog;
  readonly decimal: DecimalRule;
}

/** The parts of the rows, identical repetitions kept once; everything that is wrong goes to the log. */
export function readParts(rows: readonly ListRecord[], { columns, options, log, decimal }: RowReading): readonly ReadPart[] {
  const readPart = partReader(columns, options, decimal);
  const read = rows.map((record, index) => {
    options.progress?.(index + 1, rows.length);
    return readRow(record, { readPart, log });
  });
  const { kept, faults } = checkIdentities(read, options, columns.find(isIdColumn)?.number ?? 1);
  for (const found of faults) for (const problem of identityProblem(found, columns, options.file)) log.add(problem);
  return kept;
}

/** A fault of an id or a class with its place; none where the list has no such column. */
export function identityProblem({ record, part, field, fault, severity }: IdentityFault, columns: readonly ListColumn[], file: string): Problem[] {
  const column = columns.find(({ reading }) => reading.kind === 'identity' && reading.field === field);
  return column === undefined ? [] : [cellProblem(fault, { file, record, column, part }, severity)];
}

const isIdColumn = ({ reading }: ListColumn): boolean => reading.kind === 'identity' && reading.field === 'id';

interface PartReadingContext {
  readonly readPart: PartReader;
  readonly log: ProblemLog;
}

/** The part of one row; what is wrong with its cells goes to the log. */
export function readRow(record: ListRecord, { readPart, log }: PartReadingContext): ReadPart {
  const found: [ListColumn, CellFault, 'error' | 'warning'][] = [];
  const { part, sources, railOutputs } = readPart(record, (column, fault, severity) => void found.push([column, fault, severity]));
  const columnOf = (figure: Figure): ListColumn | undefined => sources[part.figures.indexOf(figure)];
  for (const { figure, fault, severity } of contradictions(part.figures, (one) => asWritten(one, record, columnOf(one)))) {
    const column = columnOf(figure);
    if (column !== undefined) found.push([column, fault, severity]);
  }
  const place = { file: log.file, record, part: part.id === '' ? null : part.id };
  for (const [column, fault, severity] of found) log.add(cellProblem(fault, { ...place, column }, severity));
  return { part, record, sources, railOutputs, faults: found.length === 0 ? NONE : found.map(([column, fault]) => ({ column, fault })) };
}

/** One for all parts without a fault: a long list has hundreds of thousands. */
const NONE: ReadPart['faults'] = [];

/** `3 mV (B2)`: the cell as written, the unit of the header where it has none, and where it stands. */
function asWritten(figure: Figure, { cells, row }: ListRecord, column: ListColumn | undefined): string {
  if (column === undefined) return '';
  const cell = (cells[column.number - 1] ?? '').trim();
  const headerUnit = 'unit' in column.reading ? column.reading.unit : null;
  const unit = /\p{L}|[%°Ω]/u.test(cell) ? null : (headerUnit ?? PARAMETERS[figure.parameter].headerUnit);
  return `${cell}${unit === null ? '' : ` ${unit}`} (${column.letter}${row})`;
}
