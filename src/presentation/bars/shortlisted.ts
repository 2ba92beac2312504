import type { Report } from '../../report.js';
import type { JudgedPart } from '../../screening/index.js';
import type { Verdict } from '../../verdicts/verdict.js';
import { paragraph } from '../layout.js';
import { marginOf } from '../page/plots/margins.js';
import { safeLine } from '../safe-text.js';
import type { Style } from '../style.js';
import { marginCells } from './margin-cells.js';
import { signsOf } from './signs.js';
import { swingBars, type Pin } from './swing-bars.js';

/** The output of the first part between the rails; where nothing fits, the nearest one on the pins that keep it out. */
export function firstSwing(report: Report, style: Style): string[] {
  if (style.bars !== true) return [];
  const [first, nearest] = [report.fit[0], report.nearest[0]];
  if (first !== undefined) return swingOf(report, { judged: first, pins: ['output'], who: `first part, ${safeLine(first.part.id)}` }, style);
  if (nearest === undefined) return [];
  return swingOf(report, { judged: nearest, pins: failingPins(nearest), who: `nearest part, ${safeLine(nearest.part.id)}` }, style);
}

interface Shown {
  readonly judged: JudgedPart;
  readonly pins: readonly Pin[];
  readonly who: string;
}

function swingOf(report: Report, { judged, pins, who }: Shown, style: Style): string[] {
  if (pins.length === 0) return [];
  const lines = swingBars({ swing: report.curves(judged).swing, verdicts: judged.verdicts }, pins, style);
  return lines.length === 0 ? [] : [...paragraph(`${who}, at the supply end with the least room, figures at their worst`, style, { lead: 'Rails   ' }), ...lines];
}

function failingPins({ verdicts }: JudgedPart): Pin[] {
  const isOut = (pin: Pin): boolean => verdicts.some(({ check, outcome }) => outcome === 'fail' && (check === `${pin}-low` || check === `${pin}-high`));
  return (['output', 'input'] as const).filter(isOut);
}

/** Cells of the bar in the table: a tenth of the limit each, after the mark of the limit. */
const TENTHS = 10;

/** What the tightest check leaves, as a share of its limit up to all of it; empty where it has no share, and without bars. */
export function tightestBar(verdict: Verdict, style: Style): string {
  const margin = marginOf(verdict);
  if (style.bars !== true || margin.share === null) return '';
  return marginCells(margin, { least: 0, most: 1, cells: TENTHS + 1 }, signsOf(style)).trimEnd();
}
