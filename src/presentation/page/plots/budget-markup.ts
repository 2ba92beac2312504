import type { Axis } from '../drawing/axis.js';
import { FAINT } from '../drawing/colours.js';
import { gridLine, rect, text } from '../drawing/marks.js';
import { NOTE_LINE, noteLines, notesMarkup } from '../drawing/notes.js';
import { WIDTH } from './assemble.js';
import { budgetRow, limitMarkup, NAMES, ROW, type BudgetRow } from './budget-rows.js';

/** A budget as rows above one axis. */
export interface Budget {
  readonly rows: readonly BudgetRow[];
  readonly limit: { readonly value: number; readonly words: string } | null;
  readonly axisOf: (domain: readonly [number, number], pixels: readonly [number, number]) => Axis;
  /** Sentences under the axis. */
  readonly note: readonly string[];
}

const TOP = 34;
const RIGHT = WIDTH - 24;

export function budgetMarkup({ rows, limit, axisOf, note }: Budget): { body: string; height: number } {
  const most = Math.max(...rows.map(({ to }) => to), limit?.value ?? 0);
  const axis = axisOf([0, most * 1.04 || 1], [NAMES, RIGHT]);
  const notes = noteLines(note, WIDTH - 14);
  const bottom = TOP + rows.length * ROW + 4;
  const body = [
    ...axis.ticks.map(({ at }) => gridLine({ x: at, y: TOP }, { x: at, y: bottom })),
    rect({ x: NAMES, y: TOP, width: RIGHT - NAMES, height: bottom - TOP }, { stroke: FAINT }),
    limit === null ? '' : limitMarkup(axis, limit, { top: TOP, bottom, right: RIGHT }),
    ...rows.map((row, at) => budgetRow(row, { axis, top: TOP + 2 + at * ROW, right: RIGHT - 4, limit: limit === null ? null : axis.place(limit.value) })),
    ...axis.ticks.map(({ at, label }) => text({ x: at, y: bottom + 18 }, label, { anchor: 'middle' })),
    text({ x: (NAMES + RIGHT) / 2, y: bottom + 37 }, axis.title, { anchor: 'middle' }),
    notesMarkup(notes, bottom + 60),
  ].join('');
  return { body, height: bottom + 52 + notes.length * NOTE_LINE };
}
