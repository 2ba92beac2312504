import type { Place, Problem } from '../quantities/problem.js';
import { caretLines } from './carets.js';
import { displayWidth, padded, paragraph } from './layout.js';
import { withoutValue, type Cause } from './problem-causes.js';
import { safeLine, safeText } from './safe-text.js';
import { glued, GLUE, PASTE, spelled } from './spelling.js';
import { toned, type Style } from './style.js';

/** One problem in full. */
export function problemLines(problem: Problem, style: Style): string[] {
  return [...headLines(problem, sentenceOf(problem), style), ...whereLines(problem, style), ...caretLines(problem, style), ...fixLines(problem.fix, style)];
}

/** One problem of an answer: the place is the question, and the text stands above. */
export function refusalLines({ place: _place, ...problem }: Problem, style: Style): string[] {
  return [...headLines(problem, sentenceOf(problem), style), ...fixLines(problem.fix, style)];
}

/** One cause with its places, each with what stands there and what to put instead. */
export function groupLines({ problems, total }: Cause, style: Style): string[] {
  const [first] = problems;
  if (first === undefined) return [];
  const same = problems.every(({ message }) => message === first.message);
  const sentence = same ? sentenceOf(first) : withoutValue(first.message, first.text);
  const files = [...new Set(problems.flatMap(({ place }) => (place?.file === undefined ? [] : [safeLine(place.file)])))];
  const rows = problems.map((problem) => ({ where: shortPlace(problem.place ?? {}), text: problem.text === undefined ? '' : `"${safeText(problem.text)}"`, fix: problem.fix ?? '' }));
  const widths = [Math.max(...rows.map(({ where }) => displayWidth(where))), Math.max(...rows.map(({ text }) => displayWidth(spelled(text, style))))] as const;
  const oneFix = new Set(rows.map(({ fix }) => fix)).size === 1;
  return [
    ...headLines(first, `${glued(safeLine(sentence))} (${total} cells)`, style),
    ...(files.length === 0 ? [] : paragraph(files.join(', '), style, { lead: '  --> ' })),
    ...rows.flatMap((row) => rowLines({ ...row, fix: oneFix ? '' : row.fix }, widths, style)),
    ...(oneFix ? fixLines(first.fix, style) : []),
  ];
}

function headLines({ severity, code }: Problem, sentence: string, style: Style): string[] {
  const mark = toned(severity, severity === 'error' ? 'bad' : 'open', style);
  return paragraph(sentence, style, { lead: `${mark}[${code}]: `, indent: 2 });
}

/** The option or field before the sentence, unless the sentence names it. */
function sentenceOf({ message, place }: Problem): string {
  const path = place?.path;
  const said = glued(safeLine(message));
  return path === undefined || path === '' || message.includes(path) ? said : `${safeLine(path)}: ${said}`;
}

function whereLines({ place }: Problem, style: Style): string[] {
  const words = place === undefined ? [] : placeWords(place);
  return words.length === 0 ? [] : paragraph(words.join(', '), style, { lead: '  --> ' });
}

function placeWords({ file, line, row, column, columnLetter, header, part }: Place): string[] {
  const number = (word: string, value: number | undefined): string[] => (value === undefined ? [] : [`${word}${GLUE}${value}`]);
  const named = header === undefined ? '' : ` "${safeLine(header)}"`;
  const [first, ...rest] = [
    ...number('line', line),
    ...number('row', row),
    ...(columnLetter === undefined ? number('column', column) : [`column${GLUE}${columnLetter}${named}`]),
    ...(part === undefined ? [] : [`part ${safeLine(part)}`]),
  ];
  const start = [...(file === undefined ? [] : [safeLine(file)]), ...(first === undefined ? [] : [first])].join(' ');
  return [...(start === '' ? [] : [start]), ...rest];
}

/** `B6`, as a spreadsheet names a cell. */
function shortPlace({ row, columnLetter, line, column }: Place): string {
  if (columnLetter !== undefined && row !== undefined) return `${columnLetter}${row}`;
  return [...(line === undefined ? [] : [`line${GLUE}${line}`]), ...(column === undefined ? [] : [`column${GLUE}${column}`])].join(', ') || `row${GLUE}${row ?? ''}`;
}

function rowLines(row: { where: string; text: string; fix: string }, widths: readonly [number, number], style: Style): string[] {
  const start = `   ${padded(row.where, widths[0])}  `;
  const text = spelled(row.text, style).replaceAll(' ', PASTE);
  if (row.fix === '') return [start + text];
  const fix = `fix: ${pasteable(row.fix)}`;
  const beside = `${start}${padded(text, widths[1])}  ${spelled(fix, style)}`;
  return displayWidth(beside) <= style.width ? [beside] : [start + text, ...fixLines(row.fix, style)];
}

/** What to type instead; its own lines are kept. */
function fixLines(fix: string | undefined, style: Style): string[] {
  if (fix === undefined) return [];
  const [first = '', ...more] = fix.split('\n').map(pasteable);
  return [...paragraph(first, style, { lead: '   fix: ' }), ...more.flatMap((line) => paragraph(line, style, { lead: '        ', indent: 10 }))];
}

/** Number and unit together, with blanks that can be pasted. */
const pasteable = (text: string): string => glued(safeText(text)).replaceAll(GLUE, PASTE);
