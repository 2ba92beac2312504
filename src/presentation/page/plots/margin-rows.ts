import type { Axis } from '../drawing/axis.js';
import { FAIL, FAINT, PASS } from '../drawing/colours.js';
import { hatch, rect, segment, text, SIZE } from '../drawing/marks.js';
import { named } from '../drawing/said.js';
import { fitted } from '../drawing/text-width.js';
import type { Margin } from './margins.js';

export const ROW = 22;
const NAMES = 168;
/** Left and right end of the scale, user units. */
export const SCALE = [186, 500] as const;
const WORDS = 512;
const WORDS_WIDTH = 124;

const LOOK = { pass: { glyph: '✓', colour: PASS }, fail: { glyph: '✕', colour: FAIL }, unknown: { glyph: '?', colour: FAINT } } as const;

/** Mark, name, bar from the limit, and what is left in its own unit. */
export function marginRow(row: Margin, axis: Axis, top: number): string {
  const { glyph, colour } = LOOK[row.outcome];
  const y = top + ROW / 2 + 4.5;
  return [
    text({ x: 6, y }, glyph, { fill: colour, weight: 'bold' }),
    text({ x: 24, y }, fitted(row.name, SIZE, NAMES - 24)),
    row.outcome === 'unknown' ? openBar(row, axis, top) : bar(row, axis, top),
    text({ x: WORDS, y }, fitted(named(row.words), SIZE, WORDS_WIDTH)),
  ].join('');
}

function bar({ share, outcome }: Margin, axis: Axis, top: number): string {
  if (share === null) return '';
  const { colour } = LOOK[outcome];
  const [zero, end] = [axis.place(0), held(axis, share)];
  const box = { x: Math.min(zero, end), y: top + 5, width: Math.max(1.5, Math.abs(end - zero)), height: ROW - 10 };
  const filled = outcome === 'pass' ? rect(box, { fill: colour, opacity: '0.55', stroke: colour }) : rect(box, { fill: 'none', stroke: colour, width: '1.5' }) + hatch(box, colour, 5);
  return filled + (isCut(axis, share) ? arrow(axis, share, { top, colour }) : '');
}

/** From the worst to the best reading; an end that is not known stays open. */
function openBar({ share, best }: Margin, axis: Axis, top: number): string {
  const [from, to] = [share === null ? SCALE[0] : held(axis, share), best === null ? SCALE[1] : held(axis, best)];
  const [left, right] = [Math.min(from, to), Math.max(from, to)];
  const y = top + ROW / 2;
  const cap = (x: number): string => segment({ x, y: y - 5 }, { x, y: y + 5 }, { colour: FAINT, width: '2' });
  return segment({ x: left, y }, { x: right, y }, { colour: FAINT, width: '2', dash: '4 4' }) + (share === null ? '' : cap(from)) + (best === null ? '' : cap(to));
}

const percent = (share: number): number => 100 * share;
const held = ({ place, domain }: Axis, share: number): number => place(Math.min(domain[1], Math.max(domain[0], percent(share))));
const isCut = ({ domain }: Axis, share: number): boolean => percent(share) > domain[1] || percent(share) < domain[0];

/** A chevron where the bar goes on beyond the scale. */
function arrow(axis: Axis, share: number, { top, colour }: { readonly top: number; readonly colour: string }): string {
  const x = held(axis, share);
  const out = share > 0 ? 1 : -1;
  const y = top + ROW / 2;
  return segment({ x: x + 2 * out, y: y - 5 }, { x: x + 7 * out, y }, { colour, width: '2' }) + segment({ x: x + 7 * out, y }, { x: x + 2 * out, y: y + 5 }, { colour, width: '2' });
}
