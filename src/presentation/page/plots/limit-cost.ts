import type { Asked, Stage } from '../../../stage/index.js';
import { linearAxis, logAxis, type Axis } from '../drawing/axis.js';
import { FAINT, INK, SERIES, type Series } from '../drawing/colours.js';
import { placeLabels, type Box, type LabelWish, type Point } from '../drawing/label-placing.js';
import { curve, marker, placedText } from '../drawing/marks.js';
import { panelMarkup, uprightLine, type Panel } from '../drawing/panel.js';
import { named, said } from '../drawing/said.js';
import { fitted } from '../drawing/text-width.js';
import type { Figure } from '../figure.js';
import type { PageInput, SweepCurve } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';

const HEIGHT = 380;
const BOX: Box = { x: 56, y: 34, width: WIDTH - 56 - 34, height: 290 };

/** P9: how many parts are left as one figure of the stage moves, and where it stands now. Null without a sweep. */
export function limitCost({ report, sweep }: PageInput): Figure | null {
  if (sweep === undefined || sweep.points.length === 0) return null;
  const unit = sweep.unit ?? unitOf(sweep.over);
  const now = sweep.current ?? currentOf(report.stage, sweep.over);
  return figureOf({ id: 'limit-cost', title: `What ${sweep.over} costs`, finding: findingOf(sweep, unit, now), table: tableOf(sweep, unit), width: WIDTH, height: HEIGHT, body: bodyOf(sweep, unit, now), csv: csvOf(sweep) });
}

const UNITS: readonly (readonly [RegExp, string])[] = [
  [/(?:dcError|swingLoss|outputHeadroom|supplyPeak|supply|input|output|amplitude|reference(?:\.value)?)$/u, 'V'], [/outputNoise$/u, 'Vrms'], [/supplyCurrent$/u, 'A'], [/phaseMargin$/u, '°'],
  [/(?:emperature)$/u, '°C'], [/(?:frequency|corner)$/iu, 'Hz'], [/resistance$|^resistors\.(?!tolerance)/u, 'Ω'], [/capacitance$/u, 'F'], [/within$|window$|edge$/u, 's'], [/gain$/u, 'V/V'],
];

/** SI unit of a field of the stage file, by its name; empty: a plain number. */
export function unitOf(path: string): string {
  return UNITS.find(([name]) => name.test(path))?.[1] ?? '';
}

/** Where the stage stands on that path now; null: not a single figure, or not written. */
export function currentOf({ asked, frequency, gain, load }: Stage, path: string): number | null {
  if (path === 'signal.frequency') return frequency;
  if (path === 'gain') return Math.abs(gain);
  if (path === 'load.resistance') return load?.resistance ?? null;
  if (path === 'load.capacitance') return load?.capacitance ?? null;
  const [room, field] = path.split('.');
  if (room !== 'limits' || field === undefined) return null;
  const written = asked.limits[field as keyof Asked['limits']];
  return typeof written === 'object' && 'value' in written ? written.value : null;
}

/** A span of this factor or more is read on a logarithmic axis. */
const WIDE = 12;

function axisOf({ over, points }: SweepCurve, unit: string, now: number | null): Axis {
  const values = [...points.map(({ value }) => value), ...(now === null ? [] : [now])];
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const pixels = [BOX.x, BOX.x + BOX.width] as const;
  if (least > 0 && most / least >= WIDE) return logAxis({ words: over, unit, domain: [least, most], pixels });
  const room = most === least ? Math.max(1, Math.abs(most)) * 0.1 : 0;
  return linearAxis({ words: over, unit, domain: [least - room, most + room], pixels });
}

interface Line {
  readonly name: string;
  readonly series: Series;
  readonly counts: readonly number[];
}

function linesOf({ points }: SweepCurve): Line[] {
  return [
    { name: 'fit', series: SERIES.first, counts: points.map(({ counts }) => counts.fit) },
    { name: 'fit or not decided', series: SERIES.second, counts: points.map(({ counts }) => counts.fit + counts.undecided) },
  ];
}

function bodyOf(sweep: SweepCurve, unit: string, now: number | null): string {
  const lines = linesOf(sweep);
  const most = Math.max(1, ...lines.flatMap(({ counts }) => counts));
  const y = linearAxis({ words: 'parts', unit: '', domain: [0, Math.ceil(most * 1.15) + 1], pixels: [BOX.y + BOX.height, BOX.y], ticks: Math.min(8, most + 1) });
  const panel = { box: BOX, x: axisOf(sweep, unit, now), y };
  const points = lines.map(({ counts }) => sweep.points.map(({ value }, at): Point => ({ x: panel.x.place(value), y: y.place(counts[at] ?? 0) })));
  const turns = turnsShown(sweep, panel.x);
  return [
    panelMarkup(panel),
    ...turns.map(({ at }) => uprightLine(panel, at, { colour: FAINT, dash: '2 4' })),
    now === null ? '' : uprightLine(panel, now, { colour: INK, width: '2', dash: '7 4' }),
    ...lines.map(({ series }, at) => curve([stepped(points[at] ?? [])], series)),
    ...(points[0] ?? []).map((point) => marker(point, 'circle', { colour: SERIES.first.colour, radius: 2.5 })),
    ...labels({ panel, lines, points, turns, now }, unit),
  ].join('');
}

