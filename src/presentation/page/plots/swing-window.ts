import type { Curves, SwingWindow } from '../../../curves/index.js';
import type { JudgedPart } from '../../../screening/index.js';
import type { Verdict } from '../../../verdicts/verdict.js';
import { linearAxis, rounded, type Axis } from '../drawing/axis.js';
import { gridLine, text } from '../drawing/marks.js';
import { NOTE_LINE, noteLines, notesMarkup } from '../drawing/notes.js';
import { named, said, saidOr } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import { figureOf, WIDTH, type Drawing } from './assemble.js';
import { laneMarkup, LANE_WIDTH, type Lane } from './swing-lane.js';

const TITLE = 'Swing window';
const HEIGHT = 442;
const NOTES = ['Whiskers: what offset and drift may move the output by.', 'Hatched: signal out of reach, or a region where one input pair hands over to the other.'];
const [TOP, BOTTOM, LEFT] = [40, 342, 56] as const;

/** P1: rails at both supply ends, what the part can use of them, and the signal in it. Null without a chosen part. */
export function swingWindow({ chosen, curves }: Drawing): Figure | null {
  if (chosen === null || curves === null) return null;
  const { swing } = curves;
  const axis = axisOf(swing);
  const body = [axisMarkup(axis), ...swing.map((window, at) => groupMarkup(window, at, { axis, groups: swing.length }))].join('');
  return figureOf({ id: 'swing-window', title: TITLE, finding: findingOf(chosen), table: tableOf(swing), width: WIDTH, height: HEIGHT, body, csv: csvOf(swing) });
}

/** Volts against ground: both rails, and whatever reaches beyond them. */
function axisOf(windows: readonly SwingWindow[]): Axis {
  const values = windows.flatMap(({ supply, output, input }) => [0, supply, output.signal.min - (output.error ?? 0), output.signal.max + (output.error ?? 0), input.signal.min, input.signal.max]);
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const air = 0.06 * (most - least);
  return linearAxis({ words: 'voltage against ground', unit: 'V', domain: rounded([least - air, most + air], 8), pixels: [BOTTOM, TOP], ticks: 8 });
}

function axisMarkup({ ticks, title }: Axis): string {
  return [
    text({ x: 6, y: 16 }, title),
    notesMarkup(noteLines(NOTES, WIDTH - 14), HEIGHT - 10 - NOTE_LINE),
    ...ticks.map(({ at, label }) => gridLine({ x: LEFT, y: at }, { x: WIDTH - 8, y: at }) + text({ x: LEFT - 7, y: at + 4.5 }, label, { anchor: 'end' })),
  ].join('');
}

interface Place {
  readonly axis: Axis;
  readonly groups: number;
}

function groupMarkup(window: SwingWindow, at: number, { axis, groups }: Place): string {
  const width = (WIDTH - 8 - LEFT) / groups;
  const left = LEFT + at * width;
  const inner = Math.min(width, 2 * LANE_WIDTH + 24);
  const lanes = lanesOf(window).map((lane, index) => laneMarkup(lane, { left: left + 6 + index * (inner / 2), axis, bounds: [TOP - 4, BOTTOM + 4] }));
  return [
    ...lanes,
    text({ x: left + inner / 2, y: BOTTOM + 46 }, `on a supply of ${said(window.supply, 'V')}`, { anchor: 'middle', weight: 'bold' }),
  ].join('');
}

/** The output with what it may be off by, and the input pins. */
export function lanesOf({ supply, output, input }: SwingWindow): Lane[] {
  const edge = (headroom: number | null, side: 'low' | 'high'): number | null => (headroom === null ? null : side === 'low' ? headroom : supply - headroom);
  const band = ({ low, high }: { readonly low: number | null; readonly high: number | null }) => ({ low: edge(low, 'low'), high: edge(high, 'high') });
  return [
    { name: 'output', supply, signal: output.signal, error: output.error ?? 0, band: band(output.worst), crossover: null },
    { name: 'input pins', supply, signal: input.signal, error: 0, band: band(input.worst), crossover: input.crossover },
  ];
}

const SIDES: readonly (readonly [string, string])[] = [['output-low', 'The output towards V−'], ['output-high', 'The output towards V+'], ['input-low', 'The input towards V−'], ['input-high', 'The input towards V+']];

/** The side with the least room left, in its verdict's own numbers. */
function findingOf({ verdicts, part }: JudgedPart): string {
  const sides = SIDES.flatMap(([check, words]) => verdicts.filter((verdict) => verdict.check === check).map((verdict) => ({ words, verdict })));
  if (sides.length === 0) return `Nothing is known about the reach of ${named(part.id)}.`;
  const open = sides.find(({ verdict }) => verdict.spare === null);
  if (open !== undefined) return `${open.words} cannot be decided for ${named(part.id)}: its head-room there is not known.`;
  const tightest = sides.reduce((best, next) => ((next.verdict.spare ?? 0) < (best.verdict.spare ?? 0) ? next : best));
  const { words, verdict } = tightest;
  const spare = verdict.spare ?? 0;
  const where = supplyOf(verdict);
  return spare < 0 ? `${words} is ${said(-spare, 'V')} short${where}.` : `${words} has the least room: ${said(spare, 'V')} spare${where}.`;
}

const supplyOf = ({ worstAt }: Verdict): string => (worstAt?.['supply'] === undefined ? '' : ` on a supply of ${said(worstAt['supply'], 'V')}`);

function tableOf(windows: readonly SwingWindow[]): Figure['table'] {
  const columns = ['supply', 'pin', 'signal from', 'signal to', 'off by up to', 'usable from', 'usable to'];
  const rows = windows.flatMap((window) =>
    lanesOf(window).map(({ name, signal, error, band }) => [said(window.supply, 'V'), name, said(signal.min, 'V'), said(signal.max, 'V'), said(error, 'V'), saidOr(band.low, 'V'), saidOr(band.high, 'V')]),
  );
  return { columns, rows };
}

function csvOf(windows: Curves['swing']): (string | number | null)[][] {
  const head = ['supply_V', 'pin', 'signal_min_V', 'signal_max_V', 'error_V', 'usable_min_V', 'usable_max_V'];
  return [head, ...windows.flatMap((window) => lanesOf(window).map(({ name, signal, error, band }) => [window.supply, name, signal.min, signal.max, error, band.low, band.high]))];
}
