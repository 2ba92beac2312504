import type { Problem } from '../quantities/problem.js';

/** A problem as documents carry it; fields that do not apply are left out. */
export function problemJson(problem: Problem): object {
  const place = problem.place ?? {};
  const entries: readonly (readonly [string, unknown])[] = [
    ['code', problem.code],
    ['severity', problem.severity],
    ['file', place.file],
    ['path', place.path],
    ['line', place.line],
    ['row', place.row],
    ['column', place.columnLetter],
    ['columnNumber', place.column],
    ['header', place.header],
    ['part', place.part],
    ['value', problem.text],
    ['span', problem.span],
    ['reason', problem.message],
    ['fix', problem.fix],
    ['at', cellPointer(problem)],
  ];
  return Object.fromEntries(entries.filter(([, value]) => value !== undefined));
}

/** RFC 7111 pointer to a cell. */
function cellPointer({ place }: Problem): string | undefined {
  if (place?.row === undefined || place.column === undefined || place.file === undefined) return undefined;
  return `${place.file}#cell=${place.row},${place.column}`;
}