/** Parts come and go at once: half way between two values that were tried. */
function stepped(points: readonly Point[]): Point[] {
  return points.flatMap((point, at) => {
    const before = points[at - 1];
    if (before === undefined || before.y === point.y) return [point];
    const middle = (before.x + point.x) / 2;
    return [{ x: middle, y: before.y }, { x: middle, y: point.y }, point];
  });
}

const turnsShown = ({ turns }: SweepCurve, { domain }: Axis): SweepCurve['turns'] => turns.filter(({ at }) => at >= domain[0] && at <= domain[1]);

interface Drawn {
  readonly panel: Panel;
  readonly lines: readonly Line[];
  readonly points: readonly (readonly Point[])[];
  readonly turns: SweepCurve['turns'];
  readonly now: number | null;
}

function labels({ panel, lines, points, turns, now }: Drawn, unit: string): string[] {
  const { box, x } = panel;
  const wishes: { readonly wish: LabelWish; readonly fill: string }[] = [
    ...(now === null ? [] : [{ fill: INK, wish: { text: `now ${said(now, unit)}`, size: 12, places: beside(x.place(now), box) } }]),
    ...lines.map(({ name, series }, at) => ({ fill: series.colour, wish: { text: name, size: 13, places: along(points[at] ?? []) } })),
    ...turns.map(({ at, to }) => ({ fill: FAINT, wish: { text: to === null ? 'nothing fits' : fitted(`${named(to)} first`, 12, 150), size: 12, places: beside(x.place(at), box) } })),
  ];
  const placed = placeLabels(wishes.map(({ wish }) => wish), { bounds: { x: box.x + 3, y: box.y + 2, width: box.width - 6, height: box.height - 4 }, taken: [], curves: points.flatMap(stepped) });
  return placed.flatMap((one, at) => (one === null ? [] : [placedText(one, { fill: wishes[at]?.fill ?? INK })]));
}

function beside(at: number, { y, height }: Box): LabelWish['places'] {
  const heights = [16, 32, 48, 64, 80, 96, height - 10, height - 26, height - 42].map((down) => y + down);
  return heights.flatMap((to) => [{ x: at + 5, y: to, anchor: 'start' as const }, { x: at - 5, y: to, anchor: 'end' as const }]);
}

function along(points: readonly Point[]): LabelWish['places'] {
  return [0.85, 0.6, 0.4, 0.2, 0.95].flatMap((share) => {
    const point = points[Math.round(share * (points.length - 1))];
    return point === undefined ? [] : [8, 22].flatMap((gap) => [{ x: point.x, y: point.y - gap, anchor: 'middle' as const }, { x: point.x, y: point.y + gap + 10, anchor: 'middle' as const }]);
  });
}

function findingOf({ over, points, turns }: SweepCurve, unit: string, now: number | null): string {
  const [first, last] = [points[0], points.at(-1)];
  const counts = points.map((point) => point.counts.fit);
  const span = `Between ${said(first?.value ?? 0, unit)} and ${said(last?.value ?? 0, unit)} of ${over}, ${Math.min(...counts)} to ${Math.max(...counts)} parts fit`;
  const [turn] = now === null ? turns : [...turns].sort((a, b) => Math.abs(a.at - now) - Math.abs(b.at - now));
  const here = now === null ? '' : `, the stage stands at ${said(now, unit)}`;
  if (turn === undefined) return `${span}${here}; the first choice does not change.`;
  return `${span}${here}; the ${now === null ? 'first' : 'nearest'} turn is at ${said(turn.at, unit)}, ${turn.to === null ? 'beyond which nothing fits' : `from which ${named(turn.to)} comes first`}.`;
}

function tableOf({ over, points }: SweepCurve, unit: string): Figure['table'] {
  return { columns: [over, 'fit', 'not decided', 'out', 'first'], rows: points.map(({ value, counts, first }) => [said(value, unit), String(counts.fit), String(counts.undecided), String(counts.rejected), first === null ? 'nothing fits' : named(first)]) };
}

function csvOf({ over, points }: SweepCurve): (string | number | null)[][] {
  return [[over, 'fit', 'undecided', 'rejected', 'first'], ...points.map(({ value, counts, first }) => [value, counts.fit, counts.undecided, counts.rejected, first])];
}
