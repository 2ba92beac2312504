import type { Span } from '../../../curves/index.js';
import type { Axis } from '../drawing/axis.js';
import { FAIL, FAINT, INK, SERIES } from '../drawing/colours.js';
import { spreadApart } from '../drawing/label-placing.js';
import { hatch, rect, segment, text } from '../drawing/marks.js';
import { said } from '../drawing/said.js';

/** One pin at one supply: what may be used, and what the signal takes. Volts against ground. */
export interface Lane {
  readonly name: string;
  readonly supply: number;
  readonly signal: Span;
  /** The signal may be off by this much either way. */
  readonly error: number;
  readonly band: { readonly low: number | null; readonly high: number | null };
  readonly crossover: Span | null;
}

interface Place {
  readonly left: number;
  readonly axis: Axis;
  /** Top and bottom of what may be drawn on. */
  readonly bounds: readonly [number, number];
}

export const LANE_WIDTH = 138;
const BAR = 30;
const LABELS = 12;

export function laneMarkup(lane: Lane, place: Place): string {
  const { left, bounds } = place;
  return [
    bandMarkup(lane, place),
    lane.crossover === null ? '' : crossoverMarkup(lane.crossover, place),
    signalMarkup(lane, place),
    ...[0, lane.supply].map((volts) => segment({ x: left - 4, y: heightOf(place, volts) }, { x: left + BAR + 3, y: heightOf(place, volts) }, { colour: INK, width: '2.5' })),
    labelsMarkup(lane, place),
    text({ x: left + BAR / 2, y: bounds[1] + 18 }, lane.name, { anchor: 'middle' }),
  ].join('');
}

/** A value on the axis, held within what may be drawn on: inputs may be allowed far beyond a rail. */
function heightOf({ axis, bounds }: Place, volts: number): number {
  return Math.min(bounds[1], Math.max(bounds[0], axis.place(volts)));
}

/** What may be used; an end that is not known stands at the rail, broken. */
function bandMarkup({ band, supply }: Lane, place: Place): string {
  const [top, bottom] = [heightOf(place, band.high ?? supply), heightOf(place, band.low ?? 0)];
  if (bottom <= top) return '';
  const box = { x: place.left, y: top, width: BAR, height: bottom - top };
  const { colour } = SERIES.third;
  const isOpen = band.low === null || band.high === null;
  return rect(box, { fill: colour, opacity: '0.14', stroke: colour, width: '1.5', dash: isOpen ? '4 3' : undefined });
}

function crossoverMarkup({ min, max }: Span, place: Place): string {
  const [top, bottom] = [heightOf(place, max), heightOf(place, min)];
  const box = { x: place.left, y: top, width: BAR, height: Math.max(1, bottom - top) };
  return hatch(box, FAINT) + rect(box, { stroke: FAINT, dash: '3 3' });
}

/** The signal as a bar, what it may be off by as whiskers; what lies outside of the usable band is hatched. */
function signalMarkup({ signal, error, band }: Lane, place: Place): string {
  const x = place.left + 8;
  const width = BAR - 16;
  const bar = (from: number, to: number) => ({ x, y: heightOf(place, to), width, height: Math.max(2, heightOf(place, from) - heightOf(place, to)) });
  const outside = [
    ...(band.high !== null && signal.max > band.high ? [bar(Math.max(band.high, signal.min), signal.max)] : []),
    ...(band.low !== null && signal.min < band.low ? [bar(signal.min, Math.min(band.low, signal.max))] : []),
  ];
  const { colour } = SERIES.first;
  const whisker = (volts: number): string => segment({ x: x + 1, y: heightOf(place, volts) }, { x: x + width - 1, y: heightOf(place, volts) }, { colour: INK, width: '1.5' });
  const stem = segment({ x: x + width / 2, y: heightOf(place, signal.max + error) }, { x: x + width / 2, y: heightOf(place, signal.min - error) }, { colour: INK, width: '1.5' });
  return [
    error > 0 ? stem + whisker(signal.max + error) + whisker(signal.min - error) : '',
    rect(bar(signal.min, signal.max), { fill: colour, stroke: colour }),
    ...outside.map((box) => rect(box, { fill: 'var(--paper,#fff)', stroke: FAIL, width: '2' }) + hatch(box, FAIL, 5)),
  ].join('');
}

/** Every end by its number, moved apart where they lie close, each joined to its end by a line. */
function labelsMarkup({ supply, signal, band, crossover }: Lane, place: Place): string {
  const labels = [
    { at: supply, words: `V+ ${said(supply, 'V')}`, fill: INK },
    ...(band.high === null ? [] : [{ at: band.high, words: `usable ${said(band.high, 'V')}`, fill: SERIES.third.colour }]),
    { at: signal.max, words: `signal ${said(signal.max, 'V')}`, fill: SERIES.first.colour },
    ...(signal.min === signal.max ? [] : [{ at: signal.min, words: `signal ${said(signal.min, 'V')}`, fill: SERIES.first.colour }]),
    ...(band.low === null ? [] : [{ at: band.low, words: `usable ${said(band.low, 'V')}`, fill: SERIES.third.colour }]),
    { at: 0, words: 'V−', fill: INK },
    ...(crossover === null ? [] : [{ at: (crossover.min + crossover.max) / 2, words: 'crossover', fill: FAINT }]),
  ];
  const ends = labels.map(({ at }) => heightOf(place, at));
  const heights = spreadApart(ends, LABELS + 4, [place.bounds[0] + 4, place.bounds[1] - 4]);
  const x = place.left + BAR;
  return labels
    .map(({ words, fill }, index) => {
      const [end, height] = [ends[index] ?? 0, heights[index] ?? 0];
      return segment({ x: x + 1, y: end }, { x: x + 7, y: height }, { colour: FAINT }) + text({ x: x + 8, y: height + 4.2 }, words, { size: LABELS, fill });
    })
    .join('');
}
