import type { Crossing, LoopCurves } from '../../../curves/index.js';
import { logAxis } from '../drawing/axis.js';
import { clipped } from '../drawing/clip.js';
import { FAINT, INK, SERIES } from '../drawing/colours.js';
import { around, placeLabels, type Box, type LabelWish, type Point } from '../drawing/label-placing.js';
import { curve, marker, placedText, rect, SIZE } from '../drawing/marks.js';
import { panelMarkup, uprightLine, type Panel } from '../drawing/panel.js';
import { said } from '../drawing/said.js';
import { textWidth } from '../drawing/text-width.js';
import type { Figure } from '../figure.js';
import { figureOf, WIDTH, type Drawing } from './assemble.js';
import { gainCurves, gainRange, openWords, type GainCurve } from './bode-data.js';

const HEIGHT = 430;
const BOX: Box = { x: 56, y: 34, width: WIDTH - 56 - 34, height: 344 };

/** P2: open-loop gain against noise gain, the crossing with its rate of closure, the closed loop and the signal band. Null without a loop. */
export function bode({ curves: shown }: Drawing): Figure | null {
  const loop = shown?.loop ?? null;
  if (loop === null) return null;
  const curves = gainCurves(loop);
  return figureOf({ id: 'bode', title: 'Open-loop gain against noise gain', finding: findingOf(loop), table: tableOf(loop, curves), width: WIDTH, height: HEIGHT, body: bodyOf(loop, curves), csv: csvOf(loop, curves) });
}

function bodyOf(loop: LoopCurves, curves: readonly GainCurve[]): string {
  const ends = [loop.frequencies[0] ?? 1, loop.frequencies.at(-1) ?? 10] as const;
  const x = logAxis({ words: 'frequency', unit: 'Hz', domain: [...ends], pixels: [BOX.x, BOX.x + BOX.width] });
  const y = logAxis({ words: 'gain', unit: 'V/V', domain: gainRange(loop), pixels: [BOX.y + BOX.height, BOX.y] });
  const panel = { box: BOX, x, y };
  const drawn = curves.map(({ series, values }) => ({ series, pieces: clipped(pointsOf(panel, loop, values), BOX.y, BOX.y + BOX.height) }));
  return [
    bandMarkup(loop, panel),
    panelMarkup(panel),
    loop.band === null ? '' : uprightLine(panel, loop.band, { colour: FAINT, dash: '4 3' }),
    ...drawn.map(({ series, pieces }) => curve(pieces, series)),
    ...loop.openLoop.map(({ crossing, kind }) => crossingMarkup(panel, crossing, kind)),
    ...labels(loop, panel, { curves, drawn: drawn.map(({ pieces }) => pieces.flat()) }),
  ].join('');
}

/** Nothing at all cannot be placed on a logarithmic axis. */
const LEAST = 1e-12;

function pointsOf({ x, y }: Panel, { frequencies }: LoopCurves, values: readonly number[]): Point[] {
  return frequencies.map((frequency, at) => ({ x: x.place(frequency), y: y.place(Math.max(LEAST, values[at] ?? 0)) }));
}

function bandMarkup({ band }: LoopCurves, { box, x }: Panel): string {
  if (band === null) return '';
  const right = Math.min(box.x + box.width, Math.max(box.x, x.place(band)));
  return rect({ ...box, width: right - box.x }, { fill: INK, opacity: '0.06' });
}

function crossingMarkup({ x, y }: Panel, crossing: Crossing | null, kind: 'limit' | 'typical'): string {
  if (crossing === null) return '';
  const series = kind === 'limit' ? SERIES.first : SERIES.second;
  return marker({ x: x.place(crossing.frequency), y: y.place(crossing.gain) }, series.marker, { colour: series.colour, radius: 5, hollow: true });
}

interface Drawn {
  readonly curves: readonly GainCurve[];
  readonly drawn: readonly (readonly Point[])[];
}

/** Crossings first, then each curve by its name beside itself, then the band. */
function labels({ openLoop, band }: LoopCurves, panel: Panel, { curves, drawn }: Drawn): string[] {
  const crossings = openLoop.flatMap(({ crossing, kind }): Labelled[] => {
    if (crossing === null) return [];
    const at = { x: panel.x.place(crossing.frequency), y: panel.y.place(crossing.gain) };
    return [{ wish: { text: crossingWords(crossing), size: 12, places: away(at) }, fill: kind === 'limit' ? SERIES.first.colour : SERIES.second.colour }];
  });
  const names = curves.map(({ name, series }, at): Labelled => ({ wish: { text: name, size: SIZE, places: along(drawn[at] ?? [], name) }, fill: series.colour }));
  const shaded: Labelled[] = band === null ? [] : [{ wish: bandWish(panel, band), fill: FAINT }];
  const all = [...crossings, ...names, ...shaded];
  const markers = openLoop.flatMap(({ crossing }) => (crossing === null ? [] : [markerBox(panel, crossing)]));
  const placed = placeLabels(all.map(({ wish }) => wish), { bounds: inside(panel.box), taken: markers, curves: drawn.flatMap(dense) });
  return placed.flatMap((one, at) => (one === null ? [] : [placedText(one, { fill: all[at]?.fill ?? INK })]));
}

