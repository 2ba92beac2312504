import type { JudgedPart } from '../../../screening/index.js';
import type { Stage } from '../../../stage/index.js';
import { linearAxis, rounded } from '../drawing/axis.js';
import { FAIL, INK, SERIES } from '../drawing/colours.js';
import type { Box } from '../drawing/label-placing.js';
import { hatch, marker, rect, segment } from '../drawing/marks.js';
import { panelMarkup, uprightLine, type Panel } from '../drawing/panel.js';
import { named, said, saidOr, saidRange } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';
import { labels } from './supply-temperature-labels.js';

const HEIGHT = 400;
const BOX: Box = { x: 64, y: 34, width: WIDTH - 64 - 34, height: 310 };
const TITLE = 'Supply against temperature';

/** Where the part is specified; null: that end is not known. V and °C. */
export interface Validity {
  readonly supplyLow: number | null;
  readonly supplyHigh: number | null;
  readonly absolute: number | null;
  readonly coldest: number | null;
  readonly hottest: number | null;
}

/** P8: where the stage works and where the part is specified. Null without a chosen part. */
export function supplyTemperature({ report, chosen }: PageInput): Figure | null {
  if (chosen === null) return null;
  const { stage } = report;
  const valid = validityOf(chosen);
  return figureOf({ id: 'supply-temperature', title: TITLE, finding: findingOf(stage, valid, chosen), table: tableOf(stage, valid), width: WIDTH, height: HEIGHT, body: bodyOf(stage, valid), csv: csvOf(stage, valid) });
}

/** The ends as the checks read them; what was only assumed for want of a figure is not known. */
export function validityOf({ verdicts }: Pick<JudgedPart, 'verdicts'>): Validity {
  const offered = (check: string): number | null => {
    const verdict = verdicts.find((one) => one.check === check);
    const value = verdict?.offered;
    return typeof value === 'number' && Number.isFinite(value) && verdict?.standsOn !== 'assumed' ? value : null;
  };
  return { supplyLow: offered('supply-low'), supplyHigh: offered('supply-high'), absolute: offered('supply-peak'), coldest: offered('temperature-low'), hottest: offered('temperature-high') };
}

function panelOf({ supply, supplyPeak, temperature }: Stage, valid: Validity): Panel {
  const volts = [supply.min, supply.max, supplyPeak, valid.supplyLow ?? supply.min, valid.supplyHigh ?? supply.max, valid.absolute ?? supply.max];
  const degrees = [temperature.min, temperature.max, valid.coldest ?? temperature.min, valid.hottest ?? temperature.max];
  const wide = (values: readonly number[], least: number): [number, number] => {
    const [low, high] = [Math.min(...values), Math.max(...values)];
    const air = Math.max(least, 0.12 * (high - low));
    return rounded([low - air, high + air], 12);
  };
  const [low, high] = wide(volts, 0.4);
  return {
    box: BOX,
    x: linearAxis({ words: 'supply', unit: 'V', domain: [Math.max(0, low), high], pixels: [BOX.x, BOX.x + BOX.width], ticks: 8 }),
    y: linearAxis({ words: 'ambient temperature', unit: '°C', domain: wide(degrees, 10), pixels: [BOX.y + BOX.height, BOX.y] }),
  };
}

interface Area {
  readonly from: number | null;
  readonly to: number | null;
  readonly cold: number | null;
  readonly hot: number | null;
}

/** An end that is not known reaches the edge of the drawing. */
function areaBox({ x, y, box }: Panel, { from, to, cold, hot }: Area): Box {
  const left = from === null ? box.x : x.place(from);
  const right = to === null ? box.x + box.width : x.place(to);
  const top = hot === null ? box.y : y.place(hot);
  const bottom = cold === null ? box.y + box.height : y.place(cold);
  return { x: left, y: top, width: Math.max(3, right - left), height: Math.max(3, bottom - top) };
}

