import type { Problem } from '../quantities/problem.js';
import { csvText } from './csv-cell.js';

const HEADER = ['line', 'row', 'column', 'header', 'part', 'value', 'code', 'reason', 'fix', 'at'];

/** Problems as a sheet for the owner of the list: one line per cell. */
export function problemsCsv(problems: readonly Problem[]): string {
  return csvText([HEADER, ...problems.map(rowOf)]);
}

function rowOf({ code, message, fix, text, place = {} }: Problem): (string | number | null)[] {
  const { line, row, columnLetter, column, header, part, file } = place;
  const at = row !== undefined && column !== undefined && file !== undefined ? `${file}#cell=${row},${column}` : null;
  return [line ?? null, row ?? null, columnLetter ?? null, header ?? null, part ?? null, text ?? null, code, message, fix ?? null, at];
}
