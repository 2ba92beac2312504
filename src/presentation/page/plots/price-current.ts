import type { Asked } from '../../../stage/index.js';
import { checkWords } from '../../words.js';
import { logAxis, roundedDecades } from '../drawing/axis.js';
import { FAINT, INK, SERIES } from '../drawing/colours.js';
import { around, boxOf, placeLabels, type Box, type LabelWish, type Point } from '../drawing/label-placing.js';
import { curve, marker, placedText, segment } from '../drawing/marks.js';
import { levelLine, panelMarkup, uprightLine, type Panel } from '../drawing/panel.js';
import { NOTE_LINE, notesMarkup } from '../drawing/notes.js';
import { named, said } from '../drawing/said.js';
import { fitted } from '../drawing/text-width.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';
import { legendOf } from './price-current-legend.js';
import { priceCurrentOf, reasonLetters, type PriceCurrent, type PricedPart } from './price-current-data.js';

const BOX: Box = { x: 92, y: 34, width: WIDTH - 92 - 34, height: 330 };
const ID_WIDTH = 130;
/** How far a name may stand from its point; that of the chosen part always finds a place, with a line to it. */
const NEAR = [9, 20, 34];
const FAR = [13, 24, 38, 54, 72, 92, 116];
/** Ranks named beside their point. */
const NAMED = 8;

/** P7: every part by what it costs and draws, the front of what fits, and the team's thresholds. Null where no part has both figures. */
export function priceCurrent(input: PageInput): Figure | null {
  const data = priceCurrentOf(input.report);
  if (data === null) return null;
  const legend = legendOf(data);
  const height = BOX.y + BOX.height + 52 + legend.length * NOTE_LINE;
  return figureOf({ id: 'price-current', title: 'Price against supply current', finding: findingOf(data, input), table: tableOf(data), width: WIDTH, height, body: panelOf(data, input) + notesMarkup(legend, BOX.y + BOX.height + 60), csv: csvOf(data) });
}

interface Threshold {
  readonly at: number;
  readonly words: string;
}

function thresholds({ limits, wishes }: Asked, currency: string): { readonly current: Threshold | null; readonly price: Threshold | null } {
  const current = limits.supplyCurrent?.value;
  const price = wishes.price?.currency === currency ? wishes.price.amount : undefined;
  return {
    current: current === undefined ? null : { at: current, words: `limit ${said(current, 'A')}` },
    price: price === undefined ? null : { at: price, words: `at most ${said(price, currency)}` },
  };
}

function panelOf({ parts, currency }: PriceCurrent, { report, chosen }: PageInput): string {
  const team = thresholds(report.stage.asked, currency);
  const domain = (values: readonly number[], threshold: Threshold | null): [number, number] => {
    const all = [...values, ...(threshold === null ? [] : [threshold.at])];
    return roundedDecades([Math.min(...all) * 0.9, Math.max(...all) * 1.12]);
  };
  const x = logAxis({ words: 'supply current per amplifier', unit: 'A', domain: domain(parts.map(({ current }) => current), team.current), pixels: [BOX.x, BOX.x + BOX.width] });
  const y = logAxis({ words: 'price each', unit: currency, domain: domain(parts.map(({ price }) => price), team.price), pixels: [BOX.y + BOX.height, BOX.y] });
  const panel = { box: BOX, x, y };
  return [
    panelMarkup(panel),
    team.current === null ? '' : uprightLine(panel, team.current.at, { dash: '7 4', width: '1.5' }),
    team.price === null ? '' : levelLine(panel, team.price.at, { dash: '7 4', width: '1.5' }),
    frontLine(parts, panel),
    ...parts.map((part) => pointMarkup(part, panel, chosen?.part.id ?? null)),
    ...labels(parts, panel, { team, chosen: chosen?.part.id ?? null }),
  ].join('');
}

const pointOf = ({ current, price }: PricedPart, { x, y }: Panel): Point => ({ x: x.place(current), y: y.place(price) });

