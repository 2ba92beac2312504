import type { Problem } from '../quantities/problem.js';
import type { Layout } from './layout.js';
import { laidOut, layoutOptions, layoutWords, namedColumns } from './layout.js';
import type { ListQuestion, ListRecord } from './list.js';
import { readAnyHeader } from './recognised.js';
import { importOperand } from './sheet.js';

/** One message for a first line that is no header: what is proposed, the columns it gives, and the options that say yes. */
export function layoutProblem(layout: Layout, records: readonly ListRecord[], file: string): Problem {
  const [first] = records;
  const table = laidOut(records, layout);
  const filled = first?.cells.filter((cell) => cell.trim() !== '').length ?? 0;
  const doubts = (table?.doubts ?? []).map(({ own, group }) => `; "${own}" stands under "${group}", whose unit is another: is it the load of these columns`);
  const message = [
    `the first line does not look like a header (${filled} of ${first?.cells.length ?? 0} cells filled); proposed: ${layoutWords(layout, records)}`,
    `; columns ${namedColumns(table?.header.cells ?? [])}`,
    ...doubts,
  ].join('');
  const fix = `railfit import ${importOperand(file)} ${layoutOptions(layout)}${doubtOptions(layout, records)}`;
  return { code: 'I207', severity: 'error', message, fix, place: { file, line: first?.line ?? 1 } };
}

function doubtOptions(layout: Layout, records: readonly ListRecord[]): string {
  const doubts = laidOut(records, layout)?.doubts ?? [];
  return doubts.map(({ own }) => ` --map "${own}=${readAnyHeader(own).kind === 'load' ? own : 'text'}"`).join('');
}

/** The same as a question with two answers. */
export function layoutQuestion(layout: Layout, records: readonly ListRecord[]): ListQuestion {
  const names = laidOut(records, layout)?.header.cells ?? [];
  return {
    words: `The first line is no header. Shall the list be read so: ${layoutWords(layout, records)}?`,
    samples: names.slice(0, 3),
    choices: [{ words: 'yes', answer: { layout } }, { words: 'no: the first line is the header', answer: { layout: { headerRows: [1], untilBlank: false } } }],
  };
}
