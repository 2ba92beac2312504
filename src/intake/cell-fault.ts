import type { Problem } from '../quantities/problem.js';
import type { ListColumn, ListRecord } from './list.js';

/** What is wrong with one cell, before it is known where the cell stands. */
export interface CellFault {
  readonly code: string;
  readonly reason: string;
  readonly fix?: string;
  /** [start, end) in UTF-16 units of the cell as written. */
  readonly span?: readonly [number, number];
}

export interface CellPlace {
  readonly file: string;
  readonly record: ListRecord;
  readonly column: ListColumn;
  /** Id of the part in this record; null where it has none. */
  readonly part: string | null;
}

/** A fault with the place it stands at: line, row, column letter, header, part and the cell as written. */
export function cellProblem(fault: CellFault, place: CellPlace, severity: Problem['severity'] = 'error'): Problem {
  const { record, column, part, file } = place;
  return {
    code: fault.code,
    severity,
    message: fault.reason,
    ...(fault.fix === undefined ? {} : { fix: fault.fix }),
    text: record.cells[column.number - 1] ?? '',
    ...(fault.span === undefined ? {} : { span: fault.span }),
    place: {
      file,
      line: record.line,
      row: record.row,
      column: column.number,
      columnLetter: column.letter,
      header: column.header,
      ...(part === null ? {} : { part }),
    },
  };
}