interface Labelled {
  readonly wish: LabelWish;
  readonly fill: string;
}

const crossingWords = ({ frequency, rateOfClosure, phaseMargin }: Crossing): string => `${said(frequency, 'Hz')}, closing at ${said(rateOfClosure, 'dB', 2)}/decade, ${said(phaseMargin, '°', 2)} margin`;

const markerBox = ({ x, y }: Panel, { frequency, gain }: Crossing): Box => ({ x: x.place(frequency) - 7, y: y.place(gain) - 7, width: 14, height: 14 });

const inside = ({ x, y, width, height }: Box): Box => ({ x: x + 4, y: y + 4, width: width - 8, height: height - 8 });

/** Round a crossing near by, then farther out. */
const away = (at: Point): LabelWish['places'] => [12, 30, 52, 76, 104, 134].flatMap((gap) => around(at, gap, 12));

/** Beside a curve, above and below, at many places along it. */
function along(points: readonly Point[], name: string): LabelWish['places'] {
  const half = textWidth(name, SIZE) / 2;
  const shares = [0.12, 0.3, 0.45, 0.6, 0.2, 0.75, 0.88, 0.04];
  return shares.flatMap((share) => {
    const point = points[Math.round(share * (points.length - 1))];
    if (point === undefined) return [];
    return [8, 20].flatMap((gap) => [
      { x: point.x, y: point.y - gap, anchor: 'middle' as const }, { x: point.x + gap, y: point.y - gap / 2, anchor: 'start' as const }, { x: point.x, y: point.y + gap + 10, anchor: 'middle' as const },
      { x: point.x - gap, y: point.y + gap, anchor: 'end' as const }, { x: point.x + half, y: point.y - gap, anchor: 'middle' as const },
    ]);
  });
}

function bandWish({ box, x }: Panel, band: number): LabelWish {
  const words = `signal up to ${said(band, 'Hz')}`;
  const right = Math.min(box.x + box.width, x.place(band)) - 6;
  const bottom = box.y + box.height - 10;
  return { text: words, size: 12, places: [0, 20, 60, 100].flatMap((up) => [{ x: right, y: bottom - up, anchor: 'end' as const }, { x: right + 12, y: bottom - up, anchor: 'start' as const }]) };
}

/** Points between the points, so that a label sees a steep curve too. */
function dense(points: readonly Point[]): Point[] {
  return points.flatMap((point, at) => {
    const next = points[at + 1] ?? point;
    return [0, 0.25, 0.5, 0.75].map((share) => ({ x: point.x + share * (next.x - point.x), y: point.y + share * (next.y - point.y) }));
  });
}

function findingOf({ openLoop, band, loopGain }: LoopCurves): string {
  const [limit] = openLoop;
  if (limit?.crossing == null) return 'The open-loop gain never meets the noise gain: a part this slow closes no loop here.';
  const { frequency, phaseMargin, rateOfClosure } = limit.crossing;
  const closing = `The loop closes at ${said(frequency, 'Hz')} with ${said(phaseMargin, '°', 2)} of phase margin, ${said(rateOfClosure, 'dB', 2)} per decade`;
  if (band === null || loopGain === null) return `${closing}.`;
  return `${closing}; at ${said(band, 'Hz')} the loop gain is ${said(20 * Math.log10(loopGain), 'dB', 2)}.`;
}

/** Three points a decade are read, all are in the CSV. */
function tableOf({ frequencies, openLoop }: LoopCurves, curves: readonly GainCurve[]): Figure['table'] {
  const rows = frequencies.flatMap((frequency, at) => (at % 8 === 0 ? [[said(frequency, 'Hz', 2), ...curves.map(({ values }) => said(values[at] ?? 0, 'V/V'))]] : []));
  const crossings = openLoop.flatMap((one) => (one.crossing === null ? [] : [[`crossing, ${openWords(one, openLoop.length)}`, crossingWords(one.crossing), ...curves.slice(1).map(() => '')]]));
  return { columns: ['frequency', ...curves.map(({ name }) => name)], rows: [...crossings, ...rows] };
}

function csvOf({ frequencies }: LoopCurves, curves: readonly GainCurve[]): (string | number)[][] {
  return [['frequency_Hz', ...curves.map(({ name }) => `${name.replace(' 1/β', '').replaceAll(/[, ]+/gu, '_')}_V/V`)], ...frequencies.map((frequency, at) => [frequency, ...curves.map(({ values }) => values[at] ?? 0)])];
}