function bodyOf(stage: Stage, valid: Validity): string {
  const panel = panelOf(stage, valid);
  const { supply, temperature, supplyPeak } = stage;
  const part = areaBox(panel, { from: valid.supplyLow, to: valid.supplyHigh, cold: valid.coldest, hot: valid.hottest });
  const use = areaBox(panel, { from: supply.min, to: supply.max, cold: temperature.min, hot: temperature.max });
  const isOpen = [valid.supplyLow, valid.supplyHigh, valid.coldest, valid.hottest].includes(null);
  const isInside = use.x >= part.x - 0.1 && use.y >= part.y - 0.1 && use.x + use.width <= part.x + part.width + 0.1 && use.y + use.height <= part.y + part.height + 0.1;
  const corner = { x: panel.x.place(supply.min), y: panel.y.place(temperature.min) };
  return [
    panelMarkup(panel),
    rect(part, { fill: SERIES.third.colour, opacity: '0.12', stroke: SERIES.third.colour, width: '1.5', dash: isOpen ? '4 3' : undefined }),
    isInside ? '' : hatch(use, FAIL, 8),
    rect(use, { fill: SERIES.first.colour, opacity: '0.22', stroke: SERIES.first.colour, width: '2' }),
    supplyPeak > supply.max ? uprightLine(panel, supplyPeak, { colour: SERIES.first.colour, dash: '2 3', width: '1.5' }) : '',
    valid.absolute === null ? '' : uprightLine(panel, valid.absolute, { colour: INK, dash: '7 4', width: '1.5' }),
    segment({ x: use.x, y: use.y }, corner, { colour: SERIES.first.colour, width: '5' }),
    marker(corner, 'square', { colour: SERIES.first.colour, radius: 5 }),
    ...labels(stage, valid, { panel, part, use }),
  ].join('');
}

function findingOf({ supply, temperature }: Stage, { supplyLow, supplyHigh, coldest, hottest }: Validity, { part }: JudgedPart): string {
  const use = `The stage works at ${saidRange(supply.min, supply.max, 'V')} and ${saidRange(temperature.min, temperature.max, '°C')}`;
  const ends: readonly (readonly [string, number | null, boolean])[] = [
    ['its lowest supply', supplyLow, (supplyLow ?? 0) > supply.min], ['its highest supply', supplyHigh, (supplyHigh ?? Infinity) < supply.max],
    ['its cold end', coldest, (coldest ?? -Infinity) > temperature.min], ['its hot end', hottest, (hottest ?? Infinity) < temperature.max],
  ];
  const outside = ends.filter(([, , isOutside]) => isOutside).map(([words]) => words);
  const unknown = ends.filter(([, end]) => end === null).map(([words]) => words);
  if (outside.length > 0) return `${use}: ${named(part.id)} is not specified at ${outside.join(' and ')}.`;
  if (unknown.length > 0) return `${use}: for ${named(part.id)} ${unknown.join(' and ')} ${unknown.length === 1 ? 'is' : 'are'} not known.`;
  return `${use}, inside of what ${named(part.id)} is specified for: ${saidRange(supplyLow ?? 0, supplyHigh ?? 0, 'V')} and ${saidRange(coldest ?? 0, hottest ?? 0, '°C')}.`;
}

function tableOf({ supply, temperature, supplyPeak }: Stage, valid: Validity): Figure['table'] {
  return {
    columns: ['', 'stage', 'part'],
    rows: [
      ['lowest supply', said(supply.min, 'V'), saidOr(valid.supplyLow, 'V')], ['highest supply', said(supply.max, 'V'), saidOr(valid.supplyHigh, 'V')],
      ['supply peak against absolute maximum', said(supplyPeak, 'V'), saidOr(valid.absolute, 'V')],
      ['lowest temperature', said(temperature.min, '°C'), saidOr(valid.coldest, '°C')], ['highest temperature', said(temperature.max, '°C'), saidOr(valid.hottest, '°C')],
    ],
  };
}

function csvOf({ supply, temperature, supplyPeak }: Stage, valid: Validity): (string | number | null)[][] {
  return [
    ['', 'supply_min_V', 'supply_max_V', 'supply_peak_V', 'temperature_min_C', 'temperature_max_C'],
    ['stage', supply.min, supply.max, supplyPeak, temperature.min, temperature.max],
    ['part', valid.supplyLow, valid.supplyHigh, valid.absolute, valid.coldest, valid.hottest],
  ];
}

