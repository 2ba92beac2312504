import type { Figure } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';
import { cellProblem } from './cell-fault.js';
import { contradictions } from './figure-rules.js';
import type { ReadPart } from './identity.js';
import { checkIdentities } from './identity.js';
import type { ListColumn, ListOptions, ListRecord } from './list.js';
import type { PartReader } from './part-reader.js';
import { partReader } from './part-reader.js';
import type { ProblemLog } from './problem-log.js';

export interface RowReading {
  readonly columns: readonly ListColumn[];
  readonly options: ListOptions;
  readonly log: ProblemLog;
  readonly decimal: 'point' | 'comma';
}

/** The parts of the rows, identical repetitions kept once; everything that is wrong goes to the log. */
export function readParts(rows: readonly ListRecord[], { columns, options, log, decimal }: RowReading): readonly ReadPart[] {
  const readPart = partReader(columns, options, decimal);
  const read = rows.map((record) => readRow(record, { readPart, columns, log }));
  const { kept, faults } = checkIdentities(read, options);
  for (const { record, part, field, fault, severity } of faults) {
    const column = columns.find(({ reading }) => reading.kind === 'identity' && reading.field === field);
    if (column !== undefined) log.add(cellProblem(fault, { file: options.file, record, column, part }, severity));
  }
  return kept;
}

interface PartReading extends Pick<RowReading, 'columns' | 'log'> {
  readonly readPart: PartReader;
}

function readRow(record: ListRecord, { readPart, columns, log }: PartReading): ReadPart {
  const found: [ListColumn, CellFault, 'error' | 'warning'][] = [];
  const part = readPart(record, (column, fault, severity) => void found.push([column, fault, severity]));
  for (const { figure, fault, severity } of contradictions(part.figures, (one) => asWritten(one, record, columns))) {
    const column = columns.find((one) => isColumnOf(one, figure));
    if (column !== undefined) found.push([column, fault, severity]);
  }
  const place = { file: log.file, record, part: part.id === '' ? null : part.id };
  for (const [column, fault, severity] of found) log.add(cellProblem(fault, { ...place, column }, severity));
  return { part, record };
}

/** `3 mV (B2)`: the cell as written, the unit of the header where it has none, and where it stands. */
function asWritten(figure: Figure, { cells, row }: ListRecord, columns: readonly ListColumn[]): string {
  const column = columns.find((one) => isColumnOf(one, figure));
  if (column?.reading.kind !== 'figure') return '';
  const cell = (cells[column.number - 1] ?? '').trim();
  const unit = /\p{L}|[%°Ω]/u.test(cell) ? null : (column.reading.unit ?? PARAMETERS[figure.parameter].headerUnit);
  return `${cell}${unit === null ? '' : ` ${unit}`} (${column.letter}${row})`;
}

function isColumnOf({ reading }: ListColumn, { parameter, kind, condition }: Figure): boolean {
  // The reader hands the condition of the column on to the figure, so it is the same object.
  return reading.kind === 'figure' && reading.parameter === parameter && reading.limit === kind && reading.condition === condition;
}
