import { cellProblem } from './cell-fault.js';
import type { ColumnChoice } from './column-reading.js';
import { samplesOf } from './columns.js';
import type { ListColumn, ListRecord } from './list.js';
import type { ProblemLog } from './problem-log.js';
import { readRailVoltage } from './rail-voltage.js';
import { readRailCell } from './rail-words.js';
import { isMissing } from './text-cell.js';

interface Table {
  readonly rows: readonly ListRecord[];
  readonly header: ListRecord;
  readonly log: ProblemLog;
}

/** Columns whose cells leave two readings: each is one question, and is read no further until it is answered. */
export function cellQuestions(columns: readonly ListColumn[], { rows, header, log }: Table): readonly ListColumn[] {
  return columns.map((column) => {
    if (column.reading.kind !== 'rail' && column.reading.kind !== 'measured') return column;
    const cells = rows.map((record) => record.cells[column.number - 1] ?? '').filter((cell) => !isMissing(cell));
    const found = railQuestion(column, cells) ?? commonModeQuestion(column, cells);
    if (found === null) return column;
    const fix = found.choices.map(({ header: meaning, words }) => `--map "${column.letter}=${meaning}" (${words})`).join('\nor ');
    log.add(cellProblem({ code: 'I209', reason: `"${column.header}": ${found.words}`, fix }, { file: log.file, record: header, column, part: null }));
    log.questions.push({
      words: `Column ${column.letter} "${column.header}": ${found.words}?`,
      samples: samplesOf(column, rows),
      choices: found.choices.map(({ words, header: meaning }) => ({ words, answer: { map: [{ column: column.letter, header: meaning }] } })),
    });
    return { ...column, reading: { kind: 'text' } };
  });
}

interface Found {
  readonly words: string;
  readonly choices: readonly ColumnChoice[];
}

/** "Yes" under "Rail-to-rail" does not say which side. */
function railQuestion({ reading }: ListColumn, cells: readonly string[]): Found | null {
  if (reading.kind !== 'rail' || reading.sense !== 'words' || !cells.some((cell) => /^(?:yes|y|true|x|1|✓)$/iu.test(cell.trim()) && readRailCell(cell, 'words') === null)) return null;
  return {
    words: 'its cells say yes, and not whether inputs or outputs go to the rails',
    choices: [
      { words: 'both', header: 'rail-to-rail input and output' },
      { words: 'the outputs', header: 'rail-to-rail output' },
      { words: 'the inputs', header: 'rail-to-rail input' },
      { words: 'none of these: keep it as text', header: 'text' },
    ],
  };
}

/** A bare number as the high end of the inputs: from V+, or from ground at a supply that is not stated. */
function commonModeQuestion({ reading }: ListColumn, cells: readonly string[]): Found | null {
  if (reading.kind !== 'measured' || reading.target !== 'commonModeHigh' || reading.condition.supply !== undefined) return null;
  if (!cells.some((cell) => readRailVoltage(cell).rail === null)) return null;
  const unit = reading.unit ?? 'V';
  const kind = reading.limit === null ? 'typ' : 'max';
  return {
    words: 'from which point its voltages count is not said',
    choices: [
      { words: 'from V+ and signed: -1.5 is 1.5 V below V+', header: `CMVR high from V+${reading.limit === null ? '' : ` ${reading.limit}`} (${unit})` },
      { words: 'the distance below V+: 1.5 is 1.5 V below V+', header: `input high headroom ${kind} (${unit})` },
      { words: 'from ground, at a supply of 5 V', header: `CMVR high${reading.limit === null ? '' : ` ${reading.limit}`} (${unit}) @ 5 V` },
      { words: 'none of these: keep it as text', header: 'text' },
    ],
  };
}
