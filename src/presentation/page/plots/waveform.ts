import type { Stage } from '../../../stage/index.js';
import { linearAxis, rounded } from '../drawing/axis.js';
import { FAINT, INK, SERIES, type Series } from '../drawing/colours.js';
import { placeLabels, type Box, type LabelWish, type Point } from '../drawing/label-placing.js';
import { curve, placedText, SIZE } from '../drawing/marks.js';
import { levelLine, panelMarkup, type Panel } from '../drawing/panel.js';
import { said } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import type { PredictionCurves } from '../page-input.js';
import { figureOf, WIDTH, type Drawing } from './assemble.js';

const HEIGHT = 486;
const UPPER: Box = { x: 64, y: 34, width: WIDTH - 64 - 34, height: 230 };
const LOWER: Box = { x: 64, y: 336, width: WIDTH - 64 - 34, height: 100 };

type Waves = NonNullable<PredictionCurves['waveform']>;

interface Trace {
  readonly name: string;
  readonly values: readonly number[];
  readonly series: Series;
}

/** P3: the output as wanted and as predicted, what stands in its way, and the difference below. Null without a prediction. */
export function waveform({ report, curves, prediction }: Drawing): Figure | null {
  const waves = prediction?.waveform ?? null;
  if (waves === null || waves.t.length < 2 || (waves.typical === null && waves.worst === null)) return null;
  const limits = limitsOf(report.stage, curves?.swing.find(({ supply }) => supply === report.stage.supply.min) ?? null);
  return figureOf({
    id: 'waveform', title: 'Predicted waveform', finding: findingOf(waves), table: tableOf(waves), width: WIDTH, height: HEIGHT,
    body: upperMarkup(waves, limits) + lowerMarkup(waves), csv: csvOf(waves),
  });
}

interface Limit {
  readonly name: string;
  readonly volts: number;
}

/** Where the output ends at the lowest supply. */
function limitsOf({ supply }: Stage, window: { readonly output: { readonly worst: { readonly low: number | null; readonly high: number | null } } } | null): Limit[] {
  const { low, high } = window?.output.worst ?? { low: null, high: null };
  return [
    ...(high === null ? [] : [{ name: `clips at ${said(supply.min - high, 'V')} on ${said(supply.min, 'V')}`, volts: supply.min - high }]),
    ...(low === null ? [] : [{ name: `clips at ${said(low, 'V')}`, volts: low }]),
  ];
}

function outcomes({ typical, worst }: Waves): Trace[] {
  return [
    ...(typical === null ? [] : [{ name: 'typical', values: typical, series: SERIES.second }]),
    ...(worst === null ? [] : [{ name: 'guaranteed', values: worst, series: SERIES.first }]),
  ];
}

const traces = (waves: Waves): Trace[] => [{ name: 'ideal', values: waves.ideal, series: { ...SERIES.fourth, colour: FAINT, dash: '3 3' } }, ...outcomes(waves)];

function differences(waves: Waves): Trace[] {
  return outcomes(waves).map(({ name, values, series }) => ({ name: `${name} − ideal`, series, values: values.map((value, at) => value - (waves.ideal[at] ?? value)) }));
}

function upperMarkup(waves: Waves, limits: readonly Limit[]): string {
  const lines = traces(waves);
  const panel = panelOf(UPPER, waves, { words: 'output', values: [...lines.flatMap(({ values }) => values), ...limits.map(({ volts }) => volts)], air: 0.16 });
  const levels = limits.map(({ volts }) => levelLine(panel, volts, { colour: INK, dash: '6 4' }));
  const atLimits: LabelWish[] = limits.map(({ name, volts }) => ({ text: name, size: 12, places: besideLevel(panel, volts) }));
  return panelMarkup(panel) + levels.join('') + tracesMarkup(panel, waves, { lines, others: atLimits });
}

function lowerMarkup(waves: Waves): string {
  const lines = differences(waves);
  const panel = panelOf(LOWER, waves, { words: 'difference from the ideal', values: [0, ...lines.flatMap(({ values }) => values)], air: 0.3 });
  return panelMarkup(panel) + levelLine(panel, 0, { colour: FAINT }) + tracesMarkup(panel, waves, { lines, others: [] });
}

