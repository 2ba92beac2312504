import type { Figure } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { parseQuantity } from '../quantities/parse.js';
import type { Problem } from '../quantities/problem.js';
import { cellProblem } from './cell-fault.js';
import type { MeasuredReading } from './column-reading.js';
import type { UnitChange } from './columns.js';
import type { DecimalRule } from './decimal-mark.js';
import { contextOf } from './figure-cell.js';
import type { ListColumn, ListQuestion, ListRecord } from './list.js';
import { isMissing } from './text-cell.js';
import { targetParameter } from './target.js';

export interface UnitContext {
  readonly file: string;
  readonly header: ListRecord;
  readonly rows: readonly ListRecord[];
  readonly columns: readonly ListColumn[];
  readonly decimal: DecimalRule;
  readonly previous: (id: string) => Part | null;
}

export interface UnitFindings {
  readonly problems: readonly Problem[];
  readonly notes: readonly string[];
  readonly questions: readonly ListQuestion[];
}

/** A column's figures now over those of the last import, part by part. */
interface Compared {
  readonly change: UnitChange;
  readonly ratios: readonly number[];
}

/**
 * Columns whose unit is another than in the saved mapping. Where every figure moved by the same power of ten the header was changed
 * and the figures were not: one error for all such columns. Where the figures stayed the same, a note. Else it is asked.
 */
export function unitFindings(changes: readonly UnitChange[], context: UnitContext): UnitFindings {
  const compared = changes.map((change) => ({ change, ratios: ratiosOf(change.column, context) }));
  const groups = new Map<number, Compared[]>();
  for (const one of compared) {
    const power = commonPower(one.ratios);
    groups.set(power, [...(groups.get(power) ?? []), one]);
  }
  const same = groups.get(0) ?? [];
  const open = groups.get(Number.NaN) ?? [];
  const scaled = [...groups].filter(([power]) => power !== 0 && !Number.isNaN(power));
  return {
    problems: [...scaled.map(([power, group]) => scaledProblem(power, group, context)), ...open.map(({ change }) => openProblem(change, context))],
    notes: same.map(({ change: { column, was, now } }) => `column ${column.letter} "${column.header}": its unit was ${unitText(was)} and is ${unitText(now)}; the figures agree with the last import.`),
    questions: [...scaled.flatMap(([, group]) => group), ...open].map(({ change }) => question(change, context)),
  };
}

/** The power of ten all ratios share; NaN where they do not, or where there are none. */
function commonPower(ratios: readonly number[]): number {
  const [first] = ratios;
  if (first === undefined) return Number.NaN;
  const power = Math.round(Math.log10(first));
  return ratios.every((ratio) => Math.abs(ratio / 10 ** power - 1) < 1e-6) ? power : Number.NaN;
}

function ratiosOf(column: ListColumn, { rows, columns, decimal, previous }: UnitContext): number[] {
  const id = columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'id');
  const { reading } = column;
  if (reading.kind !== 'measured' || id === undefined) return [];
  return rows.flatMap(({ cells }) => {
    const cell = cells[column.number - 1] ?? '';
    const was = before(previous((cells[id.number - 1] ?? '').trim()), reading)?.value;
    if (was === undefined || was === 0 || isMissing(cell)) return [];
    const result = parseQuantity(cell, PARAMETERS[targetParameter(reading.target)].field, contextOf(reading.unit, decimal));
    const now = result.ok ? (result.quantity.nominal ?? result.quantity.max ?? result.quantity.min) : undefined;
    return now === undefined ? [] : [Math.abs(now / was)];
  });
}

function before(part: Part | null, { target, limit }: MeasuredReading): Figure | undefined {
  const parameter = targetParameter(target);
  return part?.figures.find((figure) => figure.parameter === parameter && (limit === null || figure.kind === limit));
}

const unitText = (unit: string | null): string => unit ?? 'none';

function scaledProblem(power: number, group: readonly Compared[], { file, header }: UnitContext): Problem {
  const [first] = group;
  if (first === undefined) throw new RangeError('a group of columns is empty');
  const { column, was, now } = first.change;
  const names = group.map(({ change }) => `"${change.column.header}"`);
  const counts = group.map(({ ratios }) => ratios.length);
  const times = power > 0 ? `${10 ** power} times` : `1/${10 ** -power} of`;
  const reason = `${names.join(' and ')} ${names.length === 1 ? 'is' : 'are'} exactly ${times} the last import in ${Math.min(...counts)} of ${Math.max(...counts)} known parts; the header unit went from ${unitText(was)} to ${unitText(now)}, and the figures did not change`;
  const fix = [
    `correct the header, or read the columns as before: ${group.map(({ change }) => mapOption(change, 'was')).join(' ')}`,
    `or, if the parts really changed: ${group.map(({ change }) => mapOption(change, 'now')).join(' ')}`,
  ].join('\n');
  return cellProblem({ code: 'I602', reason, fix }, { file, record: header, column, part: null });
}

function openProblem(change: UnitChange, { file, header }: UnitContext): Problem {
  const { column, was, now } = change;
  const reason = `"${column.header}": its unit was ${unitText(was)} in the last import and is ${unitText(now)}; whether the figures changed with it cannot be told`;
  return cellProblem({ code: 'I208', reason, fix: `${mapOption(change, 'now')} if they did, else ${mapOption(change, 'was')}` }, { file, record: header, column, part: null });
}

function mapOption(change: UnitChange, which: 'was' | 'now'): string {
  return `--map "${change.column.letter}=${headerWith(change, which)}"`;
}

/** The header with the unit it had, or has. */
function headerWith({ column, was, now }: UnitChange, which: 'was' | 'now'): string {
  if (which === 'now' || now === null) return column.header;
  return was === null ? column.header.replace(new RegExp(`\\s*[([]${escaped(now)}[)\\]]`, 'u'), '') : column.header.replace(now, was);
}

const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/gu, '\\$&');

function question(change: UnitChange, { rows }: UnitContext): ListQuestion {
  const { column, was, now } = change;
  const samples = rows.map(({ cells }) => (cells[column.number - 1] ?? '').trim()).filter((cell) => cell !== '').slice(0, 3);
  const answer = (which: 'was' | 'now'): ListQuestion['choices'][number]['answer'] => ({ map: [{ column: column.letter, header: headerWith(change, which) }] });
  return {
    words: `Column ${column.letter} "${column.header}" was in ${unitText(was)} and is now in ${unitText(now)}. In which unit are its cells?`,
    samples,
    choices: [{ words: `${unitText(was)}, as before: the header is wrong`, answer: answer('was') }, { words: `${unitText(now)}, as the header says`, answer: answer('now') }],
  };
}