/** From the least current to the least price: beyond it nothing that fits is to be had. */
function frontLine(parts: readonly PricedPart[], panel: Panel): string {
  const points = frontPoints(parts, panel);
  return points.length < 2 ? '' : curve([points], SERIES.third, '1.5');
}

function frontPoints(parts: readonly PricedPart[], panel: Panel): Point[] {
  const front = parts.filter(({ onFront }) => onFront).sort((a, b) => a.current - b.current || a.price - b.price);
  return front.flatMap((part, at): Point[] => {
    const here = pointOf(part, panel);
    const before = front[at - 1];
    return before === undefined ? [here] : [{ x: here.x, y: pointOf(before, panel).y }, here];
  });
}

function pointMarkup(part: PricedPart, panel: Panel, chosen: string | null): string {
  const at = pointOf(part, panel);
  if (part.id === chosen) return marker(at, 'circle', { colour: INK, radius: 7, hollow: true }) + marker(at, 'circle', { colour: SERIES.first.colour, radius: 4 });
  if (part.outcome === 'fits') return marker(at, 'circle', { colour: INK });
  if (part.outcome === 'undecided') return marker(at, 'diamond', { colour: INK, hollow: true });
  return marker(at, 'cross', { colour: FAINT, radius: 3 });
}

/** Thresholds, then what fits by name, then a letter beside each part that does not; what finds no room is in the table. */
function labels(parts: readonly PricedPart[], panel: Panel, { team, chosen }: { readonly team: ReturnType<typeof thresholds>; readonly chosen: string | null }): string[] {
  const letters = new Map(reasonLetters(parts).map(({ letter, check }) => [check, letter]));
  const wanted = [...parts].sort((a, b) => Number(b.id === chosen) - Number(a.id === chosen) || (a.rank ?? Infinity) - (b.rank ?? Infinity));
  const names = wanted.filter(({ id, rank }) => id === chosen || (rank !== null && rank <= NAMED));
  const wishes: { readonly wish: LabelWish; readonly fill: string }[] = [
    ...(team.current === null ? [] : [{ wish: besideUpright(panel, team.current), fill: INK }]),
    ...(team.price === null ? [] : [{ wish: besideLevel(panel, team.price), fill: INK }]),
    ...names.map((part) => ({ wish: { text: fitted(named(part.id), 12, ID_WIDTH), size: 12, places: (part.id === chosen ? FAR : NEAR).flatMap((gap) => around(pointOf(part, panel), gap, 12)) }, fill: part.id === chosen ? SERIES.first.colour : INK })),
    ...parts.filter(({ fails }) => fails !== null).map((part) => ({ wish: { text: letters.get(part.fails ?? '') ?? '', size: 12, places: around(pointOf(part, panel), 6, 12) }, fill: FAINT })),
  ];
  const dots = parts.map((part): Box => boxAround(pointOf(part, panel), part.id === chosen ? 9 : 4));
  const { box } = panel;
  const placed = placeLabels(wishes.map(({ wish }) => wish), { bounds: { x: box.x + 2, y: box.y + 2, width: box.width - 4, height: box.height - 4 }, taken: dots, curves: [...uprights(panel, team.current), ...levels(panel, team.price), ...dense(frontPoints(parts, panel))] });
  const own = parts.find(({ id }) => id === chosen);
  const name = placed[wishes.findIndex(({ fill }) => fill === SERIES.first.colour)];
  const leader = own === undefined || name == null ? '' : leaderLine(pointOf(own, panel), boxOf(name));
  return [leader, ...placed.flatMap((one, at) => (one === null ? [] : [placedText(one, { fill: wishes[at]?.fill ?? INK })]))];
}

const boxAround = ({ x, y }: Point, half: number): Box => ({ x: x - half, y: y - half, width: 2 * half, height: 2 * half });