interface Upright {
  readonly words: string;
  readonly values: readonly number[];
  /** Room beyond the values for labels, as a share of their range. */
  readonly air: number;
}

/** Less than this is no difference, V: an axis needs some height. */
const NOTHING = 1e-6;

function panelOf(box: Box, { t }: Waves, { words, values, air }: Upright): Panel {
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const room = air * Math.max(most - least, NOTHING);
  const x = linearAxis({ words: 'time', unit: 's', domain: [t[0] ?? 0, t.at(-1) ?? 1], pixels: [box.x, box.x + box.width], ticks: 8 });
  const y = linearAxis({ words, unit: 'V', domain: rounded([least - room, most + room], 5), pixels: [box.y + box.height, box.y], ticks: 5 });
  return { box, x, y };
}

function tracesMarkup(panel: Panel, { t }: Waves, { lines, others }: { readonly lines: readonly Trace[]; readonly others: readonly LabelWish[] }): string {
  const points = lines.map(({ values }) => t.map((time, at): Point => ({ x: panel.x.place(time), y: panel.y.place(values[at] ?? 0) })));
  const names = lines.map(({ name }, at): LabelWish => ({ text: name, size: SIZE, places: along(points[at] ?? []) }));
  const placed = placeLabels([...others, ...names], { bounds: inner(panel.box), taken: [], curves: points.flat() });
  return [
    ...lines.map(({ series }, at) => curve([points[at] ?? []], series)),
    ...placed.flatMap((one, at) => (one === null ? [] : [placedText(one, { fill: lines[at - others.length]?.series.colour ?? INK })])),
  ].join('');
}

const inner = ({ x, y, width, height }: Box): Box => ({ x: x + 3, y: y + 2, width: width - 6, height: height - 4 });

/** At its extremes first, where curves lie apart. */
function along(points: readonly Point[]): LabelWish['places'] {
  const shares = [0.25, 0.75, 0.5, 0.12, 0.88, 0.37, 0.62];
  return [10, 24, 40].flatMap((gap) =>
    shares.flatMap((share) => {
      const point = points[Math.round(share * (points.length - 1))];
      if (point === undefined) return [];
      return [{ x: point.x, y: point.y - gap, anchor: 'middle' as const }, { x: point.x, y: point.y + gap + 10, anchor: 'middle' as const }, { x: point.x + gap, y: point.y, anchor: 'start' as const }];
    }),
  );
}

function besideLevel({ box, y }: Panel, volts: number): LabelWish['places'] {
  const at = y.place(volts);
  return [box.x + box.width - 6, box.x + box.width / 2, box.x + box.width / 4].flatMap((x) => [-5, 14].map((dy) => ({ x, y: at + dy, anchor: 'end' as const })));
}

function findingOf(waves: Waves): string {
  const farthest = differences(waves).map(({ values }) => Math.max(...values.map(Math.abs)));
  const names = outcomes(waves).map(({ name }) => name);
  const size = Math.max(...waves.ideal) - Math.min(...waves.ideal);
  const off = names.map((name, at) => `${said(farthest[at] ?? 0, 'V')} ${name === 'typical' ? 'with typical figures' : 'at the guaranteed worst'}`);
  return `Of ${said(size, 'V')} peak to peak the output is off by up to ${off.join(' and ')}.`;
}

const READ = 24;

/** Two dozen moments are read, all are in the CSV. */
function tableOf(waves: Waves): Figure['table'] {
  const step = Math.max(1, Math.ceil(waves.t.length / READ));
  const all = traces(waves);
  const rows = waves.t.flatMap((time, at) => (at % step === 0 ? [[said(time, 's'), ...all.map(({ values }) => said(values[at] ?? 0, 'V', 4))]] : []));
  return { columns: ['time', ...all.map(({ name }) => name)], rows };
}

function csvOf(waves: Waves): (string | number)[][] {
  const all = traces(waves);
  return [['time_s', ...all.map(({ name }) => `${name}_V`)], ...waves.t.map((time, at) => [time, ...all.map(({ values }) => values[at] ?? 0)])];
}
