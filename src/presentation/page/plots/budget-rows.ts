import type { Axis } from '../drawing/axis.js';
import { INK, SERIES } from '../drawing/colours.js';
import { hatch, rect, segment, text, SIZE } from '../drawing/marks.js';
import { fitted, textWidth } from '../drawing/text-width.js';

/** One row of a budget: what adds up from where to where, in the unit of the axis. */
export interface BudgetRow {
  readonly name: string;
  readonly from: number;
  readonly to: number;
  /** Beside the bar. */
  readonly words: string;
  /** Share of the bar that is typical, 0..1; null: not known. */
  readonly typicalShare: number | null;
  readonly isTotal: boolean;
}

export const ROW = 26;
/** Width kept for the names. */
export const NAMES = 176;

export interface RowPlace {
  readonly axis: Axis;
  readonly top: number;
  /** How far to the right words may reach. */
  readonly right: number;
  /** Where the limit stands, user units; null without. */
  readonly limit: number | null;
}

/** A bar with its name and number; the typical share is hatched, so that no colour is needed to read it. */
export function budgetRow({ name, from, to, words, typicalShare, isTotal }: BudgetRow, { axis, top, right, limit }: RowPlace): string {
  const [left, end] = [axis.place(from), axis.place(to)];
  const box = { x: left, y: top + 5, width: Math.max(1, end - left), height: ROW - 10 };
  const series = isTotal ? SERIES.second : SERIES.first;
  const typical = typicalShare === null ? '' : hatch({ ...box, width: box.width * Math.min(1, typicalShare) }, series.colour, 5);
  const weight = isTotal ? ({ weight: 'bold' } as const) : {};
  return [
    text({ x: NAMES - 8, y: top + ROW / 2 + 4.5 }, fitted(name, SIZE, NAMES - 12), { anchor: 'end', ...weight }),
    rect(box, { fill: series.colour, opacity: '0.18', stroke: series.colour, width: '1.5' }),
    typical,
    besideBar(words, { end, left, right, limit, y: top + ROW / 2 + 4.5 }, weight),
  ].join('');
}

interface Beside {
  readonly left: number;
  readonly end: number;
  readonly right: number;
  readonly limit: number | null;
  readonly y: number;
}

/** Right of the bar where there is room and no limit in the way, else left of it, else within it. */
function besideBar(words: string, { left, end, right, limit, y }: Beside, look: { readonly weight?: 'bold' }): string {
  const width = textWidth(words, SIZE) * (look.weight === undefined ? 1 : 1.1);
  const isFree = (from: number): boolean => from >= NAMES + 2 && from + width <= right && (limit === null || limit < from - 3 || limit > from + width + 3);
  if (isFree(end + 7)) return text({ x: end + 7, y }, words, look);
  if (isFree(left - 7 - width)) return text({ x: left - 7, y }, words, { ...look, anchor: 'end' });
  if (limit !== null && isFree(limit + 8)) return text({ x: limit + 8, y }, words, look);
  return text({ x: Math.min(right, end - 7), y }, words, { ...look, anchor: 'end' });
}

/** The limit through all rows, its words on top. */
export function limitMarkup({ place }: Axis, limit: { readonly value: number; readonly words: string }, { top, bottom, right }: { readonly top: number; readonly bottom: number; readonly right: number }): string {
  const x = place(limit.value);
  const half = textWidth(limit.words, SIZE) / 2;
  const at = Math.min(right - half, Math.max(NAMES + half, x));
  return segment({ x, y: top }, { x, y: bottom }, { colour: INK, width: '2', dash: '7 4' }) + text({ x: at, y: top - 6 }, limit.words, { anchor: 'middle' });
}