/** From a point to the nearest place of its name, where that stands apart. */
function leaderLine(from: Point, { x, y, width, height }: Box): string {
  const to = { x: Math.min(x + width, Math.max(x, from.x)), y: Math.min(y + height, Math.max(y, from.y)) };
  return Math.hypot(to.x - from.x, to.y - from.y) < 18 ? '' : segment(from, to, { colour: SERIES.first.colour });
}

function dense(points: readonly Point[]): Point[] {
  return points.flatMap((point, at) => {
    const next = points[at + 1] ?? point;
    return Array.from({ length: 20 }, (_, step) => ({ x: point.x + (step / 20) * (next.x - point.x), y: point.y + (step / 20) * (next.y - point.y) }));
  });
}

/** Points along a threshold, for labels to keep off. */
function uprights({ box, x }: Panel, threshold: Threshold | null): Point[] {
  return threshold === null ? [] : Array.from({ length: 41 }, (_, at) => ({ x: x.place(threshold.at), y: box.y + (at / 40) * box.height }));
}

function levels({ box, y }: Panel, threshold: Threshold | null): Point[] {
  return threshold === null ? [] : Array.from({ length: 41 }, (_, at) => ({ x: box.x + (at / 40) * box.width, y: y.place(threshold.at) }));
}

function besideUpright({ box, x }: Panel, { at, words }: Threshold): LabelWish {
  const heights = [box.y + 14, box.y + 30, box.y + box.height - 8, box.y + box.height / 2];
  return { text: words, size: 12, places: heights.flatMap((y) => [{ x: x.place(at) + 5, y, anchor: 'start' as const }, { x: x.place(at) - 5, y, anchor: 'end' as const }]) };
}

function besideLevel({ box, y }: Panel, { at, words }: Threshold): LabelWish {
  const ends = [box.x + 6, box.x + box.width / 3, box.x + (2 * box.width) / 3];
  return { text: words, size: 12, places: ends.flatMap((x) => [{ x, y: y.place(at) - 5, anchor: 'start' as const }, { x, y: y.place(at) + 14, anchor: 'start' as const }]) };
}

function findingOf({ parts, currency }: PriceCurrent, { chosen }: PageInput): string {
  const front = parts.filter(({ onFront }) => onFront).sort((a, b) => a.price - b.price);
  const fits = parts.filter(({ outcome }) => outcome === 'fits').length;
  const at = parts.find(({ id }) => id === chosen?.part.id);
  const own = at === undefined ? '' : `${named(at.id)} costs ${said(at.price, currency)} and draws ${said(at.current, 'A')}; `;
  const [cheapest] = front;
  if (cheapest === undefined) return `${own}none of the ${parts.length} parts drawn fits.`;
  const thriftiest = front.reduce((best, next) => (next.current < best.current ? next : best));
  const ends = cheapest === thriftiest ? `${named(cheapest.id)} is both the cheapest and draws least` : `from ${said(cheapest.price, currency)} at ${said(cheapest.current, 'A')} to ${said(thriftiest.price, currency)} at ${said(thriftiest.current, 'A')}`;
  return `${own}of ${parts.length} parts drawn ${fits} fit, ${front.length} on the front: ${ends}.`;
}

const OUTCOMES = { fits: 'fits', undecided: 'not decided', 'does-not-fit': 'does not fit' } as const;

function tableOf({ parts, currency }: PriceCurrent): Figure['table'] {
  const rows = parts.map(({ id, outcome, rank, current, price, fails, onFront }) => [named(id), OUTCOMES[outcome], rank === null ? '' : String(rank), said(price, currency), said(current, 'A'), fails === null ? '' : checkWords(fails), onFront ? 'yes' : '']);
  return { columns: ['part', 'outcome', 'rank', 'price', 'current', 'fails first', 'on the front'], rows };
}

function csvOf({ parts, currency }: PriceCurrent): (string | number | null)[][] {
  return [['part', 'outcome', 'rank', `price_${currency}`, 'current_A', 'fails_first', 'on_front'], ...parts.map(({ id, outcome, rank, price, current, fails, onFront }) => [id, outcome, rank, price, current, fails, onFront ? 1 : 0])];
}
