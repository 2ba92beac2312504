import { scaleLinear, scaleLog } from 'd3-scale';
import { paged, said } from './said.js';
import { textWidth } from './text-width.js';

/** A scale with its ticks. */
export interface Axis {
  /** With the unit of its tick labels. */
  readonly title: string;
  readonly place: (value: number) => number;
  readonly ticks: readonly { readonly at: number; readonly label: string }[];
  /** Ends as drawn, SI. */
  readonly domain: readonly [number, number];
}

export interface AxisWish {
  readonly words: string;
  /** SI unit; `1` or empty: a plain number. */
  readonly unit: string;
  readonly domain: readonly [number, number];
  /** From where to where, in user units. */
  readonly pixels: readonly [number, number];
  /** Wanted number of ticks. */
  readonly ticks?: number;
}

const PREFIXES: readonly (readonly [number, string])[] = [[1e9, 'G'], [1e6, 'M'], [1e3, 'k'], [1, ''], [1e-3, 'm'], [1e-6, 'µ'], [1e-9, 'n'], [1e-12, 'p']];
const UNPREFIXED = new Set(['', '1', '%', '°C', '°', 'dB', 'V/V', 'K']);

/** Evenly divided; all ticks in one prefixed unit, which stands in the title: `output (mV)`. */
export function linearAxis({ words, unit, domain, pixels, ticks = 6 }: AxisWish): Axis {
  const scale = scaleLinear().domain([...domain]).range([...pixels]);
  const [factor, prefix] = prefixOf(Math.max(Math.abs(domain[0]), Math.abs(domain[1])), unit);
  const values = scale.ticks(ticks);
  const step = Math.abs((values[1] ?? 1) - (values[0] ?? 0)) / factor;
  const digits = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const label = (value: number): string => paged((value / factor).toFixed(digits)).replace(/^−(?=0(?:\.0*)?$)/u, '');
  const spoken = unit === '1' || unit === '' ? '' : ` (${prefix}${unit})`;
  return { title: words + spoken, place: (value) => scale(value), ticks: values.map((value) => ({ at: scale(value), label: label(value) })), domain };
}

function prefixOf(largest: number, unit: string): readonly [number, string] {
  if (UNPREFIXED.has(unit) || /^[A-Z]{3}$/u.test(unit)) return [1, ''];
  return PREFIXES.find(([factor]) => largest >= factor * 0.9999999) ?? [1, ''];
}

/** Decades, each tick with its own prefix: `1 kHz`, `10 kHz`. On less than two decades 2 and 5 as well; labels that would touch are left out. */
export function logAxis({ words, unit, domain, pixels }: AxisWish): Axis {
  const scale = scaleLog().domain([...domain]).range([...pixels]);
  const decades = Math.log10(domain[1] / domain[0]);
  const steps = decades < 2.2 ? [1, 2, 5] : [1];
  const ticks: { at: number; label: string; width: number }[] = [];
  for (let power = Math.floor(Math.log10(domain[0])); power <= Math.ceil(Math.log10(domain[1])); power += 1) {
    for (const step of steps) {
      const value = Number(`${step}e${power}`);
      if (value < domain[0] * (1 - 1e-9) || value > domain[1] * (1 + 1e-9)) continue;
      const label = UNPREFIXED.has(unit) ? said(value, 'V').replace(/V$/u, '').trimEnd() : said(value, unit);
      ticks.push({ at: scale(value), label, width: textWidth(label, 13) });
    }
  }
  const isUpright = pixels[0] > pixels[1];
  return { title: unit === '1' || unit === '' ? words : `${words} (${unit})`, place: (value) => scale(value), ticks: isUpright ? ticks : thinned(ticks), domain };
}

function thinned<T extends { readonly at: number; readonly label: string; readonly width: number }>(ticks: readonly T[]): T[] {
  const shown: T[] = [];
  for (const tick of ticks) {
    const last = shown.at(-1);
    if (last === undefined || tick.at - tick.width / 2 > last.at + last.width / 2 + 6) shown.push(tick);
  }
  return shown;
}

/** Ends a little beyond the values, at whole ticks of their size. */
export function rounded([least, most]: readonly [number, number], ticks = 6): [number, number] {
  const [low, high] = scaleLinear().domain([least, most]).nice(ticks).domain();
  return [low ?? least, high ?? most];
}

/** Whole decades, or 1-2-5 steps where that is closer. */
export function roundedDecades([least, most]: readonly [number, number]): [number, number] {
  const down = (value: number): number => stepOf(value, [5, 2, 1], (step, digits) => step <= digits * (1 + 1e-9));
  const up = (value: number): number => stepOf(value, [1, 2, 5, 10], (step, digits) => step >= digits * (1 - 1e-9));
  return [down(least), up(most)];
}

function stepOf(value: number, steps: readonly number[], fits: (step: number, digits: number) => boolean): number {
  const power = Math.floor(Math.log10(value));
  const digits = value / 10 ** power;
  const step = steps.find((one) => fits(one, digits)) ?? 1;
  return Number(`${step}e${power}`);
}
