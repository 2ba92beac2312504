import type { Figure } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { Problem } from '../quantities/problem.js';
import { cellProblem } from './cell-fault.js';
import { crossChecks } from './cross-checks.js';
import { contradictions } from './figure-rules.js';
import { figureText } from './figure-text.js';
import type { ReadPart } from './identity.js';
import type { ListColumn, ReadList } from './list.js';
import type { Patched } from './patch-list.js';
import { ProblemLog } from './problem-log.js';

/** What the filled cells run into: figures of the list they contradict, and the cross-checks over the whole list. */
export function patchDoubts(filled: readonly Patched[], base: ReadList, sheet: ReadList): Problem[] {
  const idColumn = sheet.columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'id');
  if (idColumn === undefined) return [];
  const log = new ProblemLog(sheet.file);
  for (const one of filled) contradict(one, log, sheet.file);
  const changed = new Map(filled.map((one) => [one.index, one]));
  const read = base.parts.map((part, index): ReadPart => {
    const patch = changed.get(index);
    const now = patch?.part ?? part;
    const sources = now.figures.map((figure) => patch?.figures.find((one) => one.figure === figure)?.column ?? idColumn);
    return { part: now, record: patch?.record ?? base.records[index] ?? { line: 0, lineEnd: 0, row: 0, cells: [] }, sources, railOutputs: null, faults: [] };
  });
  const doubts = new ProblemLog(sheet.file);
  crossChecks(read, sheet.columns, { log: doubts, suspect: new Set() });
  // What the list itself has was told when it was imported.
  const asked = new Set(filled.map(({ part }) => part.id));
  const told = doubts.list().filter(({ place }) => place?.part !== undefined && asked.has(place.part) && place.column !== idColumn.number);
  return [...log.list(), ...told];
}

/** Contradictions a new figure is part of, told at its cell. */
function contradict({ part, record, figures }: Patched, log: ProblemLog, file: string): void {
  const columnOf = (figure: Figure): ListColumn | undefined => figures.find((one) => one.figure === figure)?.column;
  const asWritten = (figure: Figure): string => {
    const column = columnOf(figure);
    const value = `${figureText(figure.parameter, figure.value)} ${PARAMETERS[figure.parameter].headerUnit}`;
    return column === undefined ? `${value} of the list` : `${value} (${column.letter}${record.row})`;
  };
  for (const { figure, fault, severity } of contradictions(part.figures, asWritten)) {
    const kin = figures.find((one) => one.figure.parameter === figure.parameter || one.figure.parameter.startsWith('supply'));
    if (kin === undefined) continue;
    log.add(cellProblem(fault, { file, record, column: columnOf(figure) ?? kin.column, part: part.id }, severity));
  }
}
